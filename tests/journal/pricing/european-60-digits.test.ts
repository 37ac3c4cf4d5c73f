import reference from '@/tests/journal/pricing/european-60-digits.json';
import { europeanOptionValue, type EuropeanOption } from '@/journal/pricing/european-option';

const HALF_ULP = 2 ** -53;
const cases = reference.cases.map(({ option, ...rest }) => {
  if (option.type !== 'call' && option.type !== 'put') throw new Error(`no option type: ${option.type}`);
  const typed: EuropeanOption = { ...option, type: option.type };
  return { option: typed, ...rest };
});
/** A rounding of the logarithm moves the exponential by deviations² of its own; all the rest is a few roundings. */
const roundings = (deviationsOut: number) => HALF_ULP * (8 + 3 * deviationsOut * deviationsOut);
/** Past a deviation of a sixteenth the tails are subtracted, which leaves of a few roundings this many times as much. */
const cancellation = (deviationsOut: number, deviation: number) =>
  deviation > 1 / 16 ? (HALF_ULP * 2 * (1 + deviationsOut)) / Math.min(deviation, 1) : 0;

describe('European options against 60-digit values, from seconds before expiry to two years', () => {
  it.each(cases)('keeps the digits of every figure of $option', ({ option, deviationsOut, value }) => {
    const ours = europeanOptionValue(option);
    for (const figure of ['delta', 'gamma', 'vegaPerDailyPoint', 'rhoPerPercent', 'oddsInTheMoney'] as const) {
      const error = Math.abs(ours[figure] - value[figure]);
      expect([figure, error]).toEqual([figure, Math.min(error, roundings(deviationsOut) * Math.abs(value[figure]))]);
    }
    const deviation = option.dailyVolatility * Math.sqrt(option.sessions);
    const allowed = roundings(deviationsOut) + cancellation(deviationsOut, deviation);
    expect(Math.abs(ours.price - value.price)).toBeLessThanOrEqual(allowed * value.price);
    // Theta is a difference of two time values; what the intrinsic value loses or gains comes to it with all its digits.
    const timeValues = 2 * timeValueOf(option, value.price) + Math.abs(value.thetaPerSession);
    expect(Math.abs(ours.thetaPerSession - value.thetaPerSession)).toBeLessThanOrEqual(allowed * timeValues);
  });

  it('spans seconds to years and the middle to 36 deviations out', () => {
    expect(Math.min(...cases.map(({ option }) => option.sessions))).toBe(0.001);
    expect(Math.max(...cases.map(({ option }) => option.sessions))).toBe(500);
    expect(Math.max(...cases.map(({ deviationsOut }) => deviationsOut))).toBeGreaterThan(35);
    expect(cases.length).toBeGreaterThan(100);
  });
});

function timeValueOf(
  { type, spotPrice, strikePrice, years, ratePerYear, dividendYield }: EuropeanOption,
  price: number,
) {
  const forward = spotPrice * Math.exp(-dividendYield * years) - strikePrice * Math.exp(-ratePerYear * years);
  return price - Math.max(type === 'call' ? forward : -forward, 0);
}
