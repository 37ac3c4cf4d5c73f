import { useId, type ReactNode } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/button';
import { ModalLayer } from '@/components/ui/modal-layer';
import { Heading } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';

interface Props {
  readonly title: string;
  /** Called by Escape and by going back; the page takes the dialog away. */
  readonly onClose: () => void;
  /** Buttons, the one that does it last; without any there is one that closes. */
  readonly actions?: ReactNode;
  readonly children?: ReactNode;
  readonly width?: number;
}

/** A question that must be answered first. It keeps the focus, and a press beside it loses nothing. */
export function Dialog({ title, onClose, actions, children, width = 480 }: Props) {
  const colours = useColours();
  const titleId = useId();
  return (
    <ModalLayer
      labelledBy={titleId}
      onClose={onClose}
      style={{
        margin: 'auto',
        width: `min(${width}px, calc(100vw - 32px))`,
        maxHeight: 'calc(100dvh - 32px)',
        overflowY: 'auto',
        borderRadius: 12,
        backgroundColor: colours.sheet,
      }}
    >
      <View style={{ padding: 24, gap: 8 }}>
        <Heading id={titleId} level={2} serif size="head">
          {title}
        </Heading>
        {children}
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', justifyContent: 'flex-end', gap: 8, paddingTop: 12 }}>
          {actions ?? <Button label="Close" onPress={onClose} />}
        </View>
      </View>
    </ModalLayer>
  );
}
