import { View } from 'react-native';
import { CalibrationPlot } from '@/components/charts/calibration-plot';
import { ShowAsTable } from '@/components/charts/show-as-table';
import { Card } from '@/components/ui/card';
import { formatNumber, formatPercent } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { type Scores } from '@/shared/scores/scores';

/** Rates of fewer cases are drawn as uncertain. */
const THIN_BELOW = 20;

/** The calibration curve in its band, with its tenths as a table on request. */
export function CalibrationCard({
  figures,
  count,
}: {
  figures: NonNullable<Scores['odds']['figures']>;
  count: number;
}) {
  const { bins, curve, band, events, expectedEvents, z, effectiveCount } = figures;
  return (
    <Card title="Calibration" subtitle={`${count} resolved odds, dot size by count`}>
      <View style={{ gap: 8 }}>
        <CalibrationPlot bins={bins} curve={curve} band={band} thinBelow={THIN_BELOW} />
        <Txt size="row" colour="inkSoft">
          {`The odds added up to ${formatNumber(expectedEvents, 1)} events; ${events} came${z === null ? '' : ` (z ${formatNumber(z, 2, { sign: true })})`}. Odds of overlapping entries move together: they count for about ${formatNumber(effectiveCount, 0)}.`}
        </Txt>
        <ShowAsTable
          caption="How often each level of odds came true"
          columns={[
            { key: 'stated', header: 'Stated', align: 'right' },
            { key: 'cameTrue', header: 'Came true', align: 'right' },
            { key: 'perfect', header: 'Perfect record, 90%', align: 'right', flex: 2 },
            { key: 'cases', header: 'Cases', align: 'right' },
          ]}
          rows={bins.map((bin) => ({
            key: String(bin.forecast),
            cells: {
              stated: formatPercent(bin.forecast),
              cameTrue:
                bin.count < THIN_BELOW
                  ? `${Math.round(bin.observed * bin.count)} of ${bin.count}`
                  : formatPercent(bin.observed),
              perfect: `${formatPercent(bin.low)} to ${formatPercent(bin.high)}`,
              cases: String(bin.count),
            },
          }))}
        />
      </View>
    </Card>
  );
}
