import { View } from 'react-native';
import { ProfitOverTime } from '@/components/charts/profit-over-time';
import { ProfitSteps } from '@/components/charts/profit-steps';
import { ShowAsTable } from '@/components/charts/show-as-table';
import { EntryDisclosure } from '@/components/scores/entry-disclosure';
import { entriesWord } from '@/components/scores/score-words';
import { TooFew } from '@/components/scores/too-few';
import { Card } from '@/components/ui/card';
import { formatDate, formatMoney, formatNumber } from '@/components/ui/number-format';
import { SignedAmount } from '@/components/ui/signed-amount';
import { Txt } from '@/components/ui/text';
import { type ListedEntry, type Scores } from '@/shared/scores/scores';

type Money = Scores['money'][number];

const MOST_ROWS = 40;

/** Expected and realised profit, summed over time. */
export function MoneyCard({ money, entries }: { money: Money; entries: readonly ListedEntry[] }) {
  const { currency, count, figures } = money;
  const every = figures === null ? 1 : Math.max(1, Math.ceil(figures.points.length / MOST_ROWS));
  return (
    <Card title="Expected and realised profit" subtitle={`${entriesWord(count)}, ${currency}; band is one deviation`}>
      <View style={{ gap: 10 }}>
        {figures === null ? (
          <TooFew count={count} what="closed entries" />
        ) : (
          <>
            <ProfitOverTime points={figures.points} currency={currency} />
            <Txt size="row">{meanSentence(money)}</Txt>
            <ShowAsTable
              caption="Expected and realised profit over time"
              columns={[
                { key: 'at', header: 'By', flex: 1.4 },
                { key: 'entries', header: 'Entries', align: 'right' },
                { key: 'expected', header: `Expected, ${currency}`, align: 'right', flex: 1.6 },
                { key: 'realised', header: `Realised, ${currency}`, align: 'right', flex: 1.6 },
              ]}
              rows={figures.points
                .filter((_, index) => (figures.points.length - 1 - index) % every === 0)
                .map((point) => ({
                  key: String(point.entries),
                  cells: {
                    at: formatDate(point.sessionDate),
                    entries: String(point.entries),
                    expected: `${formatMoney(point.expected, { sign: true })} ± ${formatMoney(point.deviation, { places: 0 })}`,
                    realised: formatMoney(point.realised, { sign: true }),
                  },
                }))}
            />
          </>
        )}
        <EntryDisclosure
          what={`closed, in ${currency}`}
          entries={entries.filter(
            (entry) => !entry.isLateSeal && entry.currency === currency && entry.realisedProfit !== null,
          )}
          header={`Profit, ${currency}`}
          figureOf={({ realisedProfit }) => <SignedAmount value={realisedProfit} currency={currency} size="row" />}
        />
      </View>
    </Card>
  );
}

/** "Mean +41.20 USD an entry, 95% interval −48.80 to +131.20: no edge shown yet." */
export function meanSentence({ currency, figures }: Money): string {
  if (figures === null) return '';
  const { mean, low, high, casesNeeded, effectiveCount } = figures;
  const head = `Mean ${formatMoney(mean, { sign: true, currency })} an entry`;
  if (low === null || high === null) return `${head}; all entries moved together, so no interval can be given.`;
  const interval = `95% interval ${formatMoney(low, { sign: true })} to ${formatMoney(high, { sign: true })}`;
  if (low > 0 || high < 0)
    return `${head}, ${interval}; the entries count for about ${formatNumber(effectiveCount, 0)}.`;
  const needed =
    casesNeeded === null ? '' : ` It would take about ${formatNumber(casesNeeded, 0)} such entries to tell it from 0.`;
  return `${head}, ${interval}: no edge shown yet.${needed}`;
}

/** Where the profits came from, added up. */
export function SourcesCard({ money }: { money: Money }) {
  const { currency, figures } = money;
  const sources = figures?.sources ?? null;
  if (sources === null) return null;
  return (
    <Card
      title="Where profits came from"
      subtitle={`${entriesWord(sources.count)} attributed, in ${currency}; the steps add up exactly`}
    >
      <ProfitSteps
        expectedMean={sources.expected}
        expectedLabel="Expected"
        steps={[
          { label: 'Move', amount: sources.move },
          { label: 'Time', amount: sources.time },
          { label: 'Volatility', amount: sources.volatility },
          ...(Number(sources.carry) === 0 ? [] : [{ label: 'Rates', amount: sources.carry }]),
          { label: 'Remainder', amount: sources.markResidual },
          { label: 'Slippage', amount: sources.slippage },
          { label: 'Fees', amount: sources.fees },
        ]}
        realised={sources.realised}
        currency={currency}
      />
    </Card>
  );
}
