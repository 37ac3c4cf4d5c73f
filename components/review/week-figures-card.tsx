import { View } from 'react-native';
import { Card } from '@/components/ui/card';
import { formatMoney } from '@/components/ui/number-format';
import { SignedAmount } from '@/components/ui/signed-amount';
import { DataTable } from '@/components/ui/table';
import { Txt } from '@/components/ui/text';
import { type ReviewedWeek } from '@/shared/reviews/weekly-review-endpoints';

const markWords: Record<ReviewedWeek['process'][number]['mark'], string> = {
  'sealed-before-fill': 'Sealed before the first fill',
  size: 'Size inside the plan',
  limit: 'Price inside the limit',
  exit: 'Exit by a written rule',
};

/** What the closed trades of a week were expected to bring and brought, and how they were carried out: counts, no rates. */
export function WeekFiguresCard({ view: { profit, process, closed } }: { view: ReviewedWeek }) {
  return (
    <Card title="Expected and realised" subtitle="Of the trades closed in the week">
      <View style={{ gap: 16 }}>
        {profit.length === 0 ? (
          <Txt size="row" colour="inkSoft">
            No trade was closed.
          </Txt>
        ) : (
          <DataTable
            caption="Profit expected and realised"
            columns={[
              { key: 'currency', header: 'Currency' },
              { key: 'count', header: 'Trades', align: 'right' },
              { key: 'expected', header: 'Expected', align: 'right', flex: 1.5 },
              { key: 'realised', header: 'Realised', align: 'right', flex: 1.5 },
            ]}
            rows={profit.map(({ currency, count, expectedMean, realised }) => ({
              key: currency,
              cells: {
                currency,
                count: String(count),
                expected: formatMoney(expectedMean, { sign: true }),
                realised: <SignedAmount value={realised} currency={currency} size="row" />,
              },
            }))}
          />
        )}
        {closed.length === 0 ? null : (
          <DataTable
            caption="How the plans were carried out"
            columns={[
              { key: 'mark', header: 'Mark of the plan', flex: 2.5 },
              { key: 'kept', header: 'Kept', align: 'right' },
            ]}
            rows={process.map(({ mark, kept, of }) => ({
              key: mark,
              cells: { mark: markWords[mark], kept: of === 0 ? 'not known' : `${kept} of ${of}` },
            }))}
          />
        )}
        <Txt size="note" colour="inkSoft">
          A week is few cases: look at each, and judge rates on Scores.
        </Txt>
      </View>
    </Card>
  );
}
