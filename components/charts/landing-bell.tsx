import { area, line } from 'd3-shape';
import { View } from 'react-native';
import { G, Line, Path } from 'react-native-svg';
import { decimalsForStep, priceText } from '@/components/charts/axis-number';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { ChartKey } from '@/components/charts/chart-key';
import { PastArrow, ReadingDot, TriangleDown, TriangleUp } from '@/components/charts/chart-marks';
import { ChartText, fitMiddle, textWidth } from '@/components/charts/chart-text';
import { DensityBand, placeWords } from '@/components/charts/landing-strip';
import { isOnStrip, pastEnd, sigmaName, sigmaScale } from '@/components/charts/sigma-scale';
import { formatNumber, formatSigma } from '@/components/ui/number-format';
import { useColours } from '@/components/ui/theme/use-theme';

export interface LandingMark {
  readonly kind: 'strike' | 'target' | 'stop' | 'breakEven';
  readonly price: number;
  /** In sigmas of the forecast. */
  readonly sigma: number;
  readonly label: string;
}

interface Place {
  readonly price: number;
  readonly sigma: number;
}

export interface BellReading {
  /** Price of the underlying when the forecast was made. */
  readonly spot: number;
  /** Standard deviation of its log price over the hold, as a fraction. */
  readonly totalDeviation: number;
  readonly marks: readonly LandingMark[];
  readonly landed?: Place;
  /** Not shown beside `landed`. */
  readonly now?: Place;
  /** Price at a number of sigmas; spot × exp(σ × deviation) unless the forecast has another centre. */
  readonly priceAtSigma?: (sigma: number) => number;
  readonly tone?: 'forecast' | 'grey';
}

interface Props extends BellReading {
  readonly width?: number;
}

const INSET = 14;
const BELL = 84;
const BAND = 18;
const BELL_TOP = 34;
const BAND_TOP = BELL_TOP + BELL;
const BAND_FOOT = BAND_TOP + BAND;
const MIDDLE = BAND_TOP + BAND / 2;
const HEIGHT = BAND_FOOT + 44;

/** The forecast as a bell over its band, every level on it, and where the underlying landed. */
export function LandingBell({ width, ...reading }: Props) {
  return (
    <View style={{ gap: 10 }}>
      <ChartCanvas label={landingBellSentence(reading)} height={HEIGHT} width={width}>
        {(shown) => <Bell width={shown} {...reading} />}
      </ChartCanvas>
      <ChartKey
        items={reading.marks.map(({ kind, label, price, sigma }, index) => {
          const past = pastEnd(sigma);
          return {
            key: `${kind}-${index}`,
            mark: kind,
            text: label,
            value: `${priceText(price)}${past === null ? '' : `, past ${past === 'high' ? '+3σ' : '−3σ'}`}`,
          };
        })}
      />
    </View>
  );
}

function Bell({ width, marks, landed, now, tone = 'forecast', ...forecast }: BellReading & { width: number }) {
  const colours = useColours();
  const x = sigmaScale(width, INSET);
  const hue = tone === 'grey' ? colours.inkSoft : colours.bramble;
  const height = (sigma: number) => BAND_TOP - BELL * Math.exp((-sigma * sigma) / 2);
  const curve = line<number>(x, height);
  const ground = area<number>(x, BAND_TOP, height);
  const shown = marks.filter(({ sigma }) => isOnStrip(sigma));
  return (
    <>
      <Path d={ground(sigmasBetween(-3, 3)) ?? ''} fill={hue} fillOpacity={0.09} />
      <Path d={ground(sigmasBetween(-1, 1)) ?? ''} fill={hue} fillOpacity={0.14} />
      <Path d={curve(sigmasBetween(-3, 3)) ?? ''} fill="none" stroke={hue} strokeWidth={1.75} />
      <DensityBand
        x={INSET}
        y={BAND_TOP}
        width={Math.max(0, width - 2 * INSET)}
        thickness={BAND}
        radius={0}
        inset={0}
        tone={tone}
        peak={0.8}
      />
      <Axis width={width} {...forecast} />
      {shown.map((mark, index) => (
        <Level key={index} mark={mark} x={x(mark.sigma)} />
      ))}
      <Reading width={width} place={landed ?? now} kind={landed === undefined ? 'now' : 'landed'} />
    </>
  );
}

function sigmasBetween(low: number, high: number): number[] {
  const steps = Math.round((high - low) * 20);
  return Array.from({ length: steps + 1 }, (_, index) => low + ((high - low) * index) / steps);
}

/** Strike: a tick through the band; break-even: dashed; target from above, stop from below. */
function Level({ mark, x }: { mark: LandingMark; x: number }) {
  const colours = useColours();
  switch (mark.kind) {
    case 'strike':
      return <Line x1={x} x2={x} y1={BAND_TOP - 8} y2={BAND_FOOT + 4} stroke={colours.ink} strokeWidth={2} />;
    case 'breakEven':
      return (
        <Line
          x1={x}
          x2={x}
          y1={BAND_TOP - 30}
          y2={BAND_FOOT}
          stroke={colours.ink}
          strokeWidth={1.5}
          strokeDasharray="2 3"
        />
      );
    case 'target':
      return <TriangleDown x={x} y={BAND_TOP + 1} width={12} height={9} fill={colours.tide} />;
    case 'stop':
      return <TriangleUp x={x} y={BAND_FOOT} width={12} height={9} fill={colours.rust} />;
  }
}

function Axis({
  width,
  ...forecast
}: Pick<BellReading, 'spot' | 'totalDeviation' | 'priceAtSigma'> & { width: number }) {
  const colours = useColours();
  const x = sigmaScale(width, INSET);
  const priceAt =
    forecast.priceAtSigma ?? ((sigma: number) => forecast.spot * Math.exp(sigma * forecast.totalDeviation));
  const decimals = decimalsForStep(Math.abs(priceAt(1) - priceAt(0)));
  const ticks = [-3, -2, -1, 0, 1, 2, 3].map((sigma) => ({ sigma, price: formatNumber(priceAt(sigma), decimals) }));
  const widest = Math.max(...ticks.map(({ price }) => textWidth(price)));
  const isTight = x(1) - x(0) < widest + 8;
  return (
    <>
      {ticks.map(({ sigma, price }) => {
        const isPriced = !isTight || sigma % 3 === 0;
        return (
          <G key={sigma}>
            <Line x1={x(sigma)} x2={x(sigma)} y1={BAND_FOOT} y2={BAND_FOOT + 4} stroke={colours.edge} strokeWidth={1} />
            <ChartText x={fitMiddle(x(sigma), sigmaName(sigma), width)} y={BAND_FOOT + 22} anchor="middle">
              {sigmaName(sigma)}
            </ChartText>
            {isPriced && Number.isFinite(priceAt(sigma)) ? (
              <ChartText x={fitMiddle(x(sigma), price, width)} y={BAND_FOOT + 38} anchor="middle" colour="ink">
                {price}
              </ChartText>
            ) : null}
          </G>
        );
      })}
    </>
  );
}

function Reading({ width, place, kind }: { width: number; place: Place | undefined; kind: 'landed' | 'now' }) {
  const colours = useColours();
  if (place === undefined || !Number.isFinite(place.sigma)) return null;
  const past = pastEnd(place.sigma);
  const x = past === null ? sigmaScale(width, INSET)(place.sigma) : past === 'high' ? width - 5 : 5;
  const text = readingText(place, kind);
  return (
    <>
      {past === null ? (
        <>
          <Line x1={x} x2={x} y1={20} y2={MIDDLE} stroke={colours.ink} strokeWidth={1.5} />
          <ReadingDot x={x} y={MIDDLE} kind={kind} size="large" colours={colours} />
        </>
      ) : (
        <PastArrow end={past} width={width} y={MIDDLE} isOpen={kind === 'now'} colours={colours} />
      )}
      <ChartText x={fitMiddle(x, text, width, 14)} y={13} anchor="middle" weight="semibold" colour="ink" size={14}>
        {text}
      </ChartText>
    </>
  );
}

function readingText({ price, sigma }: Place, kind: 'landed' | 'now'): string {
  const past = pastEnd(sigma);
  const where = past === null ? formatSigma(sigma) : `${formatSigma(sigma)}, past ${past === 'high' ? '+3σ' : '−3σ'}`;
  return `${kind === 'now' ? 'now ' : ''}${priceText(price)}, ${where}`;
}

/** The bell and its marks in one sentence. */
export function landingBellSentence({ marks, landed, now, tone = 'forecast', ...forecast }: BellReading): string {
  const priceAt =
    forecast.priceAtSigma ?? ((sigma: number) => forecast.spot * Math.exp(sigma * forecast.totalDeviation));
  const levels = marks.map(
    ({ label, price, sigma }) => `${label.toLowerCase()} ${priceText(price)} at ${formatSigma(sigma)}`,
  );
  const place = landed ?? now;
  const reading =
    place === undefined
      ? []
      : [`${landed === undefined ? 'now' : 'landed at'} ${priceText(place.price)}, ${placeWords(place.sigma)}`];
  const name = tone === 'grey' ? 'Forecast that was not traded,' : 'Forecast';
  const range = `${name} −3σ to +3σ is ${priceText(priceAt(-3))} to ${priceText(priceAt(3))}`;
  return `${[range, ...(levels.length === 0 ? [] : [levels.join(', ')]), ...reading].join('; ')}.`;
}
