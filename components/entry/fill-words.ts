import { formatDate } from '@/components/ui/number-format';
import { type EntryFill } from '@/shared/entries/entry';

/** What a fill did, in one word. */
export const fillActs: Record<EntryFill['kind'], string> = {
  buy: 'Buy',
  sell: 'Sell',
  expiry: 'Expired',
  assignment: 'Assigned',
  exercise: 'Exercised',
};

/** "23 Dec 97 put", or the shares an exercise made. */
export function contractWords({ instrument }: Pick<EntryFill, 'instrument'>): string {
  return instrument.kind === 'stock'
    ? `${instrument.symbol} shares`
    : `${formatDate(instrument.expirySessionDate, 'short')} ${instrument.strikePrice} ${instrument.type}`;
}
