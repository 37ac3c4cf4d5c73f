import { anchorOf } from '@/components/entry/entry-sections';
import { type SealedEntry } from '@/components/entry/sealed-entry';
import { placeInForecast } from '@/components/entry/entry-head';
import { Card } from '@/components/ui/card';
import { formatMoney, formatPercent, formatSigma } from '@/components/ui/number-format';
import { DataTable } from '@/components/ui/table';

interface Line {
  readonly what: string;
  readonly expected: string;
  readonly realised: string;
  readonly note: string;
}

/** Move, volatility, profit and sessions: what was expected beside what came. */
export function ExpectedBesideRealised({ entry }: { entry: SealedEntry }) {
  const lines = linesOf(entry);
  return (
    <Card anchor={anchorOf('result')} title="Expected beside realised">
      <DataTable
        caption="Expected beside realised"
        columns={[
          { key: 'what', header: '', align: 'left', flex: 2 },
          { key: 'expected', header: 'Expected', align: 'right' },
          { key: 'realised', header: 'Realised', align: 'right' },
        ]}
        rows={lines.map((line) => ({
          key: line.what,
          cells: { what: line.what, expected: line.expected, realised: line.realised },
          note: line.note,
        }))}
      />
    </Card>
  );
}

function linesOf({ sealed, outcome, row }: SealedEntry): Line[] {
  const { forecast, input } = sealed;
  const deviation = forecast.totalDeviation.holding.base;
  const move = outcome?.move ?? outcome?.moveSoFar ?? null;
  const volatility = outcome?.realisedVolatility ?? null;
  const profit = outcome?.profit ?? null;
  const distribution = forecast.atExit ?? forecast.atExpiry;
  const { currency } = row.underlying;
  return [
    {
      what: `Move over ${Number((move?.sessions ?? forecast.sessions.holding).toFixed(2))} sessions`,
      expected: `±${formatPercent(deviation, 2)}`,
      realised: move === null ? '–' : formatPercent(Math.exp(move.logReturn) - 1, 2, { sign: true }),
      note:
        move === null
          ? 'no bar yet'
          : `${formatSigma(move.inSigmas)}, ${Math.abs(move.inSigmas) <= 1 ? 'inside 1σ' : `beyond ${Math.floor(Math.abs(move.inSigmas))}σ`}; ${placeOf(move)}`,
    },
    {
      what: 'Volatility a session',
      expected: formatPercent(input.volatility.base, 2),
      realised: volatility === null ? '–' : formatPercent(volatility.dailyVolatility, 2),
      note: volatility === null ? 'needs a bar after the seal' : volatilityWords(volatility),
    },
    {
      what: `Profit, ${currency}`,
      expected: formatMoney(profit?.expectedMean ?? distribution.mean.base, { sign: true }),
      realised: profit === null ? '–' : formatMoney(profit.realised, { sign: true }),
      note:
        profit === null
          ? 'not traded'
          : !profit.isFinal || profit.percentileHigh === null
            ? 'position still open'
            : placeInForecast(profit.percentileLow ?? 0, profit.percentileHigh),
    },
    {
      what: `Mean of the worst 5%, ${currency}`,
      expected: formatMoney(distribution.expectedShortfall, { sign: true }),
      realised: '–',
      note: 'expected shortfall of the sealed plan; one trade cannot test it',
    },
    {
      what: `Fees, ${currency}`,
      expected: formatMoney(
        Number(forecast.cost.feesToOpen) + (forecast.atExit === null ? 0 : Number(forecast.cost.feesToClose)),
      ),
      realised: profit === null ? '–' : formatMoney(profit.fees),
      note: forecast.atExit === null ? 'to open; expiry is free of them in the plan' : 'to open and to close',
    },
    {
      what: 'Sessions held',
      expected: String(Number(forecast.sessions.holding.toFixed(2))),
      realised: move === null ? '–' : String(Number(move.sessions.toFixed(2))),
      note: outcome?.move == null ? 'still running' : '',
    },
  ];
}

type Outcome = NonNullable<SealedEntry['outcome']>;

/** The place in the forecast; also in Student's distribution where counting the error of the estimate moves it. */
function placeOf({ percentile, studentPercentile }: NonNullable<Outcome['move']>): string {
  const place = placeInForecast(percentile, percentile);
  if (studentPercentile === null || Math.round(studentPercentile * 100) === Math.round(percentile * 100)) return place;
  return `${place}, ${placeInForecast(studentPercentile, studentPercentile).replace(' in its forecast', '')} with the error of its volatility`;
}

function volatilityWords({
  low,
  high,
  ratio,
  ratioLow,
  ratioHigh,
}: NonNullable<Outcome['realisedVolatility']>): string {
  const interval =
    low === null || high === null
      ? ''
      : `what stood behind it: ${formatPercent(low, 2)} to ${formatPercent(high, 2)} (95%); `;
  const chance =
    ratioLow === null || ratioHigh === null
      ? ''
      : `; chance alone allows ${ratioLow.toFixed(2)} to ${ratioHigh.toFixed(2)}`;
  return `${interval}ratio ${ratio.toFixed(2)}${chance}`;
}
