import { DomainError } from '@/journal/errors/domain-error';
import { type Fill } from '@/journal/fills/fill';

/** Which exercise or assignment made which trade in the underlying. */
export interface Delivery {
  readonly optionFillId: string;
  readonly sharesFillId: string;
}

export interface DeliveryFills {
  readonly optionFill: Fill;
  readonly sharesFill: Fill;
}

/**
 * The fills that deliveries speak of.
 * @throws {DomainError} `delivery-unknown` when one is missing or of the wrong kind, `delivery-repeated` when one is named twice.
 */
export function deliveryFills(fills: readonly Fill[], deliveries: readonly Delivery[]): DeliveryFills[] {
  const byId = new Map(fills.map((fill) => [fill.id, fill]));
  const named = new Set<string>();
  return deliveries.map(({ optionFillId, sharesFillId }) => {
    const [optionFill, sharesFill] = [byId.get(optionFillId), byId.get(sharesFillId)];
    const isEnding = optionFill?.kind === 'assignment' || optionFill?.kind === 'exercise';
    const isTrade = sharesFill?.kind === 'buy' || sharesFill?.kind === 'sell';
    if (!(isEnding && isTrade && sharesFill.instrument.kind === 'stock')) {
      throw new DomainError('delivery-unknown', { optionFillId, sharesFillId });
    }
    for (const id of [optionFillId, sharesFillId]) {
      if (named.has(id)) throw new DomainError('delivery-repeated', { fillId: id });
      named.add(id);
    }
    return { optionFill, sharesFill };
  });
}
