import { View } from 'react-native';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';

interface Props {
  /** Done, 0 to 1. */
  readonly value: number;
  readonly label: string;
}

/** How far long work has come. */
export function Progress({ value, label }: Props) {
  const colours = useColours();
  const percent = Math.round(Math.min(1, Math.max(0, value)) * 100);
  return (
    <View style={{ gap: 6 }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', gap: 12 }}>
        <Txt size="row" style={{ flexShrink: 1 }}>
          {label}
        </Txt>
        <Txt size="row" weight="semibold">{`${percent}%`}</Txt>
      </View>
      <View
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={percent}
        style={{
          height: 8,
          borderRadius: 4,
          borderWidth: 1,
          borderColor: colours.edge,
          backgroundColor: colours.well,
          overflow: 'hidden',
        }}
      >
        <View style={{ width: `${percent}%`, height: '100%', backgroundColor: colours.bramble }} />
      </View>
    </View>
  );
}
