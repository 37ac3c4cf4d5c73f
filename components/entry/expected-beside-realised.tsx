import { type SealedEntry } from '@/components/entry/sealed-entry';
import { placeInForecast } from '@/components/entry/entry-head';
import { Card } from '@/components/ui/card';
import { formatMoney, formatPercent, formatSigma } from '@/components/ui/number-format';
import { DataTable } from '@/components/ui/table';
import { Txt } from '@/components/ui/text';

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
    <Card title="Expected beside realised">
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
      <Txt size="note" colour="inkSoft">
        What one trade can show: little. It counts as one among many in Scores.
      </Txt>
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
  const ratioRange =
    volatility === null || volatility.ratioLow === null || volatility.ratioHigh === null
      ? ''
      : `; chance alone allows ${volatility.ratioLow.toFixed(2)} to ${volatility.ratioHigh.toFixed(2)}`;
  return [
    {
      what: `Move over ${Number((move?.sessions ?? forecast.sessions.holding).toFixed(2))} sessions`,
      expected: `±${formatPercent(deviation, 2)}`,
      realised: move === null ? '–' : formatPercent(Math.exp(move.logReturn) - 1, 2, { sign: true }),
      note:
        move === null
          ? 'no bar yet'
          : `${formatSigma(move.inSigmas)}, ${Math.abs(move.inSigmas) <= 1 ? 'inside 1σ' : `beyond ${Math.floor(Math.abs(move.inSigmas))}σ`}; ${placeInForecast(move.percentile, move.percentile)}`,
    },
    {
      what: 'Volatility a session',
      expected: formatPercent(input.volatility.base, 2),
      realised: volatility === null ? '–' : formatPercent(volatility.dailyVolatility, 2),
      note: volatility === null ? 'needs a bar after the seal' : `ratio ${volatility.ratio.toFixed(2)}${ratioRange}`,
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
