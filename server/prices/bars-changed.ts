import { type DeskScope } from '@/server/database/desk-scope';
import { type BarPrices } from '@/server/prices/compare-bars';
import { type PriceChange, priceFields } from '@/shared/entries/outcome-history';

/** What a write to the bars of one underlying changed. */
export interface BarsChange {
  readonly underlyingId: string;
  /** The first session that changed. */
  readonly fromSessionDate: string;
  /** Oldest session first. */
  readonly prices: readonly PriceChange[];
}

/** Told after bars were stored, so that outcomes can follow. */
export type OnBarsChanged = (scope: DeskScope, change: BarsChange) => Promise<void>;

type SessionPrices = BarPrices & { readonly settlement?: string | null };

/** The prices of one session that are not what they were; a settlement value that is not named stays as it was. */
export function priceChanges(sessionDate: string, before: SessionPrices | null, after: SessionPrices): PriceChange[] {
  return priceFields.flatMap((field) => {
    const [was, is] = [before?.[field] ?? null, after[field]];
    return is === undefined || was === is ? [] : [{ sessionDate, field, before: was, after: is }];
  });
}
