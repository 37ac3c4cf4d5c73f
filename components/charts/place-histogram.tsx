import { scaleLinear } from 'd3-scale';
import { Line, Rect } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { ChartText } from '@/components/charts/chart-text';
import { formatNumber } from '@/components/ui/number-format';
import { useColours } from '@/components/ui/theme/use-theme';

export interface PlacePicture {
  /** Outcomes in each class of the forecast, lowest first; parts of one where lumps are spread. */
  readonly counts: readonly number[];
  readonly due: number;
  /** Where 90 % of such counts fall by chance. */
  readonly low: number;
  readonly high: number;
}

const HEIGHT = 190;
const FOOT = 22;

/** Where outcomes fell in their forecasts: even bars for a calibrated record. */
export function PlaceHistogram({ width, ...picture }: PlacePicture & { width?: number }) {
  return (
    <ChartCanvas label={placeSentence(picture)} height={HEIGHT} width={width}>
      {(shown) => <Bars width={shown} {...picture} />}
    </ChartCanvas>
  );
}

function Bars({ width, counts, due, low, high }: PlacePicture & { width: number }) {
  const colours = useColours();
  const base = HEIGHT - FOOT;
  const y = scaleLinear([0, Math.max(high, ...counts, 1)], [base, 8]);
  const step = (width - 8) / counts.length;
  return (
    <>
      <Rect
        x={2}
        y={y(high)}
        width={width - 4}
        height={Math.max(1, y(low) - y(high))}
        fill={colours.bramble}
        fillOpacity={0.12}
        stroke={colours.bramble}
        strokeOpacity={0.55}
        strokeDasharray="3 3"
      />
      {counts.map((count, index) => (
        <Rect
          key={index}
          x={4 + step * index + 2}
          y={y(count)}
          width={Math.max(1, step - 4)}
          height={Math.max(0, base - y(count))}
          rx={2}
          fill={colours.bramble}
          fillOpacity={0.85}
        />
      ))}
      {counts.map((count, index) => (
        <ChartText
          key={index}
          x={4 + step * (index + 0.5)}
          y={base - y(count) > 20 ? base - 6 : y(count) - 4}
          anchor="middle"
          weight="semibold"
          colour={base - y(count) > 20 ? 'onBramble' : 'ink'}
        >
          {countText(count)}
        </ChartText>
      ))}
      <Line x1={2} x2={width - 2} y1={y(due)} y2={y(due)} stroke={colours.ink} strokeDasharray="4 3" />
      <Line x1={2} x2={width - 2} y1={base} y2={base} stroke={colours.edge} />
      <ChartText x={4} y={HEIGHT - 5}>
        lowest eighth
      </ChartText>
      <ChartText x={width - 4} y={HEIGHT - 5} anchor="end">
        highest eighth
      </ChartText>
    </>
  );
}

export const countText = (count: number) => formatNumber(count, Number.isInteger(count) ? 0 : 1);

/** The histogram in one sentence. */
export function placeSentence({ counts, due, low, high }: PlacePicture): string {
  return `Outcomes by eighth of their forecast, lowest first: ${counts.map(countText).join(', ')}; even would be ${countText(due)} in each, chance alone gives ${low} to ${high}.`;
}
