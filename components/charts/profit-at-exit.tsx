import { scaleLinear } from 'd3-scale';
import { G, Line, Rect } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { TriangleUp } from '@/components/charts/chart-marks';
import { ChartText, fitMiddle, keepApart, textWidth } from '@/components/charts/chart-text';
import { listWords } from '@/components/charts/list-words';
import { formatMoney, formatOdds } from '@/components/ui/number-format';
import { type ColourName } from '@/components/ui/theme/colours';
import { useColours } from '@/components/ui/theme/use-theme';

/** A single profit that carries probability of its own. */
interface ProfitLump {
  readonly profit: number;
  readonly probability: number;
}

/** The continuous part between two profits. */
interface ProfitSpan {
  readonly from: number;
  readonly to: number;
  readonly probability: number;
}

export interface ProfitPicture {
  readonly lumps: readonly ProfitLump[];
  readonly classes: readonly ProfitSpan[];
  readonly mean: number;
  /** Named in the sentence; the block around names it for the eye. */
  readonly currency: string;
}

interface Props extends ProfitPicture {
  readonly width?: number;
}

const INSET = 36;
const LUMP = 22;
const TOP = 44;
const FOOT = 134;
const HEIGHT = 182;
/** Classes lower than this leave room for words above them. */
const LOW_CLASS = 18;

/** The distribution of profit: lumps as wide bars, the part between them to the same scale, zero and the mean. */
export function ProfitAtExit({ width, ...picture }: Props) {
  return (
    <ChartCanvas label={profitAtExitSentence(picture)} height={HEIGHT} width={width}>
      {(shown) => <Picture width={shown} {...picture} />}
    </ChartCanvas>
  );
}

/** From profit to pixels. */
export function profitScale({ lumps, classes, mean }: Omit<ProfitPicture, 'currency'>, width: number) {
  const values = [
    0,
    mean,
    ...lumps.map(({ profit }) => profit),
    ...classes.flatMap(({ from, to }) => [from, to]),
  ].filter(Number.isFinite);
  const low = Math.min(...values);
  const high = Math.max(...values);
  return scaleLinear(low < high ? [low, high] : [low - 1, high + 1], [INSET, Math.max(INSET + 1, width - INSET)]);
}

function Picture({ width, lumps, classes, mean }: ProfitPicture & { width: number }) {
  const colours = useColours();
  const x = profitScale({ lumps, classes, mean }, width);
  const most = Math.max(
    ...lumps.map(({ probability }) => probability),
    ...classes.map(({ probability }) => probability),
    1e-9,
  );
  const height = (probability: number) => Math.max(3, ((FOOT - TOP) * probability) / most);
  const isLow = classes.every(({ probability }) => height(probability) <= LOW_CLASS);
  const percents = keepApart(
    [...lumps]
      .sort((a, b) => b.probability - a.probability)
      .map((lump) => ({
        x: x(lump.profit),
        text: formatOdds(lump.probability),
        y: FOOT - height(lump.probability) - 8,
      })),
    { size: 14 },
  );
  return (
    <>
      <Line x1={0} x2={width} y1={FOOT} y2={FOOT} stroke={colours.edge} />
      {classes.map(({ from, to, probability }) => (
        <Rect
          key={from}
          x={x(from)}
          y={FOOT - height(probability)}
          width={Math.max(1, x(to) - x(from) - 1)}
          height={height(probability)}
          fill={colours[hueOf((from + to) / 2)]}
          fillOpacity={0.78}
        />
      ))}
      {lumps.map(({ profit, probability }) => (
        <Rect
          key={profit}
          x={x(profit) - LUMP / 2}
          y={FOOT - height(probability)}
          width={LUMP}
          height={height(probability)}
          rx={2}
          fill={colours[hueOf(profit)]}
        />
      ))}
      <Line
        x1={x(0)}
        x2={x(0)}
        y1={isLow ? 18 : TOP - 14}
        y2={FOOT + 5}
        stroke={colours.ink}
        strokeWidth={1.5}
        strokeDasharray="2 3"
      />
      {percents.map(({ x: middle, y, text }) => (
        <ChartText key={middle} x={middle} y={y} anchor="middle" weight="semibold" colour="ink" size={14}>
          {text}
        </ChartText>
      ))}
      <Sides width={width} lumps={lumps} classes={classes} x={x} isLow={isLow} />
      <Amounts width={width} lumps={lumps} classes={classes} x={x} />
      <Mean width={width} mean={mean} x={x} />
    </>
  );
}

type Scale = ReturnType<typeof profitScale>;
type Part = Pick<ProfitPicture, 'lumps' | 'classes'> & { readonly width: number; readonly x: Scale };

/** How much of the part between the lumps lies on either side of zero, where there is room for the words. */
function Sides({ width, lumps, classes, x, isLow }: Part & { isLow: boolean }) {
  const { loss, gain } = sidesOf(classes);
  const edges = classes.flatMap(({ from, to }) => [from, to]);
  if (edges.length === 0) return null;
  const between = lumps.length > 1 ? 'between: ' : '';
  const clear = (from: number, to: number) => {
    const inner = lumps.map(({ profit }) => x(profit));
    const left = Math.max(0, from, ...inner.filter((at) => at <= from + 1).map((at) => at + LUMP / 2));
    const right = Math.min(width, to, ...inner.filter((at) => at >= to - 1).map((at) => at - LUMP / 2));
    return { left, right };
  };
  const sides = [
    {
      name: 'loss',
      share: loss,
      ...clear(x(Math.min(0, ...edges)), x(Math.min(0, Math.max(...edges)))),
      lead: between,
    },
    {
      name: 'gain',
      share: gain,
      ...clear(x(Math.max(0, Math.min(...edges))), x(Math.max(0, ...edges))),
      lead: loss > 0 ? '' : between,
    },
  ];
  return sides.map(({ name, share, left, right, lead }) => {
    if (share <= 0) return null;
    const texts = [`${lead}${formatOdds(share)} ${name}`, `${formatOdds(share)} ${name}`];
    const text = texts.find((candidate) => textWidth(candidate) <= right - left - 4);
    if (text === undefined) return null;
    return (
      <ChartText key={name} x={(left + right) / 2} y={isLow ? FOOT - LOW_CLASS - 6 : 22} anchor="middle">
        {text}
      </ChartText>
    );
  });
}

function Amounts({ width, lumps, classes, x }: Part) {
  const ends = [classes[0]?.from, classes.at(-1)?.to].filter((value) => value !== undefined);
  const wanted = [
    ...[...lumps].sort((a, b) => b.probability - a.probability).map(({ profit }) => ({ profit, isLump: true })),
    { profit: 0, isLump: false },
    ...ends.map((profit) => ({ profit, isLump: false })),
  ].map(({ profit, isLump }) => {
    const text = signed(profit, isLump ? 2 : 0);
    return { text, x: fitMiddle(x(profit), text, width), isLump };
  });
  return keepApart(wanted).map(({ text, x: middle, isLump }) => (
    <ChartText key={text} x={middle} y={FOOT + 18} anchor="middle" colour={isLump ? 'ink' : 'inkSoft'}>
      {text}
    </ChartText>
  ));
}

function Mean({ width, mean, x }: { width: number; mean: number; x: Scale }) {
  const colours = useColours();
  if (!Number.isFinite(mean)) return null;
  const text = `mean ${signed(mean)}`;
  return (
    <G>
      <TriangleUp x={x(mean)} y={FOOT + 23} width={10} height={8} fill={colours.ink} />
      <ChartText x={fitMiddle(x(mean), text, width)} y={FOOT + 45} anchor="middle" weight="semibold" colour="ink">
        {text}
      </ChartText>
    </G>
  );
}

const hueOf = (profit: number): ColourName => (profit > 0 ? 'tide' : profit < 0 ? 'rust' : 'inkSoft');
const signed = (profit: number, places = 2) => formatMoney(profit, { sign: true, places });

function sidesOf(classes: readonly ProfitSpan[]): { loss: number; gain: number } {
  const sum = (spans: readonly ProfitSpan[]) => spans.reduce((total, { probability }) => total + probability, 0);
  const isLoss = ({ from, to }: ProfitSpan) => from + to <= 0;
  return { loss: sum(classes.filter(isLoss)), gain: sum(classes.filter((span) => !isLoss(span))) };
}

/** The distribution in one sentence. */
export function profitAtExitSentence({ lumps, classes, mean, currency }: ProfitPicture): string {
  const { loss, gain } = sidesOf(classes);
  const sides = [
    ...(loss > 0 ? [`${formatOdds(loss)} at a loss`] : []),
    ...(gain > 0 ? [`${formatOdds(gain)} at a profit`] : []),
  ];
  const parts = [
    ...lumps.map(({ profit, probability }) => `${formatOdds(probability)} at ${signed(profit)}`),
    ...(sides.length === 0 ? [] : [`${lumps.length > 0 ? 'otherwise ' : ''}${listWords(sides)}`]),
    ...(Number.isFinite(mean) ? [`mean ${signed(mean)}`] : []),
  ];
  return parts.length === 0 ? 'No profit forecast yet.' : `Profit in ${currency}: ${parts.join('; ')}.`;
}
