import { scaleLinear } from 'd3-scale';
import { View } from 'react-native';
import { Circle, Line, Rect } from 'react-native-svg';
import { ChartCanvas } from '@/components/charts/chart-canvas';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';

export interface IntervalRow {
  readonly label: string;
  readonly seen: number;
  readonly low: number;
  readonly high: number;
  /** What it ought to be. */
  readonly due: number;
  readonly value: string;
  readonly under: string;
}

const ROW = 52;

/** Rates with their intervals, and what was due as a tick, on one scale. */
export function IntervalRows({ rows, from, to }: { rows: readonly IntervalRow[]; from: number; to: number }) {
  const colours = useColours();
  return (
    <View role="list">
      {rows.map(({ label, seen, low, high, due, value, under }) => (
        <View
          key={label}
          role="listitem"
          style={{ minHeight: ROW, flexDirection: 'row', alignItems: 'center', gap: 10 }}
        >
          <Txt size="row" weight="semibold" style={{ minWidth: 40, maxWidth: 150 }}>
            {label}
          </Txt>
          <View style={{ flex: 1, minWidth: 60 }}>
            <ChartCanvas label={null} height={28}>
              {(width) => {
                const x = scaleLinear([from, to], [6, Math.max(7, width - 6)]).clamp(true);
                return (
                  <>
                    <Line x1={6} x2={width - 6} y1={14} y2={14} stroke={colours.rule} strokeWidth={2} />
                    <Rect
                      x={x(low)}
                      y={9}
                      width={Math.max(2, x(high) - x(low))}
                      height={10}
                      rx={5}
                      fill={colours.bramble}
                      fillOpacity={0.52}
                    />
                    <Circle cx={x(seen)} cy={14} r={4.8} fill={colours.bramble} />
                    <Line x1={x(due)} x2={x(due)} y1={3} y2={25} stroke={colours.ink} strokeWidth={2} />
                  </>
                );
              }}
            </ChartCanvas>
          </View>
          <View style={{ minWidth: 96 }}>
            <Txt size="row" weight="semibold" align="right">
              {value}
            </Txt>
            <Txt size="note" colour="inkSoft" align="right">
              {under}
            </Txt>
          </View>
        </View>
      ))}
    </View>
  );
}
