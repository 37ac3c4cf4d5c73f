import { useId, type ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { Button } from '@/components/ui/button';
import { ModalLayer } from '@/components/ui/modal-layer';
import { Heading } from '@/components/ui/text';
import { sizes, space } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useLayout } from '@/components/ui/use-layout';

interface Props {
  readonly title: string;
  readonly onClose: () => void;
  /** Stay in sight at the foot. */
  readonly actions?: ReactNode;
  readonly children: ReactNode;
}

/** A page laid over the page: the whole of a phone, a column at the right when there is more room. */
export function Sheet({ title, onClose, actions, children }: Props) {
  const colours = useColours();
  const titleId = useId();
  const isPhone = useLayout().kind === 'phone';
  return (
    <ModalLayer
      labelledBy={titleId}
      onClose={onClose}
      style={{
        position: 'fixed',
        inset: isPhone ? 0 : '0 0 0 auto',
        margin: 0,
        width: isPhone ? '100vw' : sizes.list,
        maxWidth: '100vw',
        height: '100dvh',
        maxHeight: '100dvh',
        overflow: 'hidden',
        backgroundColor: colours.paper,
      }}
    >
      <View style={{ height: '100%' }}>
        <View
          style={{
            flexDirection: 'row',
            alignItems: 'center',
            justifyContent: 'space-between',
            minHeight: sizes.topBar,
            paddingLeft: space.gutterPhone,
            paddingRight: 6,
          }}
        >
          <Heading id={titleId} level={2} serif size="title">
            {title}
          </Heading>
          <Button kind="text" iconOnly icon="close" label="Close" onPress={onClose} />
        </View>
        <ScrollView style={{ flex: 1 }} contentContainerStyle={{ padding: space.gutterPhone, paddingTop: 4, gap: 20 }}>
          {children}
        </ScrollView>
        {actions === undefined ? null : (
          <View
            style={{
              flexDirection: 'row',
              gap: 8,
              padding: 12,
              paddingHorizontal: space.gutterPhone,
              borderTopWidth: 1,
              borderColor: colours.rule,
              backgroundColor: colours.sheet,
            }}
          >
            {actions}
          </View>
        )}
      </View>
    </ModalLayer>
  );
}
