import reference from '@/tests/reference/data/european.json';
import { casesOf, expectWithin, numberOf, oneClockOption, type ReferenceCase } from '@/tests/reference/reference-file';
import { logDrift } from '@/journal/odds/log-drift';
import { oddsBeyondLevel } from '@/journal/odds/odds-beyond-level';
import { type EuropeanOption, europeanOptionPrice, europeanOptionValue } from '@/journal/pricing/european-option';

const optionOf = (one: ReferenceCase): EuropeanOption => ({
  ...oneClockOption(one),
  dailyVolatility: numberOf(one, 'sigma'),
});

/** The Greeks in the units of the file: per 1.00 of volatility and rate, theta per year. */
function greeksPerUnit(option: EuropeanOption) {
  const { vegaPerDailyPoint, rhoPerPercent, ...rest } = europeanOptionValue(option);
  return { ...rest, vega: vegaPerDailyPoint * 100, rho: rhoPerPercent * 100, theta: thetaPerYear(option) };
}

/**
 * Theta is a full repricing one session later, so a session is made shorter and shorter, the variance of the whole term kept, and
 * its theta per year extrapolated to a session of no length (Richardson; the error of the last step is of order h⁵).
 */
function thetaPerYear(option: EuropeanOption): number {
  const shares = [1 / 16, 1 / 32, 1 / 64, 1 / 128, 1 / 256];
  const column = shares.map((share) => {
    const sessionYears = option.years * share;
    const shortSession = {
      ...option,
      sessions: 1 / share,
      dailyVolatility: option.dailyVolatility * Math.sqrt(sessionYears),
    };
    return europeanOptionValue(shortSession, sessionYears).thetaPerSession / sessionYears;
  });
  for (let order = 1; order < shares.length; order += 1) {
    for (let row = shares.length - 1; row >= order; row -= 1) {
      const [finer = NaN, coarser = NaN] = [column[row], column[row - 1]];
      column[row] = finer + (finer - coarser) / (2 ** order - 1);
    }
  }
  return column.at(-1) ?? NaN;
}

/** Of Black, Scholes and Merton: what the value loses with time follows from its curvature and its carry. */
function thetaByEquation(option: EuropeanOption): number {
  const { price, delta, gamma } = europeanOptionValue(option);
  const { dailyVolatility, spotPrice, ratePerYear, dividendYield } = option;
  return (
    ratePerYear * price -
    (ratePerYear - dividendYield) * spotPrice * delta -
    (dailyVolatility * spotPrice) ** 2 * (gamma / 2)
  );
}

describe('European options against printed tables', () => {
  const printedDigits = 1e-4; // four decimals

  it.each([...casesOf(reference, 'haug-p2-8'), ...casesOf(reference, 'haug-p24')])('has the price of $id', (one) => {
    expectWithin(europeanOptionPrice(optionOf(one)), numberOf(one, 'price'), printedDigits);
  });

  it.each(casesOf(reference, 'haug-greeks'))('has the $greek of $id', (one) => {
    const option = optionOf(one);
    const { price, delta, gamma, vega, theta, rho } = greeksPerUnit(option);
    const greeks: Record<string, number> = {
      delta,
      gamma,
      vega,
      theta,
      rho,
      theta_per_calendar_day: theta / 365,
      elasticity: (delta * option.spotPrice) / price,
    };
    expectWithin(greeks[String(one.greek)] ?? NaN, numberOf(one, 'value'), printedDigits);
  });

  it.each(casesOf(reference, 'hull'))('has the figures of $id', (one) => {
    const value = greeksPerUnit(optionOf(one));
    const halfPrintedDigit = { price: 0.005, delta: 0.0005, gamma: 0.0005, vega: 0.05, theta: 0.005, rho: 0.005 };
    expectWithin(value.price, numberOf(one, 'price'), halfPrintedDigit.price);
    if (one.delta === undefined) return; // the example prints a price alone
    for (const greek of ['delta', 'gamma', 'vega', 'theta', 'rho'] as const) {
      expectWithin(value[greek], numberOf(one, greek), halfPrintedDigit[greek]);
    }
  });
});

describe('European options against 60-digit values', () => {
  const grid = ['trading-time', 'calendar-time', 'strike-ratio'].flatMap((group) => casesOf(reference, group));

  it.each(grid)('has price, Greeks and odds of $id', (one) => {
    const value = greeksPerUnit(optionOf(one));
    const spot = numberOf(one, 'S');
    // The tolerances of the file; where it states two, either may hold.
    const relative = (field: string) => 1e-8 * Math.abs(numberOf(one, field));
    expectWithin(value.price, numberOf(one, 'price'), 1e-10 * Math.max(1, spot));
    expectWithin(value.delta, numberOf(one, 'delta'), 1e-9);
    expectWithin(value.oddsInTheMoney, numberOf(one, 'prob_itm'), 1e-9);
    expectWithin(value.gamma, numberOf(one, 'gamma'), Math.max(relative('gamma'), 1e-9 / spot));
    expectWithin(value.vega, numberOf(one, 'vega'), Math.max(relative('vega'), 1e-9 * spot));
    expectWithin(value.theta, numberOf(one, 'theta'), Math.max(relative('theta'), 1e-8 * spot));
    expectWithin(value.rho, numberOf(one, 'rho'), Math.max(relative('rho'), 1e-9 * spot));
  });

  it.each(grid)('keeps the digits of the price of $id, however small', (one) => {
    const expected = numberOf(one, 'price');
    const price = europeanOptionPrice(optionOf(one));
    // One rounding of the logarithm moves a price far out by the square of its deviations; measured 1.9e-14 at worst.
    expectWithin(price, expected, 2e-14 * expected);
  });

  it.each(grid)('obeys the pricing equation at $id', (one) => {
    const tolerance = Math.max(1e-8 * Math.abs(numberOf(one, 'theta')), 1e-8 * numberOf(one, 'S'));
    expectWithin(thetaByEquation(optionOf(one)), numberOf(one, 'theta'), tolerance);
  });

  it.each(casesOf(reference, 'limits'))('takes the limit of $id, $note', (one) => {
    const { price, oddsInTheMoney } = europeanOptionValue(optionOf(one));
    expectWithin(price, numberOf(one, 'price'), 1e-10);
    expectWithin(europeanOptionPrice(optionOf(one)), numberOf(one, 'price'), 1e-10);
    expect(oddsInTheMoney).toBe(numberOf(one, 'prob_itm'));
  });
});

describe('odds of finishing beyond a level against 60-digit values', () => {
  it.each(casesOf(reference, 'finish-probability'))('has the probability of $id', (one) => {
    const sessions = numberOf(one, 'T');
    const sigma = numberOf(one, 'sigma');
    const totalVariance = sigma ** 2 * sessions;
    const drift = numberOf(one, 'drift');
    // 'price': E[S] grows at the drift; 'log': ln S does.
    const meanOfLog =
      one.drift_convention === 'price'
        ? logDrift({
            drift: { kind: 'ownView', expectedLogReturnPerSession: drift },
            totalVariance,
            sessions,
            years: sessions,
            ratePerYear: 0,
            dividendYield: 0,
          })
        : drift * sessions;
    const { above, below } = oddsBeyondLevel({
      spotPrice: numberOf(one, 'S'),
      level: one.break_even === undefined ? numberOf(one, 'K') : numberOf(one, 'break_even'),
      totalDeviation: Math.sqrt(totalVariance),
      logDrift: meanOfLog,
    });
    expectWithin(one.type === 'call' ? above : below, numberOf(one, 'probability'), 1e-9);
  });
});
