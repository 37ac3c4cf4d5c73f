import { scaleLinear } from 'd3-scale';
import { View } from 'react-native';
import { Circle, Line, Rect } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { ChartKey, type KeyItem } from '@/components/charts/chart-key';
import { TriangleDown } from '@/components/charts/chart-marks';
import { formatOdds } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';

export interface StatedOdds {
  readonly label: string;
  /** Fractions in [0, 1]; low and high come from the volatility's interval, in either order. */
  readonly low: number;
  readonly estimate: number;
  readonly high: number;
  readonly marketImplied?: number;
  readonly resampled?: number;
  /** 1 when it came true, 0 when it did not; left out while it is open. */
  readonly outcome?: 0 | 1;
  /** When it will be known, as text: "18 Dec". */
  readonly due?: string;
}

interface Props extends StatedOdds {
  /** In place of the estimate and its interval at the right. */
  readonly valueText?: string;
  /** Given, the interval moves under the band and this stands at its right: "Brier 0.41". */
  readonly footNote?: string;
  /** Percents under the band; meant for the last of several. */
  readonly hasAxis?: boolean;
  readonly width?: number;
}

const HEIGHT = 30;
const INSET = 6;
const MIDDLE = 18;

/** One stated probability on 0 to 100%: interval, estimate, the market's odds, and after the close what happened. */
export function OddsBand({ valueText, footNote, hasAxis = false, width, ...odds }: Props) {
  return (
    <View style={{ gap: 2 }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: 12 }}>
        <Txt size="row" weight="medium" style={{ flexShrink: 1 }}>
          {odds.label}
        </Txt>
        <Value odds={odds} valueText={valueText} hasInterval={footNote === undefined} />
      </View>
      <ChartCanvas label={oddsBandSentence(odds)} height={hasAxis ? HEIGHT + 20 : HEIGHT} width={width}>
        {(shown) => <Band width={shown} {...odds} />}
      </ChartCanvas>
      {hasAxis ? <AxisWords /> : null}
      {footNote === undefined ? null : (
        <View style={{ flexDirection: 'row', justifyContent: 'space-between', gap: 12, flexWrap: 'wrap' }}>
          <Txt size="note" colour="inkSoft">
            {`low to high ${intervalText(odds)}`}
          </Txt>
          <Txt size="note" colour="inkSoft">
            {footNote}
          </Txt>
        </View>
      )}
    </View>
  );
}

function Value({ odds, valueText, hasInterval }: { odds: StatedOdds; valueText?: string; hasInterval: boolean }) {
  const { outcome, due } = odds;
  if (valueText !== undefined) {
    return (
      <Txt size="row" weight="semibold" align="right" style={{ flexShrink: 0 }}>
        {valueText}
      </Txt>
    );
  }
  return (
    <Txt size="row" colour="inkSoft" align="right" style={{ flexShrink: 0 }}>
      <Txt size="body" weight="semibold">
        {oddsText(odds.estimate)}
      </Txt>
      {hasInterval && isKnown(odds) ? ` ${intervalText(odds)}` : ''}
      {outcome === undefined ? (due === undefined ? '' : ` → due ${due}`) : ' → '}
      {outcome === undefined ? null : (
        <Txt size="row" weight="semibold">
          {outcome === 1 ? 'yes' : 'no'}
        </Txt>
      )}
    </Txt>
  );
}

function Band({ width, low, estimate, high, marketImplied, resampled, outcome }: StatedOdds & { width: number }) {
  const colours = useColours();
  const x = scaleLinear([0, 1], [INSET, width - INSET]).clamp(true);
  const [from, to] = [x(Math.min(low, high)), x(Math.max(low, high))];
  const isDrawn = isKnown({ low, estimate, high });
  const intervalWidth = Math.max(4, to - from);
  return (
    <>
      <Rect
        x={INSET}
        y={MIDDLE - 2.5}
        width={Math.max(0, width - 2 * INSET)}
        height={5}
        rx={2.5}
        fill={colours.well}
        stroke={colours.rule}
      />
      {[0.25, 0.5, 0.75].map((at) => (
        <Line key={at} x1={x(at)} x2={x(at)} y1={MIDDLE - 5} y2={MIDDLE + 5} stroke={colours.rule} />
      ))}
      {isDrawn ? (
        <Rect
          x={(from + to - intervalWidth) / 2}
          y={MIDDLE - 7}
          width={intervalWidth}
          height={14}
          rx={Math.min(4, intervalWidth / 2)}
          fill={colours.bramble}
          fillOpacity={0.3}
          stroke={colours.bramble}
          strokeOpacity={0.65}
        />
      ) : null}
      {outcome === undefined || !isDrawn ? null : (
        <Line
          x1={x(estimate)}
          x2={x(outcome)}
          y1={MIDDLE}
          y2={MIDDLE}
          stroke={colours.ink}
          strokeWidth={1.5}
          strokeDasharray="1.5 2.5"
        />
      )}
      {isDrawn ? (
        <Rect x={x(estimate) - 1.5} y={MIDDLE - 10} width={3} height={20} rx={1} fill={colours.bramble} />
      ) : null}
      {resampled === undefined ? null : (
        <Circle cx={x(resampled)} cy={MIDDLE} r={4.5} fill={colours.sheet} stroke={colours.bramble} strokeWidth={2} />
      )}
      {marketImplied === undefined ? null : (
        <TriangleDown x={x(marketImplied)} y={MIDDLE - 8} width={10} height={8} fill={colours.ink} />
      )}
      {outcome === undefined ? null : (
        <>
          <Circle cx={x(outcome)} cy={MIDDLE} r={6} fill={colours.sheet} />
          <Circle cx={x(outcome)} cy={MIDDLE} r={5.5} fill={colours.ink} />
        </>
      )}
    </>
  );
}

function AxisWords() {
  return (
    <View aria-hidden style={{ flexDirection: 'row', justifyContent: 'space-between', marginTop: -20 }}>
      {['0%', '50%', '100%'].map((text) => (
        <Txt key={text} size="note" colour="inkSoft">
          {text}
        </Txt>
      ))}
    </View>
  );
}

const keyItems = {
  estimate: { mark: 'estimate', text: 'estimate' },
  interval: { mark: 'interval', text: 'low to high volatility' },
  market: { mark: 'market', text: 'market-implied' },
  resampled: { mark: 'resampled', text: 'resampled' },
  outcome: { mark: 'landed', text: 'what happened' },
} as const satisfies Record<string, Omit<KeyItem, 'key'>>;

/** What the marks of the bands mean, once under several. */
export function OddsBandKey({ shows }: { shows: readonly (keyof typeof keyItems)[] }) {
  return <ChartKey items={shows.map((key) => ({ key, ...keyItems[key] }))} />;
}

const isKnown = ({ low, estimate, high }: Pick<StatedOdds, 'low' | 'estimate' | 'high'>) =>
  [low, estimate, high].every(Number.isFinite);

const oddsText = (probability: number) => (Number.isFinite(probability) ? formatOdds(probability) : 'not known');

function intervalText({ low, high }: Pick<StatedOdds, 'low' | 'high'>): string {
  return `${oddsText(Math.min(low, high))} to ${oddsText(Math.max(low, high))}`;
}

/** The band in one sentence. */
export function oddsBandSentence(odds: StatedOdds): string {
  const { label, estimate, marketImplied, resampled, outcome, due } = odds;
  if (!isKnown(odds)) return `${label}: not known.`;
  const others = [
    ...(marketImplied === undefined ? [] : [`market-implied ${oddsText(marketImplied)}`]),
    ...(resampled === undefined ? [] : [`resampled ${oddsText(resampled)}`]),
  ];
  const ending =
    outcome === 1
      ? ['it came true']
      : outcome === 0
        ? ['it did not come true']
        : due === undefined
          ? []
          : [`due ${due}`];
  const stated = `${label} ${oddsText(estimate)}, ${intervalText(odds)} from low to high volatility`;
  return `${[stated, ...(others.length === 0 ? [] : [others.join(', ')]), ...ending].join('; ')}.`;
}
