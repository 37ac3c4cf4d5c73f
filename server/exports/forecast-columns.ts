import { entryKeyColumns } from '@/server/exports/entry-columns';
import { type ExportColumn } from '@/server/exports/export-column';
import { type StoredSeal } from '@/server/seals/seal-store';
import { type EntryRow } from '@/shared/entries/entry';

export interface ExportedForecast {
  readonly row: EntryRow;
  readonly seal: StoredSeal;
}
type Column = ExportColumn<ExportedForecast>;

const number = (header: string, meaning: string, of: (seal: StoredSeal['content']) => number | null): Column => ({
  header,
  kind: 'number',
  meaning,
  of: ({ seal }) => of(seal.content),
});
const fraction = (header: string, meaning: string, of: (seal: StoredSeal['content']) => number | null): Column => ({
  ...number(header, meaning, of),
  kind: 'fraction',
});
const mainLaw = ({ forecast }: StoredSeal['content']) => forecast.atExit ?? forecast.atExpiry;

export const forecastColumns: readonly Column[] = [
  ...entryKeyColumns,
  { header: 'Seal', kind: 'number', meaning: 'Its number in the trader’s chain', of: ({ seal }) => seal.link.sequence },
  { header: 'Hash', kind: 'text', meaning: 'SHA-256 of the seal, hexadecimal', of: ({ seal }) => seal.link.hash },
  {
    header: 'Engine',
    kind: 'text',
    meaning: 'Version that computed the forecast',
    of: ({ seal }) => seal.link.engineVersion,
  },
  {
    header: 'Spot price',
    kind: 'decimal',
    meaning: 'Of the underlying when it was sealed',
    of: ({ seal }) => seal.content.input.spot.price,
  },
  { header: 'Spot seen', kind: 'instant', meaning: 'UTC', of: ({ seal }) => new Date(seal.content.input.spot.at) },
  fraction(
    'Volatility, low',
    'Standard deviation of the log return of one session',
    ({ input }) => input.volatility.low,
  ),
  fraction(
    'Volatility, base',
    'Standard deviation of the log return of one session',
    ({ input }) => input.volatility.base,
  ),
  fraction(
    'Volatility, high',
    'Standard deviation of the log return of one session',
    ({ input }) => input.volatility.high,
  ),
  fraction(
    'Implied volatility',
    'Of a session, from the planned premiums',
    ({ forecast }) => forecast.impliedDailyVolatility,
  ),
  number('Sessions held', 'Planned, on the session clock', ({ forecast }) => forecast.sessions.holding),
  number('Sessions to expiry', 'On the session clock', ({ forecast }) => forecast.sessions.toExpiry),
  fraction(
    'Deviation of the hold',
    'Standard deviation of the log price over the hold',
    ({ forecast }) => forecast.totalDeviation.holding.base,
  ),
  {
    header: 'Drift',
    kind: 'text',
    meaning: 'zeroReturn, riskNeutral or ownView',
    of: ({ seal }) => seal.content.input.drift.kind,
  },
  number(
    'Mean profit, low',
    'At the planned exit, under low volatility, in the currency',
    (seal) => mainLaw(seal).mean.low,
  ),
  number('Mean profit, base', 'At the planned exit, under base volatility', (seal) => mainLaw(seal).mean.base),
  number('Mean profit, high', 'At the planned exit, under high volatility', (seal) => mainLaw(seal).mean.high),
  fraction('Odds of profit', 'At the planned exit, under base volatility', (seal) => mainLaw(seal).oddsOfProfit.base),
  number('Expected shortfall', 'Mean of the worst 5%, in the currency', (seal) => mainLaw(seal).expectedShortfall),
  number(
    'Greatest loss',
    'At expiry after fees; empty when without limit',
    ({ forecast }) => forecast.ends.greatestLoss,
  ),
  number(
    'Greatest gain',
    'At expiry after fees; empty when without limit',
    ({ forecast }) => forecast.ends.greatestGain,
  ),
];
