import { View } from 'react-native';
import { CalibrationPlot } from '@/components/charts/calibration-plot';
import { ShowAsTable } from '@/components/charts/show-as-table';
import { Card } from '@/components/ui/card';
import { formatPercent } from '@/components/ui/number-format';
import { type Scores } from '@/shared/scores/score-endpoints';

/** Rates of fewer cases are drawn as uncertain. */
const THIN_BELOW = 20;

/** The calibration curve, with its bins as a table on request. */
export function CalibrationCard({ summary }: { summary: NonNullable<Scores['summary']> }) {
  return (
    <Card title="Calibration" subtitle="How often each level of odds came true">
      <View style={{ gap: 8 }}>
        <CalibrationPlot bins={summary.bins} curve={summary.curve} thinBelow={THIN_BELOW} />
        <ShowAsTable
          caption="How often each level of odds came true"
          columns={[
            { key: 'stated', header: 'Stated', align: 'right' },
            { key: 'cameTrue', header: 'Came true', align: 'right' },
            { key: 'perfect', header: 'Perfect record, 90%', align: 'right', flex: 2 },
            { key: 'cases', header: 'Cases', align: 'right' },
          ]}
          rows={summary.bins.map(({ forecast, observed, low, high, count }) => ({
            key: String(forecast),
            cells: {
              stated: formatPercent(forecast),
              cameTrue: formatPercent(observed),
              perfect: `${formatPercent(low)} to ${formatPercent(high)}`,
              cases: String(count),
            },
          }))}
        />
      </View>
    </Card>
  );
}
