import Svg, { Path } from 'react-native-svg';
import { iconShapes, type IconName } from '@/components/ui/icon-shapes';
import { type ColourName } from '@/components/ui/theme/colours';
import { useColours } from '@/components/ui/theme/use-theme';

interface Props {
  readonly name: IconName;
  readonly size?: number;
  readonly colour?: ColourName;
}

/** A drawing beside words; screen readers skip it, so a control with an icon alone needs a label of its own. */
export function Icon({ name, size = 24, colour = 'ink' }: Props) {
  const stroke = useColours()[colour];
  const { lines, dots } = iconShapes[name];
  return (
    <Svg width={size} height={size} viewBox="0 0 24 24" fill="none" aria-hidden>
      <Path d={lines} stroke={stroke} strokeWidth={1.75} strokeLinecap="round" strokeLinejoin="round" />
      {dots === undefined ? null : <Path d={dots} fill={stroke} />}
    </Svg>
  );
}
