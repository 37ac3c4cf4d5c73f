import { View } from 'react-native';
import { IntervalRows } from '@/components/charts/interval-rows';
import { ShowAsTable } from '@/components/charts/show-as-table';
import { EntryDisclosure } from '@/components/scores/entry-disclosure';
import { capital } from '@/components/scores/score-words';
import { Card } from '@/components/ui/card';
import { formatNumber } from '@/components/ui/number-format';
import { Txt } from '@/components/ui/text';
import { type Scores } from '@/shared/scores/scores';

/** Realised over planned volatility, method by method. */
export function VolatilityCard({ scores }: { scores: Scores }) {
  const shown = scores.volatility.flatMap(({ method, count, figures }) =>
    figures === null ? [] : [{ method, count, figures }],
  );
  const few = scores.volatility.filter(({ figures }) => figures === null);
  const reach = Math.max(1.5, ...shown.map(({ figures }) => figures.high ?? figures.ratio));
  return (
    <Card title="Volatility, realised over planned" subtitle="By method; 1 is as planned, above 1 moved more">
      <View style={{ gap: 10 }}>
        {shown.length === 0 ? null : (
          <>
            <IntervalRows
              from={Math.min(0.5, ...shown.map(({ figures }) => figures.low ?? figures.ratio))}
              to={reach}
              rows={shown.map(({ method, count, figures: { ratio, low, high } }) => ({
                label: capital(method),
                seen: ratio,
                low: low ?? ratio,
                high: high ?? ratio,
                due: 1,
                value: formatNumber(ratio, 2),
                under: `${count} entries`,
              }))}
            />
            <ShowAsTable
              caption="Realised over planned volatility by method"
              columns={[
                { key: 'method', header: 'Method', flex: 2 },
                { key: 'n', header: 'n', align: 'right' },
                { key: 'effective', header: 'Counts for', align: 'right' },
                { key: 'ratio', header: 'Ratio', align: 'right' },
                { key: 'interval', header: '95% interval', align: 'right', flex: 2 },
              ]}
              rows={shown.map(({ method, count, figures: { ratio, low, high, effectiveCount } }) => ({
                key: method,
                cells: {
                  method: capital(method),
                  n: String(count),
                  effective: formatNumber(effectiveCount, 0),
                  ratio: formatNumber(ratio, 2),
                  interval: low === null || high === null ? '–' : `${formatNumber(low, 2)} to ${formatNumber(high, 2)}`,
                },
              }))}
            />
          </>
        )}
        {few.length === 0 ? null : (
          <Txt size="row" colour="inkSoft">
            {`Too few for a rate: ${few.map(({ method, count }) => `${method} (${count})`).join(', ')}.`}
          </Txt>
        )}
        {scores.volatility.length === 0 ? (
          <Txt size="row" colour="inkSoft">
            No hold is over yet.
          </Txt>
        ) : null}
        <EntryDisclosure
          what="volatility of their holds"
          entries={scores.entries.filter(({ volatilityRatio, isLateSeal }) => !isLateSeal && volatilityRatio !== null)}
          header="Ratio"
          figureOf={({ volatilityRatio }) => (volatilityRatio === null ? '' : formatNumber(volatilityRatio, 2))}
        />
      </View>
    </Card>
  );
}
