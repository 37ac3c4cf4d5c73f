import { useId } from 'react';
import { Defs, Line, LinearGradient, Rect, Stop } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { ChartKey } from '@/components/charts/chart-key';
import { PastArrow, ReadingDot, TriangleDown, TriangleUp } from '@/components/charts/chart-marks';
import { listWords } from '@/components/charts/list-words';
import { isOnStrip, pastEnd, sigmaScale } from '@/components/charts/sigma-scale';
import { formatSigma } from '@/components/ui/number-format';
import { useColours } from '@/components/ui/theme/use-theme';

interface SigmaMarks {
  readonly strikes: readonly number[];
  readonly target?: number;
  readonly stop?: number;
  readonly breakEvens?: readonly number[];
}

export interface StripReading {
  readonly sigmaMarks: SigmaMarks;
  /** In sigmas of the forecast. */
  readonly landed?: number;
  /** In sigmas of the forecast; not shown beside `landed`. */
  readonly now?: number;
  /** Grey: a draft, or a plan that was not traded. */
  readonly tone?: 'forecast' | 'grey';
}

interface Props extends StripReading {
  readonly width?: number;
}

const HEIGHT = 22;
const BAND = 10;
const INSET = 6;

/** The forecast as a thin band from −3σ to +3σ with its marks: one row of many on the same scale. */
export function LandingStrip({ width, ...reading }: Props) {
  return (
    <ChartCanvas label={landingStripSentence(reading)} height={HEIGHT} width={width}>
      {(shown) => <Strip width={shown} {...reading} />}
    </ChartCanvas>
  );
}

function Strip({ width, sigmaMarks, landed, now, tone = 'forecast' }: StripReading & { width: number }) {
  const colours = useColours();
  const x = sigmaScale(width, INSET);
  const top = (HEIGHT - BAND) / 2;
  const middle = HEIGHT / 2;
  const { strikes, target, stop } = sigmaMarks;
  const sigma = landed ?? now;
  const past = sigma === undefined ? null : pastEnd(sigma);
  return (
    <>
      <DensityBand
        x={0}
        y={top}
        width={width}
        thickness={BAND}
        radius={BAND / 2}
        inset={INSET}
        tone={tone}
        peak={tone === 'grey' ? 0.62 : 0.72}
      />
      {strikes.filter(isOnStrip).map((strike, index) => (
        <Line
          key={index}
          x1={x(strike)}
          x2={x(strike)}
          y1={middle - 8}
          y2={middle + 8}
          stroke={colours.ink}
          strokeWidth={1.5}
        />
      ))}
      {target !== undefined && isOnStrip(target) ? (
        <TriangleDown x={x(target)} y={top} width={8} height={6} fill={colours.tide} />
      ) : null}
      {stop !== undefined && isOnStrip(stop) ? (
        <TriangleUp x={x(stop)} y={top + BAND} width={8} height={6} fill={colours.rust} />
      ) : null}
      {past !== null ? (
        <PastArrow end={past} width={width} y={middle} isOpen={landed === undefined} colours={colours} />
      ) : null}
      {sigma !== undefined && isOnStrip(sigma) ? (
        <ReadingDot
          x={x(sigma)}
          y={middle}
          kind={landed === undefined ? 'now' : 'landed'}
          size="small"
          colours={colours}
        />
      ) : null}
    </>
  );
}

interface Band {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly thickness: number;
  readonly radius: number;
  /** Of ±3σ from the ends of the band. */
  readonly inset: number;
  readonly tone: 'forecast' | 'grey';
  /** Opacity at no move. */
  readonly peak: number;
}

const halfSigmas = Array.from({ length: 13 }, (_, index) => (index - 6) / 2);
const EDGE_OPACITY = 0.07;

/** The forecast's density as the strength of a colour. */
export function DensityBand({ x, y, width, thickness, radius, inset, tone, peak }: Band) {
  const colours = useColours();
  // React's ids hold characters that a paint reference must not.
  const id = `density${useId().replace(/[^a-zA-Z0-9]/g, '')}`;
  const hue = tone === 'grey' ? colours.inkSoft : colours.bramble;
  return (
    <>
      <Defs>
        <LinearGradient id={id} gradientUnits="userSpaceOnUse" x1={x + inset} x2={x + width - inset} y1={0} y2={0}>
          {halfSigmas.map((sigma) => (
            <Stop
              key={sigma}
              offset={(sigma + 3) / 6}
              stopColor={hue}
              stopOpacity={EDGE_OPACITY + (peak - EDGE_OPACITY) * Math.exp((-sigma * sigma) / 2)}
            />
          ))}
        </LinearGradient>
      </Defs>
      <Rect
        x={x}
        y={y}
        width={width}
        height={thickness}
        rx={radius}
        fill={tone === 'grey' ? colours.well : colours.stripBase}
      />
      <Rect x={x} y={y} width={width} height={thickness} rx={radius} fill={`url(#${id})`} />
    </>
  );
}

/** What the marks of a strip mean, once above many strips. */
export function LandingStripKey() {
  return (
    <ChartKey
      items={[
        { key: 'strike', mark: 'strike', text: 'strike' },
        { key: 'target', mark: 'target', text: 'target' },
        { key: 'stop', mark: 'stop', text: 'stop' },
        { key: 'landed', mark: 'landed', text: 'landed' },
        { key: 'now', mark: 'now', text: 'now' },
        { key: 'ends', text: 'ends ±3σ' },
      ]}
    />
  );
}

/** The strip in one sentence. */
export function landingStripSentence({ sigmaMarks, landed, now, tone = 'forecast' }: StripReading): string {
  const { strikes, target, stop, breakEvens = [] } = sigmaMarks;
  const many = (name: string, sigmas: readonly number[]) =>
    sigmas.length === 0
      ? []
      : [`${name}${sigmas.length > 1 ? 's' : ''} at ${listWords(sigmas.map((sigma) => formatSigma(sigma)))}`];
  const marks = [
    ...many('strike', strikes),
    ...many('break-even', breakEvens),
    ...(target === undefined ? [] : [`target ${formatSigma(target)}`]),
    ...(stop === undefined ? [] : [`stop ${formatSigma(stop)}`]),
  ];
  const reading =
    landed !== undefined ? [`landed ${placeWords(landed)}`] : now !== undefined ? [`now ${placeWords(now)}`] : [];
  const name = tone === 'grey' ? 'Forecast that was not traded,' : 'Forecast';
  return `${[`${name} −3σ to +3σ`, ...(marks.length === 0 ? [] : [marks.join(', ')]), ...reading].join('; ')}.`;
}

/** "at +0.95σ", or "past +3σ, at +3.42σ". */
export function placeWords(sigma: number): string {
  const past = pastEnd(sigma);
  return `${past === null ? '' : `past ${past === 'high' ? '+3σ' : '−3σ'}, `}at ${formatSigma(sigma)}`;
}
