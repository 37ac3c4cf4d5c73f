import { Card } from '@/components/ui/card';
import { formatPercent } from '@/components/ui/number-format';
import { DataTable } from '@/components/ui/table';
import { annualizedVolatility } from '@/journal/volatility/annualized-volatility';
import { type CloseMethod, type VolatilityEstimate } from '@/journal/volatility/volatility-method';

/** The ladder in figures: each method with its interval, the returns it rests on, and the annual conversion. */
export function MoveTable({ ladder }: { ladder: readonly VolatilityEstimate<CloseMethod>[] }) {
  return (
    <Card title="In figures" subtitle="Sample mean removed; the weighted method takes it as 0">
      <DataTable
        caption="Daily volatility by method"
        columns={[
          { key: 'method', header: 'Method', flex: 2 },
          { key: 'daily', header: 'A session', align: 'right' },
          { key: 'interval', header: '95% interval', align: 'right', flex: 2 },
          { key: 'annual', header: 'A year', align: 'right' },
        ]}
        rows={ladder.map((rung) => ({
          key: rung.method.kind === 'close' ? String(rung.method.window) : 'ewma',
          cells: {
            method:
              rung.method.kind === 'close' ? `${rung.method.window} sessions` : `Weighted, λ ${rung.method.lambda}`,
            daily: formatPercent(rung.dailyVolatility, 2),
            interval: `${formatPercent(rung.low, 2)} to ${formatPercent(rung.high, 2)}`,
            annual: formatPercent(annualizedVolatility(rung.dailyVolatility), 1),
          },
        }))}
      />
    </Card>
  );
}
