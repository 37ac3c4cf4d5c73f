import { payoffAt } from '@/journal/contracts/expiry-payoff';
import { type PlannedLeg } from '@/journal/contracts/planned-leg';
import { type StructureLeg } from '@/journal/contracts/structure-leg';
import { type ContractTerms, costToOpen, structurePayoff } from '@/journal/contracts/structure-payoff';

const terms: ContractTerms = { premiumMultiplier: '100', deliverableShares: '100', deliverableCash: '0' };
const costs = { feePerContract: '0.65', feePerShare: '0' };
const option = (
  side: 'buy' | 'sell',
  type: 'call' | 'put',
  strikePrice: string,
  premium: string,
  quantity = 1,
): PlannedLeg => ({
  id: `${side} ${type} ${strikePrice}`,
  side,
  type,
  strikePrice,
  premium,
  quantity,
  expirySessionDate: '2026-12-23',
});
const shares = (side: 'buy' | 'sell', quantity: number, price: string): StructureLeg => ({
  id: 'shares',
  side,
  type: 'shares',
  quantity,
  price,
});

describe('the pay-off of a structure', () => {
  it('breaks even after fees: a bull put 97 / 95 for 0.55 at 96.463, with 53.70 to gain and 146.30 to lose', () => {
    const legs = [option('sell', 'put', '97', '1.36'), option('buy', 'put', '95', '0.81')];
    const payoff = structurePayoff(legs, terms, costs);
    expect(payoff.breakEvens[0]).toBeCloseTo(96.463, 9);
    expect(payoff.greatestGain).toBeCloseTo(53.7, 9);
    expect(payoff.greatestLoss).toBeCloseTo(-146.3, 9);
  });

  it('takes shares with calls against them: 51.20 less 2.90 and the fee is the break-even', () => {
    const legs = [shares('buy', 100, '51.20'), option('sell', 'call', '50', '2.90')];
    const payoff = structurePayoff(legs, terms, { feePerContract: '0.66', feePerShare: '0' });
    expect(payoff.greatestGain).toBeCloseTo(169.34, 9); // 100 × (50 − 51.20 + 2.90) − 0.66
    expect(payoff.breakEvens).toHaveLength(1);
    expect(payoff.breakEvens[0]).toBeCloseTo(48.3066, 9);
  });

  it('pays what an adjusted contract delivers, for a premium on its own multiplier', () => {
    // After a split of three for two: 150 shares and 12.50 in cash against 100 × the strike.
    const adjusted = { premiumMultiplier: '100', deliverableShares: '150', deliverableCash: '12.50' };
    const payoff = structurePayoff([option('buy', 'call', '60', '2')], adjusted, costs);
    expect(payoffAt(payoff, 45)).toBeCloseTo(150 * 45 + 12.5 - 6000 - 200.65, 9);
    expect(payoff.breakEvens[0]).toBeCloseTo((6000 - 12.5 + 200.65) / 150, 9);
    expect(payoff.greatestLoss).toBeCloseTo(-200.65, 9);
  });

  it('costs premiums by contracts and shares by their price, each with its fee', () => {
    const legs = [shares('buy', 200, '51.20'), option('sell', 'call', '50', '2.90', 2)];
    expect(costToOpen(legs, terms, { feePerContract: '0.65', feePerShare: '0.005' }).toString()).toBe('9662.3');
  });

  it.each<[string, readonly StructureLeg[], Partial<ContractTerms>, string]>([
    ['no legs', [], {}, 'legs-missing'],
    [
      'two expiries',
      [option('buy', 'call', '50', '1'), { ...option('sell', 'call', '50', '1'), expirySessionDate: '2026-12-18' }],
      {},
      'legs-of-several-expiries',
    ],
    [
      'a contract that delivers nothing',
      [option('buy', 'call', '50', '1')],
      { deliverableShares: '0' },
      'contract-terms-invalid',
    ],
    [
      'cash above the exercise amount',
      [option('buy', 'call', '50', '1')],
      { deliverableCash: '5000' },
      'contract-terms-invalid',
    ],
  ])('refuses %s', (_, legs, given, code) => {
    expect(() => structurePayoff(legs, { ...terms, ...given }, costs)).toThrow(code);
  });
});
