import { scaleLinear } from 'd3-scale';
import { Circle, Rect } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { formatPercent } from '@/components/ui/number-format';
import { useColours } from '@/components/ui/theme/use-theme';

export interface YearPlace {
  /** Of the past year's values, those at or below the current one: 0 to 100. */
  readonly percentile: number;
  /** Daily volatilities, fractions. */
  readonly lowerQuartile: number;
  readonly upperQuartile: number;
  readonly current: number;
  readonly lowest: number;
  readonly highest: number;
}

interface Props extends YearPlace {
  readonly width?: number;
}

const HEIGHT = 16;
const INSET = 6;

/** Where volatility stands between the lowest and highest of its own past year; the middle half is shaded. */
export function PlaceInYear({ width, ...place }: Props) {
  return (
    <ChartCanvas label={placeInYearSentence(place)} height={HEIGHT} width={width}>
      {(shown) => <Bar width={shown} {...place} />}
    </ChartCanvas>
  );
}

/** From a volatility to pixels; values beyond the year's ends stay at the ends. */
function yearScale({ lowest, highest }: Pick<YearPlace, 'lowest' | 'highest'>, width: number) {
  const room = [INSET, Math.max(INSET, width - INSET)];
  return scaleLinear(lowest < highest ? [lowest, highest] : [lowest - 1, lowest + 1], room).clamp(true);
}

function Bar({ width, ...place }: YearPlace & { width: number }) {
  const colours = useColours();
  const x = yearScale(place, width);
  const middle = HEIGHT / 2;
  const [from, to] = [x(place.lowerQuartile), x(place.upperQuartile)];
  return (
    <>
      <Rect x={0.5} y={middle - 2.5} width={width - 1} height={5} rx={2.5} fill={colours.well} stroke={colours.rule} />
      {from <= to ? (
        <Rect
          x={from}
          y={middle - 2.5}
          width={Math.max(2, to - from)}
          height={5}
          fill={colours.bramble}
          fillOpacity={0.52}
        />
      ) : null}
      {Number.isFinite(place.current) ? (
        <Circle
          cx={x(place.current)}
          cy={middle}
          r={5}
          fill={colours.bramble}
          stroke={colours.sheet}
          strokeWidth={1.5}
        />
      ) : null}
    </>
  );
}

/** 1st, 2nd, 3rd, 11th, 52nd. */
export function ordinal(whole: number): string {
  const tens = whole % 100;
  const ending = tens >= 11 && tens <= 13 ? 'th' : ({ 1: 'st', 2: 'nd', 3: 'rd' }[whole % 10] ?? 'th');
  return `${whole}${ending}`;
}

/** The bar in one sentence. */
export function placeInYearSentence({
  percentile,
  lowerQuartile,
  upperQuartile,
  current,
  lowest,
  highest,
}: YearPlace): string {
  if (!Number.isFinite(current) || !Number.isFinite(percentile)) return 'Place in its past year not known.';
  const percent = (volatility: number) => formatPercent(volatility, 2);
  return (
    `${percent(current)} a session, ${ordinal(Math.round(percentile))} of 100 in its past year: ` +
    `${percent(lowest)} to ${percent(highest)}, the middle half ${percent(lowerQuartile)} to ${percent(upperQuartile)}.`
  );
}
