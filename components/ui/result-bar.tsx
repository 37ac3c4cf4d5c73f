import { type ReactNode } from 'react';
import { View } from 'react-native';
import { Txt } from '@/components/ui/text';
import { space } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useLayout } from '@/components/ui/use-layout';

export interface ResultFigure {
  readonly label: string;
  readonly value: string;
  readonly note?: string;
  readonly tone?: 'tide' | 'rust';
}

interface Props {
  readonly figures: readonly ResultFigure[];
  readonly actions?: ReactNode;
}

/** The running result at the foot of a form, from edge to edge of the frame around it; figures above, actions below, or beside when wide. */
export function ResultBar({ figures, actions }: Props) {
  const colours = useColours();
  const { kind } = useLayout();
  const isWide = kind === 'wide';
  const gutter = isWide ? space.gutterWide : space.gutterPhone;
  return (
    <View
      role="group"
      aria-label="Running result"
      style={{
        flexDirection: isWide ? 'row' : 'column',
        alignItems: isWide ? 'center' : 'stretch',
        justifyContent: 'space-between',
        gap: isWide ? 24 : 10,
        marginHorizontal: -gutter,
        paddingHorizontal: gutter,
        paddingVertical: 10,
        borderTopWidth: 1,
        borderColor: colours.rule,
        backgroundColor: colours.sheet,
      }}
    >
      <View style={{ flexDirection: 'row', gap: isWide ? 32 : 8, flexShrink: 1 }}>
        {figures.map((figure) => (
          <View key={figure.label} style={isWide ? { flexShrink: 1 } : { flex: 1, minWidth: 0 }}>
            <Txt size="note" colour="inkSoft" numberOfLines={1}>
              {figure.label}
            </Txt>
            <Txt size="body" weight="semibold" colour={figure.tone ?? 'ink'} numberOfLines={1}>
              {figure.value}
            </Txt>
            <Txt size="note" colour="inkSoft" numberOfLines={1}>
              {figure.note ?? ''}
            </Txt>
          </View>
        ))}
      </View>
      {actions}
    </View>
  );
}
