import { type PlannedLeg } from '@/journal/contracts/planned-leg';
import { structureKind } from '@/journal/contracts/structure-kind';

const leg = (side: PlannedLeg['side'], type: PlannedLeg['type'], strikePrice: string, quantity = 1): PlannedLeg => ({
  id: `${side} ${type} ${strikePrice}`,
  side,
  type,
  strikePrice,
  quantity,
  expirySessionDate: '2026-12-18',
  premium: '1',
});

describe('the kind of a structure', () => {
  it('is one name whatever the strikes and however many', () => {
    expect(structureKind([leg('sell', 'put', '97'), leg('buy', 'put', '95')])).toBe('bull put');
    expect(structureKind([leg('sell', 'put', '60', 3), leg('buy', 'put', '55', 3)])).toBe('bull put');
    expect(structureKind([leg('buy', 'call', '102', 5)])).toBe('long call');
  });

  it('is other where the trade has no name', () => {
    expect(structureKind([leg('sell', 'put', '97', 2), leg('buy', 'put', '95', 1), leg('buy', 'call', '97')])).toBe(
      'other',
    );
    expect(structureKind([])).toBe('other');
  });
});
