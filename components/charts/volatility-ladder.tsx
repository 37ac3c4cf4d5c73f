import { scaleLinear, type ScaleLinear } from 'd3-scale';
import { type ReactNode } from 'react';
import { Pressable, View } from 'react-native';
import { Circle, G, Line, Path } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { ChartText } from '@/components/charts/chart-text';
import { formatNumber, formatPercent } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { radius } from '@/components/ui/theme/metrics';
import { useColours } from '@/components/ui/theme/use-theme';
import { useArrowKeys } from '@/components/ui/use-arrow-keys';

export interface LadderRung {
  readonly key: string;
  readonly label: string;
  /** Fractions per session, with the interval's ends. */
  readonly dailyVolatility: number;
  readonly low: number;
  readonly high: number;
}

/** Fractions per session. */
export interface LadderImplied {
  readonly mid: number;
  readonly bid?: number;
  readonly ask?: number;
}

interface Props {
  readonly rungs: readonly LadderRung[];
  /** Null when the figure in use is on no rung. */
  readonly chosenKey: string | null;
  /** Makes the rungs a choice; without it the ladder is a picture. */
  readonly onChoose?: (key: string) => void;
  readonly implied?: LadderImplied;
  /** Names the choice for screen readers. */
  readonly label?: string;
  readonly rungHeight?: number;
  readonly width?: number;
}

const LABEL = 118;
const VALUE = 52;
const PAD = 8;
const AXIS = 24;

/** Volatility by window as rungs with intervals; the chosen one's interval runs through all as two rails. */
export function VolatilityLadder({
  rungs,
  chosenKey,
  onChoose,
  implied,
  label = 'Volatility a session',
  rungHeight = 34,
  width,
}: Props) {
  const colours = useColours();
  const isChoice = onChoose !== undefined;
  const chosen = rungs.find((rung) => rung.key === chosenKey);
  if (rungs.length === 0 && implied === undefined) return null;
  const rows = rungs.length + (implied === undefined ? 0 : 1);
  return (
    <View style={{ width: width ?? '100%' }}>
      {isChoice ? (
        <RungChoice rungs={rungs} chosenKey={chosenKey} onChoose={onChoose} label={label} rungHeight={rungHeight} />
      ) : (
        <View aria-hidden>
          {rungs.map((rung) => (
            <RungWords key={rung.key} rung={rung} isChosen={rung === chosen} height={rungHeight} />
          ))}
        </View>
      )}
      {implied === undefined ? null : <ImpliedWords implied={implied} height={rungHeight} isSpoken={isChoice} />}
      <View style={{ height: AXIS }} />
      <View style={{ position: 'absolute', inset: 0, pointerEvents: 'none' }}>
        <ChartCanvas
          label={isChoice ? null : ladderSentence(rungs, chosenKey, implied)}
          height={rows * rungHeight + AXIS}
          width={width}
        >
          {(shown) => {
            const x = ladderScale(rungs, implied, shown);
            return (
              <>
                <Axis x={x} foot={rows * rungHeight} />
                {chosen === undefined ? null : <Rails x={x} rung={chosen} foot={rows * rungHeight} />}
                {rungs.map((rung, index) => (
                  <Interval
                    key={rung.key}
                    x={x}
                    rung={rung}
                    y={(index + 0.5) * rungHeight}
                    isChosen={rung === chosen}
                  />
                ))}
                {implied === undefined ? null : (
                  <Implied x={x} implied={implied} y={(rows - 0.5) * rungHeight} ink={colours.ink} />
                )}
              </>
            );
          }}
        </ChartCanvas>
      </View>
    </View>
  );
}

type Scale = ScaleLinear<number, number>;

/** From a volatility per session to pixels: all intervals and 5% on either side. */
export function ladderScale(rungs: readonly LadderRung[], implied: LadderImplied | undefined, width: number): Scale {
  const values = [
    ...rungs.flatMap(({ low, high, dailyVolatility }) => [low, high, dailyVolatility]),
    ...(implied === undefined ? [] : [implied.mid, implied.bid ?? implied.mid, implied.ask ?? implied.mid]),
  ].filter(Number.isFinite);
  const low = Math.min(...values);
  const high = Math.max(...values);
  const margin = high > low ? (high - low) * 0.05 : Math.abs(low) * 0.1 + 1e-4;
  const from = PAD + LABEL + 6;
  return scaleLinear(values.length === 0 ? [0, 0.02] : [low - margin, high + margin], [
    from,
    Math.max(from + 1, width - PAD - VALUE - 10),
  ]);
}

interface ChoiceProps {
  readonly rungs: readonly LadderRung[];
  readonly chosenKey: string | null;
  readonly onChoose: (key: string) => void;
  readonly label: string;
  readonly rungHeight: number;
}

function RungChoice({ rungs, chosenKey, onChoose, label, rungHeight }: ChoiceProps) {
  const chosenAt = rungs.findIndex((rung) => rung.key === chosenKey);
  const { onKeyDown, itemRef } = useArrowKeys({
    count: rungs.length,
    current: Math.max(0, chosenAt),
    onMove: (index) => {
      const rung = rungs[index];
      if (rung !== undefined) onChoose(rung.key);
    },
  });
  return (
    <View role="radiogroup" aria-label={label} {...{ onKeyDown }}>
      {rungs.map((rung, index) => (
        <Pressable
          key={rung.key}
          ref={itemRef(index)}
          role="radio"
          aria-checked={index === chosenAt}
          aria-label={rungWords(rung)}
          {...{ tabIndex: index === Math.max(0, chosenAt) ? 0 : -1 }}
          onPress={() => onChoose(rung.key)}
          style={{ borderRadius: radius.control }}
        >
          <RungWords rung={rung} isChosen={index === chosenAt} height={rungHeight} />
        </Pressable>
      ))}
    </View>
  );
}

function RungWords({ rung, isChosen, height }: { rung: LadderRung; isChosen: boolean; height: number }) {
  const colours = useColours();
  return (
    <Row height={height} ground={isChosen ? colours.brambleWash : undefined}>
      <Txt
        size="row"
        weight={isChosen ? 'semibold' : 'regular'}
        colour={isChosen ? 'bramble' : 'ink'}
        numberOfLines={1}
        style={{ width: LABEL }}
      >
        {rung.label}
      </Txt>
      <Txt size="row" weight="semibold" colour={isChosen ? 'bramble' : 'ink'} align="right" style={{ width: VALUE }}>
        {formatPercent(rung.dailyVolatility, 2)}
      </Txt>
    </Row>
  );
}

function ImpliedWords({ implied, height, isSpoken }: { implied: LadderImplied; height: number; isSpoken: boolean }) {
  return (
    <View
      {...(isSpoken
        ? ({ role: 'note', 'aria-label': impliedWords(implied) } as const)
        : ({ 'aria-hidden': true } as const))}
    >
      <Row height={height}>
        <Txt size="row" style={{ width: LABEL }}>
          Market-implied
        </Txt>
        <Txt size="row" weight="semibold" align="right" style={{ width: VALUE }}>
          {formatPercent(implied.mid, 2)}
        </Txt>
      </Row>
    </View>
  );
}

function Row({ height, ground, children }: { height: number; ground?: string; children: ReactNode }) {
  return (
    <View
      style={{
        height,
        flexDirection: 'row',
        alignItems: 'center',
        justifyContent: 'space-between',
        paddingHorizontal: PAD,
        borderRadius: radius.control,
        backgroundColor: ground,
      }}
    >
      {children}
    </View>
  );
}

function Axis({ x, foot }: { x: Scale; foot: number }) {
  const [from = 0, to = 0] = x.range();
  // A narrow phone leaves room for one or two numbers only.
  const count = Math.max(1, Math.min(4, Math.floor((to - from) / 28)));
  return x.ticks(count).map((tick) => (
    <ChartText key={tick} x={x(tick)} y={foot + 18} anchor="middle">
      {formatNumber(tick * 100, 1)}
    </ChartText>
  ));
}

function Rails({ x, rung, foot }: { x: Scale; rung: LadderRung; foot: number }) {
  const { bramble, inkSoft } = useColours();
  return (
    <G>
      {[rung.low, rung.high].filter(Number.isFinite).map((value, index) => (
        <Line
          key={index}
          x1={x(value)}
          x2={x(value)}
          y1={0}
          y2={foot}
          stroke={bramble}
          strokeWidth={1.5}
          strokeOpacity={0.62}
        />
      ))}
      <Line
        x1={x(rung.dailyVolatility)}
        x2={x(rung.dailyVolatility)}
        y1={0}
        y2={foot}
        stroke={inkSoft}
        strokeDasharray="1.5 3"
      />
    </G>
  );
}

function Interval({ x, rung, y, isChosen }: { x: Scale; rung: LadderRung; y: number; isChosen: boolean }) {
  const colours = useColours();
  if (!Number.isFinite(rung.dailyVolatility)) return null;
  const hasInterval = Number.isFinite(rung.low) && Number.isFinite(rung.high);
  return (
    <G>
      {hasInterval ? (
        <Line
          x1={x(rung.low)}
          x2={x(rung.high)}
          y1={y}
          y2={y}
          stroke={isChosen ? colours.bramble : colours.edge}
          strokeWidth={isChosen ? 5 : 3}
          strokeLinecap="round"
        />
      ) : null}
      <Circle
        cx={x(rung.dailyVolatility)}
        cy={y}
        r={isChosen ? 6 : 4.5}
        fill={isChosen ? colours.bramble : colours.inkSoft}
        stroke={isChosen ? colours.brambleWash : colours.sheet}
        strokeWidth={2}
      />
    </G>
  );
}

function Implied({ x, implied, y, ink }: { x: Scale; implied: LadderImplied; y: number; ink: string }) {
  const { mid, bid, ask } = implied;
  if (!Number.isFinite(mid)) return null;
  return (
    <G>
      {bid === undefined || ask === undefined ? null : (
        <Line x1={x(bid)} x2={x(ask)} y1={y} y2={y} stroke={ink} strokeWidth={2.5} strokeDasharray="2.5 2.5" />
      )}
      <Path d={`M${x(mid)},${y - 6.5}l6.5,6.5l-6.5,6.5l-6.5,-6.5Z`} fill={ink} />
    </G>
  );
}

function rungWords({ label, dailyVolatility, low, high }: LadderRung): string {
  return `${label}: ${formatPercent(dailyVolatility, 2)} a session, interval ${formatPercent(low, 2)} to ${formatPercent(high, 2)}`;
}

function impliedWords({ mid, bid, ask }: LadderImplied): string {
  const range =
    bid === undefined || ask === undefined ? '' : `, bid ${formatPercent(bid, 2)} to ask ${formatPercent(ask, 2)}`;
  return `Market-implied: ${formatPercent(mid, 2)} a session${range}`;
}

/** The ladder in one sentence. */
export function ladderSentence(
  rungs: readonly LadderRung[],
  chosenKey: string | null,
  implied?: LadderImplied,
): string {
  const words = [
    ...rungs.map((rung) => `${rungWords(rung)}${rung.key === chosenKey ? ', chosen' : ''}`),
    ...(implied === undefined ? [] : [impliedWords(implied)]),
  ];
  return words.length === 0 ? 'No volatility yet.' : `${words.join('; ')}.`;
}
