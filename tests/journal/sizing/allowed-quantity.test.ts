import { allowedQuantity, type SizeLimits } from '@/journal/sizing/allowed-quantity';

const none: SizeLimits = { lossPerEntry: null, riskPerUnderlying: null, shareOfAccount: null, contracts: null };
const unit = { greatestLoss: '146.30', contracts: 2 };

describe('allowedQuantity', () => {
  it('names the limit that allows fewest', () => {
    const limits: SizeLimits = {
      lossPerEntry: '1000',
      riskPerUnderlying: { limit: '1500', open: '900' },
      shareOfAccount: { share: '0.02', accountValue: '50000' },
      contracts: 20,
    };
    expect(allowedQuantity(unit, limits)).toEqual({
      quantity: 4,
      binding: 'risk-per-underlying',
      allowed: [
        { limit: 'loss-per-entry', quantity: 6 },
        { limit: 'risk-per-underlying', quantity: 4 },
        { limit: 'share-of-account', quantity: 6 },
        { limit: 'contracts', quantity: 10 },
      ],
    });
  });

  it('allows a loss of exactly the limit, to the cent', () => {
    expect(allowedQuantity(unit, { ...none, lossPerEntry: '438.90' }).quantity).toBe(3);
    expect(allowedQuantity(unit, { ...none, lossPerEntry: '438.89' }).quantity).toBe(2);
  });

  it('allows nothing where more is at risk than the limit', () => {
    const limits = { ...none, riskPerUnderlying: { limit: '100', open: '250' } };
    expect(allowedQuantity(unit, limits)).toMatchObject({ quantity: 0, binding: 'risk-per-underlying' });
  });

  it('has nothing to say without limits', () => {
    expect(allowedQuantity(unit, none)).toEqual({ quantity: null, binding: null, allowed: [] });
  });

  it.each<[string, Parameters<typeof allowedQuantity>, string]>([
    ['a loss without limit', [{ ...unit, greatestLoss: null }, none], 'loss-without-limit'],
    ['a loss of 0', [{ ...unit, greatestLoss: '0' }, none], 'loss-not-positive'],
    ['half a contract', [{ ...unit, contracts: 0.5 }, none], 'unit-contracts-invalid'],
    ['a limit below 0', [unit, { ...none, lossPerEntry: '-1' }], 'size-limit-invalid'],
    [
      'a share above 1',
      [unit, { ...none, shareOfAccount: { share: '1.5', accountValue: '100' } }],
      'size-limit-invalid',
    ],
    ['half a contract as the limit', [unit, { ...none, contracts: 1.5 }], 'size-limit-invalid'],
    ['an amount that is no number', [unit, { ...none, lossPerEntry: 'much' }], 'decimal-invalid'],
  ])('refuses %s', (_, [one, limits], code) => {
    expect(() => allowedQuantity(one, limits)).toThrow(code);
  });
});
