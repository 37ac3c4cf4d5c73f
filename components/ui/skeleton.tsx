import { View } from 'react-native';
import { useColours } from '@/components/ui/theme/use-theme';

const widths = ['52%', '38%', '78%', '64%'] as const;

interface Props {
  readonly lines?: number;
  /** One block of this height in place of lines. */
  readonly height?: number;
}

/** The shape of what is coming. It stands still and says nothing to screen readers. */
export function Skeleton({ lines = 3, height }: Props) {
  const colours = useColours();
  const block = { backgroundColor: colours.well, borderColor: colours.rule, borderWidth: 1 };
  if (height !== undefined) return <View aria-hidden style={[block, { height, borderRadius: 8 }]} />;
  return (
    <View aria-hidden style={{ gap: 10 }}>
      {Array.from({ length: lines }, (_, line) => (
        <View
          key={line}
          style={[block, { height: line === 0 ? 14 : 11, borderRadius: 6, width: widths[line % widths.length] }]}
        />
      ))}
    </View>
  );
}
