import { View } from 'react-native';
import Svg from 'react-native-svg';
import { KeySymbol, type KeyMark } from '@/components/charts/chart-marks';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';

export interface KeyItem {
  readonly key: string;
  /** Left out: words only. */
  readonly mark?: KeyMark;
  readonly text: string;
  readonly value?: string;
}

/** The names of a graphic's marks, under it. */
export function ChartKey({ items }: { items: readonly KeyItem[] }) {
  const colours = useColours();
  if (items.length === 0) return null;
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: 10, rowGap: 4 }}>
      {items.map(({ key, mark, text, value }) => (
        <View key={key} style={{ flexDirection: 'row', alignItems: 'center', gap: 4, flexShrink: 1 }}>
          {mark === undefined ? null : (
            <View aria-hidden style={{ width: 16, height: 16 }}>
              <Svg width={16} height={16}>
                <KeySymbol mark={mark} colours={colours} />
              </Svg>
            </View>
          )}
          <Txt size="note" colour="inkSoft" style={{ flexShrink: 1 }}>
            {value === undefined ? text : `${text} `}
            {value === undefined ? null : (
              <Txt size="note" weight="semibold">
                {value}
              </Txt>
            )}
          </Txt>
        </View>
      ))}
    </View>
  );
}
