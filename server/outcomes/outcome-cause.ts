import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type Fill } from '@/journal/fills/fill';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type OutcomeCause, type PriceChange } from '@/shared/entries/outcome-history';

/** So many prices tell why; an upload may hold thousands. */
const MOST_PRICES = 10;

/** The cause of an outcome that follows new prices: those the entry looks at, corrected ones first. */
export function pricesCause(
  prices: readonly PriceChange[],
  { input, expirySessionDate }: { readonly input: ForecastInput; readonly expirySessionDate: string | null },
): OutcomeCause {
  const watched = prices.filter(
    ({ sessionDate }) =>
      (usOptionsCalendar.sessionOn(sessionDate)?.closesAt ?? '') > input.spot.at &&
      (expirySessionDate === null || sessionDate <= expirySessionDate),
  );
  const corrected = watched.filter(({ before }) => before !== null);
  const fresh = watched.filter(({ before }) => before === null);
  // Settlement values tell more than closes, and late sessions more than early ones.
  const told = [
    ...corrected,
    ...fresh.filter(({ field }) => field === 'settlement').reverse(),
    ...fresh.filter(({ field }) => field !== 'settlement').reverse(),
  ].slice(0, MOST_PRICES);
  return { kind: watched.some(({ field }) => field === 'settlement') ? 'settlement' : 'bar', prices: told };
}

/** The cause of an outcome that follows a fill added or taken out. */
export function fillCause(
  act: 'added' | 'taken-out',
  { kind, instrument, quantity, price }: Omit<Fill, 'sequence'>,
): OutcomeCause {
  const contract =
    instrument.kind === 'stock'
      ? `${instrument.symbol} shares`
      : `${instrument.expirySessionDate} ${instrument.strikePrice} ${instrument.type}`;
  return { kind: 'fill', act, fill: { kind, contract, quantity, price } };
}
