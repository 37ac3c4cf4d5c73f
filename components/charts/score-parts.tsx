import { scaleLinear } from 'd3-scale';
import { View } from 'react-native';
import { Line, Rect } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { formatNumber } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';

export interface ScoreParts {
  readonly score: number;
  readonly miscalibration: number;
  readonly discrimination: number;
  readonly uncertainty: number;
}

const ROW = 34;
const BAR = 15;
const LABEL = 112;
const VALUE = 64;

/** Uncertainty less resolution plus reliability, as steps that end at the score. */
export function ScorePartsSteps({ name, parts, places = 3 }: { name: string; parts: ScoreParts; places?: number }) {
  const colours = useColours();
  const { score, miscalibration, discrimination, uncertainty } = parts;
  const calibrated = uncertainty - discrimination;
  const rows = [
    { label: 'Uncertainty', from: 0, to: uncertainty, text: formatNumber(uncertainty, places), fill: colours.edge },
    {
      label: 'Resolution',
      from: calibrated,
      to: uncertainty,
      text: formatNumber(-discrimination, places, { sign: true }),
      fill: colours.tide,
    },
    {
      label: 'Reliability',
      from: calibrated,
      to: score,
      text: formatNumber(miscalibration, places, { sign: true }),
      fill: colours.rust,
    },
    { label: name, from: 0, to: score, text: formatNumber(score, places), fill: colours.bramble },
  ];
  const most = Math.max(...rows.flatMap(({ from, to }) => [from, to]), 1e-9);
  return (
    <View style={{ position: 'relative' }}>
      <View style={{ position: 'absolute', left: LABEL, right: VALUE, top: 0 }} aria-hidden>
        <ChartCanvas label={null} height={ROW * rows.length}>
          {(width) => {
            const x = scaleLinear([0, most], [2, Math.max(3, width - 6)]);
            return (
              <>
                {rows.map(({ label, from, to, fill }, index) => (
                  <Rect
                    key={label}
                    x={x(Math.min(from, to))}
                    y={ROW * index + (ROW - BAR) / 2}
                    width={Math.max(1.5, Math.abs(x(to) - x(from)))}
                    height={BAR}
                    rx={2}
                    fill={fill}
                  />
                ))}
                {[uncertainty, calibrated, score].map((at, index) => (
                  <Line
                    key={index}
                    x1={x(at)}
                    x2={x(at)}
                    y1={ROW * index + ROW / 2}
                    y2={ROW * (index + 1) + ROW / 2}
                    stroke={colours.ink}
                  />
                ))}
              </>
            );
          }}
        </ChartCanvas>
      </View>
      <View role="list">
        {rows.map(({ label, text }, index) => (
          <View
            key={label}
            role="listitem"
            style={{ height: ROW, flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between' }}
          >
            <Txt size="row" weight={index === 3 ? 'semibold' : 'regular'}>
              {label}
            </Txt>
            <Txt size="row" weight="semibold">
              {text}
            </Txt>
          </View>
        ))}
      </View>
    </View>
  );
}
