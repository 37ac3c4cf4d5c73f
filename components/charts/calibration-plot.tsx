import { scaleLinear } from 'd3-scale';
import { area, line } from 'd3-shape';
import { View } from 'react-native';
import { Circle, G, Line, Path } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { ChartKey } from '@/components/charts/chart-key';
import { ChartText, textWidth } from '@/components/charts/chart-text';
import { formatOdds, formatPercent } from '@/components/ui/number-format';
import { useColours } from '@/components/ui/theme/use-theme';

interface CalibrationBin {
  /** Fractions in [0, 1]: mean stated odds, and the share that came true. */
  readonly forecast: number;
  readonly observed: number;
  readonly count: number;
  /** Where a perfect record would fall. */
  readonly low: number;
  readonly high: number;
}

interface CalibrationPoint {
  readonly forecast: number;
  readonly observed: number;
}

export interface CalibrationPicture {
  /** By stated odds, lowest first. */
  readonly bins: readonly CalibrationBin[];
  readonly curve?: readonly CalibrationPoint[];
  /** Where the curve of a perfect record would lie; the bins' own ranges when left out. */
  readonly band?: readonly Pick<CalibrationBin, 'forecast' | 'low' | 'high'>[];
  /** Bins with fewer are drawn open. */
  readonly thinBelow?: number;
  /** Words at the point the sentence above speaks of: "28 of 46 = 61%". */
  readonly callout?: CalibrationPoint & { readonly text: string };
  /** How often a perfect record stays in the band, as words: "9 times in 10". */
  readonly bandWords?: string;
}

interface Props extends CalibrationPicture {
  readonly width?: number;
}

const LEFT = 42;
const RIGHT = 8;
const TOP = 10;
const BELOW = 38;

const quarters = [0, 0.25, 0.5, 0.75, 1];

/** Stated odds against how often they came true. */
export function CalibrationPlot({ width, ...picture }: Props) {
  const { bins, thinBelow = 20, bandWords = '9 times in 10' } = picture;
  const hasThin = bins.some(({ count }) => count < thinBelow);
  return (
    <View style={{ gap: 10 }}>
      <ChartCanvas label={calibrationSentence(picture)} height={(shown) => sideOf(shown) + TOP + BELOW} width={width}>
        {(shown) => <Plot side={sideOf(shown)} {...picture} thinBelow={thinBelow} />}
      </ChartCanvas>
      <ChartKey
        items={[
          { key: 'consistency', mark: 'consistency', text: `where a perfect record would fall, ${bandWords}` },
          ...(hasThin ? [{ key: 'thin', mark: 'thin' as const, text: `fewer than ${thinBelow}` }] : []),
          { key: 'diagonal', mark: 'diagonal', text: 'stated = came true' },
        ]}
      />
    </View>
  );
}

/** The plot is square and no taller than a screen. */
const sideOf = (width: number) => Math.min(480, Math.max(120, width - LEFT - RIGHT));

/** From fractions to pixels in a square of `side`. */
export function calibrationScales(side: number) {
  return {
    x: scaleLinear([0, 1], [LEFT, LEFT + side]).clamp(true),
    y: scaleLinear([0, 1], [TOP + side, TOP]).clamp(true),
  };
}

type Scales = ReturnType<typeof calibrationScales>;

function Plot({
  side,
  bins,
  curve = [],
  band: bandPoints = bins,
  thinBelow,
  callout,
}: CalibrationPicture & { side: number; thinBelow: number }) {
  const colours = useColours();
  const scales = calibrationScales(side);
  const { x, y } = scales;
  const known = bins.filter(({ forecast, observed }) => Number.isFinite(forecast) && Number.isFinite(observed));
  const banded = bandPoints.filter(({ low, high }) => Number.isFinite(low) && Number.isFinite(high));
  const band = area<Pick<CalibrationBin, 'forecast' | 'low' | 'high'>>(
    ({ forecast }) => x(forecast),
    ({ low }) => y(low),
    ({ high }) => y(high),
  );
  const isotonic = line<CalibrationPoint>(
    ({ forecast }) => x(forecast),
    ({ observed }) => y(observed),
  );
  return (
    <>
      <Grid scales={scales} side={side} />
      {banded.length > 1 ? (
        <Path
          d={band(banded) ?? ''}
          fill={colours.bramble}
          fillOpacity={0.12}
          stroke={colours.bramble}
          strokeOpacity={0.55}
        />
      ) : null}
      {banded.length === 1 && banded[0] !== undefined ? (
        <Line
          x1={x(banded[0].forecast)}
          x2={x(banded[0].forecast)}
          y1={y(banded[0].low)}
          y2={y(banded[0].high)}
          stroke={colours.bramble}
          strokeOpacity={0.3}
          strokeWidth={9}
        />
      ) : null}
      <Line x1={x(0)} y1={y(0)} x2={x(1)} y2={y(1)} stroke={colours.ink} strokeWidth={1.25} />
      {curve.length > 1 ? (
        <Path
          d={isotonic([...curve]) ?? ''}
          fill="none"
          stroke={colours.bramble}
          strokeWidth={2.5}
          strokeLinejoin="round"
        />
      ) : null}
      {known.map(({ forecast, observed, count }, index) => {
        const isThin = count < thinBelow;
        return (
          <Circle
            key={index}
            cx={x(forecast)}
            cy={y(observed)}
            r={dotRadius(count)}
            fill={isThin ? colours.sheet : colours.bramble}
            fillOpacity={isThin ? 1 : 0.85}
            stroke={colours.bramble}
            strokeWidth={isThin ? 1.75 : 1}
            strokeDasharray={isThin ? '1.6 2.2' : undefined}
          />
        );
      })}
      {known.length > 0 ? null : (
        <ChartText x={LEFT + side / 2} y={TOP + side * 0.25} anchor="middle" size={14}>
          No odds resolved yet
        </ChartText>
      )}
      {callout === undefined ? null : (
        <Callout {...callout} scales={scales} side={side} count={countAt(known, callout)} />
      )}
    </>
  );
}

/** Radius of a dot, in points: its area grows with the count. */
export function dotRadius(count: number): number {
  return 2 + 1.15 * Math.sqrt(Math.max(0, count));
}

function Grid({ scales: { x, y }, side }: { scales: Scales; side: number }) {
  const colours = useColours();
  return (
    <>
      {quarters.map((at) => (
        <G key={at}>
          <Line x1={LEFT} x2={LEFT + side} y1={y(at)} y2={y(at)} stroke={at === 0 ? colours.edge : colours.rule} />
          <ChartText x={LEFT - 8} y={y(at) + 4} anchor="end">
            {formatPercent(at)}
          </ChartText>
          <ChartText x={x(at)} y={TOP + side + 18} anchor={at === 0 ? 'start' : at === 1 ? 'end' : 'middle'}>
            {formatPercent(at)}
          </ChartText>
        </G>
      ))}
      <ChartText x={LEFT + 6} y={TOP + 15}>
        came true
      </ChartText>
      <ChartText x={LEFT + side / 2} y={TOP + side + 34} anchor="middle">
        stated odds
      </ChartText>
    </>
  );
}

/** Words below and to the right of their dot, or wherever the plot leaves room. */
function Callout({
  forecast,
  observed,
  text,
  scales: { x, y },
  side,
  count,
}: CalibrationPoint & { text: string; scales: Scales; side: number; count: number }) {
  const colours = useColours();
  const at = { x: x(forecast), y: y(observed) };
  const half = textWidth(text) / 2 + 4;
  const isBelow = at.y + 60 < TOP + side;
  const middle = Math.min(LEFT + side - half, Math.max(LEFT + half, at.x + 26));
  const baseline = isBelow ? at.y + 52 : at.y - 42;
  const reach = dotRadius(count) + 2;
  const end = { x: middle, y: isBelow ? baseline - 14 : baseline + 5 };
  const length = Math.hypot(end.x - at.x, end.y - at.y);
  return (
    <>
      <Line
        x1={at.x + ((end.x - at.x) * reach) / length}
        y1={at.y + ((end.y - at.y) * reach) / length}
        x2={end.x}
        y2={end.y}
        stroke={colours.ink}
      />
      <ChartText x={middle} y={baseline} anchor="middle" weight="semibold" colour="ink">
        {text}
      </ChartText>
    </>
  );
}

function countAt(bins: readonly CalibrationBin[], { forecast }: CalibrationPoint): number {
  const nearest = [...bins].sort((a, b) => Math.abs(a.forecast - forecast) - Math.abs(b.forecast - forecast))[0];
  return nearest?.count ?? 0;
}

/** The plot in one sentence. */
export function calibrationSentence({ bins, thinBelow = 20 }: CalibrationPicture): string {
  const known = bins.filter(({ forecast, observed }) => Number.isFinite(forecast) && Number.isFinite(observed));
  if (known.length === 0) return 'No odds are resolved yet.';
  const total = known.reduce((sum, { count }) => sum + count, 0);
  const levels = known.map(
    ({ forecast, observed, count }) =>
      `stated ${formatOdds(forecast)}, came true ${count < thinBelow ? `${Math.round(observed * count)} of ${count}` : `${formatPercent(observed)} of ${count}`}`,
  );
  return `Calibration of ${total} resolved odds: ${levels.join('; ')}.`;
}
