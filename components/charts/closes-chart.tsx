import { extent } from 'd3-array';
import { scaleLinear } from 'd3-scale';
import { line } from 'd3-shape';
import { View } from 'react-native';
import { Circle, G, Line, Path, Rect } from 'react-native-svg';
import { decimalsForStep, priceText } from '@/components/charts/axis-number';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { ChartKey } from '@/components/charts/chart-key';
import { ChartText, keepApart, textWidth } from '@/components/charts/chart-text';
import { formatDate, formatNumber } from '@/components/ui/number-format';
import { useColours } from '@/components/ui/theme/use-theme';

export interface CloseBar {
  /** 'YYYY-MM-DD'. */
  readonly date: string;
  /** NaN leaves a gap. */
  readonly close: number;
}

export interface CloseEvent {
  readonly date: string;
  readonly label: string;
}

export interface ClosesPicture {
  /** Oldest first. */
  readonly bars: readonly CloseBar[];
  /** Shades this many of the last bars: those behind the volatility in use. */
  readonly highlightLast?: number;
  readonly events?: readonly CloseEvent[];
}

interface Props extends ClosesPicture {
  readonly width?: number;
}

const LEFT = 8;
const TOP = 12;
const FOOT = 152;
const HEIGHT = 182;

/** Closes over the sessions, evenly spaced, with the last of them shaded. */
export function ClosesChart({ width, ...picture }: Props) {
  const known = eventsOn(picture);
  return (
    <View style={{ gap: 8 }}>
      <ChartCanvas label={closesSentence(picture)} height={HEIGHT} width={width}>
        {(shown) => (hasCloses(picture.bars) ? <Picture width={shown} {...picture} /> : <Empty width={shown} />)}
      </ChartCanvas>
      <ChartKey
        items={known.map(({ date, label }) => ({
          key: `${date}-${label}`,
          mark: 'event',
          text: label,
          value: formatDate(date, 'short'),
        }))}
      />
    </View>
  );
}

/** From the place among the bars, and from the close, to pixels. */
export function closesScales(bars: readonly CloseBar[], width: number) {
  const [low = 0, high = 1] = extent(bars.map(({ close }) => close).filter(Number.isFinite));
  const margin = low < high ? (high - low) * 0.06 : Math.abs(low) * 0.02 || 1;
  const y = scaleLinear([low - margin, high + margin], [FOOT, TOP]);
  const ticks = y.ticks(5);
  const decimals = Math.max(decimalsForStep((ticks[1] ?? 1) - (ticks[0] ?? 0)) - 1, low < 1000 ? 2 : 0);
  const labels = ticks.map((at) => ({ at, text: formatNumber(at, decimals) }));
  const right = width - Math.max(...labels.map(({ text }) => textWidth(text)), 0) - 16;
  const x = scaleLinear(bars.length > 1 ? [0, bars.length - 1] : [-1, 1], [LEFT, Math.max(LEFT + 1, right)]);
  return { x, y, labels, right };
}

function Picture({ width, bars, highlightLast = 0, events }: ClosesPicture & { width: number }) {
  const colours = useColours();
  const { x, y, labels, right } = closesScales(bars, width);
  const path = line<CloseBar>(
    (_, index) => x(index),
    ({ close }) => y(close),
  ).defined(({ close }) => Number.isFinite(close));
  const lastIndex = bars.findLastIndex(({ close }) => Number.isFinite(close));
  const last = bars[lastIndex];
  const shaded = Math.min(highlightLast, bars.length);
  const from = x(bars.length - shaded);
  const words = `last ${shaded}`;
  return (
    <>
      {shaded > 1 ? (
        <G>
          <Rect
            x={from}
            y={TOP - 8}
            width={Math.max(2, right - from)}
            height={FOOT - TOP + 8}
            fill={colours.bramble}
            fillOpacity={0.08}
          />
          <ChartText
            x={Math.max(right - 2, from + textWidth(words))}
            y={FOOT - 6}
            anchor="end"
            weight="medium"
            colour="bramble"
            halo="sheet"
          >
            {words}
          </ChartText>
        </G>
      ) : null}
      {labels.map(({ at, text }) => (
        <G key={at}>
          <Line x1={LEFT} x2={right} y1={y(at)} y2={y(at)} stroke={colours.rule} />
          <ChartText x={width} y={y(at) + 4} anchor="end">
            {text}
          </ChartText>
        </G>
      ))}
      {eventsOn({ bars, events }).map(({ date, label }) => {
        const at = x(bars.findIndex((bar) => bar.date === date));
        return (
          <Line
            key={`${date}-${label}`}
            x1={at}
            x2={at}
            y1={TOP}
            y2={FOOT}
            stroke={colours.ink}
            strokeWidth={1.5}
            strokeDasharray="2 3"
          />
        );
      })}
      <Path d={path([...bars]) ?? ''} fill="none" stroke={colours.ink} strokeWidth={1.75} strokeLinejoin="round" />
      {last === undefined ? null : <Circle cx={x(lastIndex)} cy={y(last.close)} r={4.5} fill={colours.ink} />}
      <Months bars={bars} x={x} right={right} />
    </>
  );
}

function Months({ bars, x, right }: { bars: readonly CloseBar[]; x: (index: number) => number; right: number }) {
  const colours = useColours();
  return keepApart(
    dateTicks(bars).map(({ index, text }) => ({ x: x(index), text })),
    { gap: 12 },
  ).map(({ x: at, text }) => (
    <G key={at}>
      <Line x1={at} x2={at} y1={FOOT} y2={FOOT + 5} stroke={colours.edge} />
      <ChartText
        x={Math.min(Math.max(at, textWidth(text) / 2), Math.max(0, right - textWidth(text) / 2))}
        y={FOOT + 20}
        anchor="middle"
      >
        {text}
      </ChartText>
    </G>
  ));
}

/** First sessions of the months by name, Januaries by year; the first and last date where fewer than two months begin. */
export function dateTicks(bars: readonly CloseBar[]): { index: number; text: string }[] {
  const firsts = bars.flatMap(({ date }, index) => {
    const before = bars[index - 1];
    if (before === undefined || before.date.slice(0, 7) === date.slice(0, 7)) return [];
    const isNewYear = before.date.slice(0, 4) !== date.slice(0, 4);
    return [{ index, text: isNewYear ? date.slice(0, 4) : formatDate(date, 'short').replace(/^\d+ /, '') }];
  });
  if (firsts.length > 1) {
    // Years hold where months would crowd one another out.
    return [...firsts].sort((a, b) => Number(/^\d/.test(b.text)) - Number(/^\d/.test(a.text)));
  }
  const ends = bars.length > 1 ? [0, bars.length - 1] : [0];
  return ends.flatMap((index) => {
    const bar = bars[index];
    return bar === undefined ? [] : [{ index, text: formatDate(bar.date, 'short') }];
  });
}

function Empty({ width }: { width: number }) {
  return (
    <ChartText x={width / 2} y={HEIGHT / 2} anchor="middle" size={14}>
      No closes yet
    </ChartText>
  );
}

const hasCloses = (bars: readonly CloseBar[]) => bars.some(({ close }) => Number.isFinite(close));

function eventsOn({ bars, events = [] }: ClosesPicture): readonly CloseEvent[] {
  const dates = new Set(bars.map(({ date }) => date));
  return events.filter(({ date }) => dates.has(date));
}

/** The closes in one sentence. */
export function closesSentence({ bars, highlightLast, events }: ClosesPicture): string {
  const known = bars.filter(({ close }) => Number.isFinite(close));
  const [first, last] = [known[0], known.at(-1)];
  if (first === undefined || last === undefined) return 'No closes yet.';
  const closes = known.map(({ close }) => close);
  const span =
    known.length === 1
      ? `One close, ${priceText(last.close)} on ${formatDate(last.date, 'long')}`
      : `${known.length} closes, ${priceText(first.close)} on ${formatDate(first.date, 'long')} to ${priceText(last.close)} on ${formatDate(last.date, 'long')}, between ${priceText(Math.min(...closes))} and ${priceText(Math.max(...closes))}`;
  const shaded =
    highlightLast === undefined || highlightLast < 2
      ? ''
      : `; the last ${Math.min(highlightLast, bars.length)} are shaded`;
  const marked = eventsOn({ bars, events }).map(({ date, label }) => `${label} on ${formatDate(date, 'short')}`);
  return `${span}${shaded}${marked.length === 0 ? '' : `; ${marked.join(', ')}`}.`;
}
