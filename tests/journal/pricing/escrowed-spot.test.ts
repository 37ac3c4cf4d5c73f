import { escrowedSpot } from '@/journal/pricing/escrowed-spot';

const life = { spotPrice: 100, years: 14 / 365, ratePerYear: 0.04 };

describe('escrowed spot', () => {
  it('takes the worth of a dividend in five days off the spot', () => {
    expect(escrowedSpot({ ...life, dividends: [{ years: 5 / 365, amount: 0.5 }] })).toBeCloseTo(99.50027, 5);
  });

  it('counts a dividend on the day of expiry and none after it or already paid', () => {
    const one = { years: life.years, amount: 1 };
    const counted = escrowedSpot({ ...life, dividends: [one] });
    const others = [
      { years: life.years + 1e-9, amount: 1 },
      { years: 0, amount: 1 },
    ];
    expect(escrowedSpot({ ...life, dividends: [one, ...others] })).toBe(counted);
    expect(counted).toBeCloseTo(100 - Math.exp(-0.04 * life.years), 12);
  });

  it('is the spot without dividends', () => {
    expect(escrowedSpot({ ...life, dividends: [] })).toBe(100);
  });

  it('throws dividends-exceed-spot when nothing would be left', () => {
    expect(() => escrowedSpot({ ...life, dividends: [{ years: 0.01, amount: 101 }] })).toThrow(
      expect.objectContaining({ code: 'dividends-exceed-spot' }),
    );
  });

  it.each([
    { years: -1, amount: 1 },
    { years: NaN, amount: 1 },
    { years: 0.01, amount: -1 },
    { years: 0.01, amount: Infinity },
  ])('throws dividend-invalid naming the index of %j', (bad) => {
    expect(() => escrowedSpot({ ...life, dividends: [{ years: 0.01, amount: 1 }, bad] })).toThrow(
      expect.objectContaining({ code: 'dividend-invalid', details: expect.objectContaining({ index: 1 }) }),
    );
  });
});
