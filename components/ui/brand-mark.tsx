import Svg, { Circle, Path } from 'react-native-svg';
import { useColours } from '@/components/ui/theme/use-theme';

const berries = [
  [23.1, 19.28],
  [26.9, 19.28],
  [21.2, 22.6],
  [25, 22.6],
  [28.8, 22.6],
  [23.1, 25.93],
  [26.9, 25.93],
] as const;

/** A bramble cane whose arc is a bell curve and whose tip, the right tail, is the berry that landed. */
export function BrandMark({ size = 36 }: { size?: number }) {
  const { bramble } = useColours();
  return (
    <Svg width={size} height={size} viewBox="0 0 32 32" fill="none" aria-hidden>
      <Path
        d="M2.2 26.5C9 26.5 9.8 5 14.5 5c3.9 0 5.2 8.2 7.4 12.6"
        stroke={bramble}
        strokeWidth={2.4}
        strokeLinecap="round"
      />
      <Path d="M9.3 17.2L5.2 17.7L8.3 20.6zM11.3 9.6L7.3 9.3L10.2 13zM18.2 8.3L22 8.7L19.4 11.8z" fill={bramble} />
      {berries.map(([x, y]) => (
        <Circle key={`${x} ${y}`} cx={x} cy={y} r={1.77} fill={bramble} />
      ))}
    </Svg>
  );
}
