import { scaleLinear } from 'd3-scale';
import { area, line } from 'd3-shape';
import { Circle, G, Line, Path } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { ChartText } from '@/components/charts/chart-text';
import { formatDate, formatMoney } from '@/components/ui/number-format';
import { useColours } from '@/components/ui/theme/use-theme';

interface ProfitPoint {
  readonly sessionDate: string;
  /** Entries closed by then. */
  readonly entries: number;
  readonly expected: number;
  readonly realised: number;
  /** One deviation of the sum. */
  readonly deviation: number;
}

interface Props {
  readonly points: readonly ProfitPoint[];
  readonly currency: string;
  readonly width?: number;
}

const HEIGHT = 240;
const LEFT = 62;
const RIGHT = 12;
const TOP = 16;
const FOOT = 28;

/** Expected and realised profit, summed in the order of time, in the band of one deviation. */
export function ProfitOverTime({ points, currency, width }: Props) {
  return (
    <ChartCanvas label={profitSentence({ points, currency })} height={HEIGHT} width={width}>
      {(shown) => <Paths width={shown} points={points} />}
    </ChartCanvas>
  );
}

function Paths({ width, points }: { width: number; points: readonly ProfitPoint[] }) {
  const colours = useColours();
  const start: ProfitPoint = { sessionDate: '', entries: 0, expected: 0, realised: 0, deviation: 0 };
  const path = [start, ...points];
  const last = path.at(-1) ?? start;
  const values = path.flatMap(({ expected, realised, deviation }) => [
    expected - deviation,
    expected + deviation,
    realised,
  ]);
  const x = scaleLinear([0, Math.max(1, last.entries)], [LEFT, Math.max(LEFT + 1, width - RIGHT)]);
  const y = scaleLinear([Math.min(0, ...values), Math.max(1, ...values)], [HEIGHT - FOOT, TOP]);
  const band = area<ProfitPoint>(
    ({ entries }) => x(entries),
    ({ expected, deviation }) => y(expected - deviation),
    ({ expected, deviation }) => y(expected + deviation),
  );
  const lineOf = (value: (point: ProfitPoint) => number) =>
    line<ProfitPoint>(
      ({ entries }) => x(entries),
      (point) => y(value(point)),
    )(path) ?? '';
  const realisedAbove = last.realised >= last.expected;
  const label = (value: number, isAbove: boolean) =>
    Math.min(HEIGHT - FOOT - 6, Math.max(TOP + 10, y(value) + (isAbove ? -10 : 20)));
  return (
    <>
      {y.ticks(4).map((tick) => (
        <G key={tick}>
          <Line
            x1={LEFT}
            x2={width - RIGHT}
            y1={y(tick)}
            y2={y(tick)}
            stroke={tick === 0 ? colours.edge : colours.rule}
          />
          <ChartText x={LEFT - 8} y={y(tick) + 4} anchor="end">
            {formatMoney(tick, { sign: tick !== 0, places: 0 })}
          </ChartText>
        </G>
      ))}
      <Path
        d={band(path) ?? ''}
        fill={colours.bramble}
        fillOpacity={0.12}
        stroke={colours.bramble}
        strokeOpacity={0.55}
      />
      <Path
        d={lineOf(({ expected }) => expected)}
        fill="none"
        stroke={colours.bramble}
        strokeWidth={2}
        strokeDasharray="5 4"
      />
      <Path
        d={lineOf(({ realised }) => realised)}
        fill="none"
        stroke={colours.ink}
        strokeWidth={2}
        strokeLinejoin="round"
      />
      <Circle cx={x(last.entries)} cy={y(last.realised)} r={4.8} fill={colours.ink} />
      <ChartText
        x={width - RIGHT - 8}
        y={label(last.realised, realisedAbove)}
        anchor="end"
        weight="semibold"
        colour="ink"
        halo="sheet"
      >
        {`realised ${formatMoney(last.realised, { sign: true })}`}
      </ChartText>
      <ChartText
        x={width - RIGHT - 8}
        y={label(last.expected, !realisedAbove)}
        anchor="end"
        weight="semibold"
        colour="bramble"
        halo="sheet"
      >
        {`expected ${formatMoney(last.expected, { sign: true })}`}
      </ChartText>
      <ChartText x={LEFT} y={HEIGHT - 8}>
        {`entry 1, ${formatDate(points[0]?.sessionDate ?? '')}`}
      </ChartText>
      <ChartText x={width - RIGHT} y={HEIGHT - 8} anchor="end">
        {`entry ${last.entries}, ${formatDate(last.sessionDate)}`}
      </ChartText>
    </>
  );
}

/** The chart in one sentence. */
export function profitSentence({ points, currency }: Pick<Props, 'points' | 'currency'>): string {
  const last = points.at(-1);
  if (last === undefined) return 'No entry is closed yet.';
  const money = (value: number) => formatMoney(value, { sign: true, currency });
  return `Over ${last.entries} closed entries the plans expected ${money(last.expected)}, give or take ${formatMoney(last.deviation, { currency })}; realised ${money(last.realised)}.`;
}
