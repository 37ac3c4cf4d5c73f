import blackScholesPackage from 'black-scholes';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { planHorizon } from '@/journal/forecast/plan-horizon';
import { planModel } from '@/journal/forecast/plan-model';
import { resampledForecast } from '@/journal/forecast/resampled-forecast';
import { seededRandom } from '@/journal/random/seeded-random';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { compareSpeed } from '@/tests/bench/compare-speed';
import { reportSpeed } from '@/tests/bench/report-speed';

const PATHS = 10_000;
const HELD_SESSIONS = 5;
const id = (last: string) => `01940000-0000-7000-8000-00000000000${last}`;
const leg = (
  last: string,
  side: 'buy' | 'sell',
  type: 'call' | 'put',
  strikePrice: string,
  premium: string,
): ForecastInput['legs'][number] => ({
  id: id(last),
  side,
  type,
  strikePrice,
  premium,
  quantity: 1,
  expirySessionDate: '2026-12-23',
});

/** A condor of four legs, left five sessions before expiry. */
const input: ForecastInput = {
  underlying: {
    symbol: 'JQVO',
    style: 'european',
    settlement: 'cash',
    settlementTime: 'pm',
    multiplier: '100',
    dividendYield: 0,
  },
  spot: { price: '100', at: '2026-12-09T21:00:00.000Z', source: 'bar' },
  legs: [
    leg('a', 'buy', 'put', '92', '0.12'),
    leg('b', 'sell', 'put', '96', '0.55'),
    leg('c', 'sell', 'call', '104', '0.60'),
    leg('d', 'buy', 'call', '108', '0.15'),
  ],
  holding: { kind: 'sessions', sessions: HELD_SESSIONS },
  volatility: {
    source: 'window',
    window: 20,
    lambda: null,
    low: 0.0114,
    base: 0.015,
    high: 0.0219,
    lastSessionDate: '2026-12-09',
  },
  drift: { kind: 'zeroReturn' },
  ratePerYear: 0.04,
  overnightShare: 0.3,
  feePerContract: '0.65',
  targetPrice: null,
  stopPrice: null,
};
const model = planModel(input, planHorizon(input, usOptionsCalendar));

const random = seededRandom(20261209);
const source = Array.from({ length: 250 }, () => 0.015 * random.normal());
/** Sums of redrawn returns: the same for both contenders. */
function drawPaths(): Float64Array {
  const draws = seededRandom(42);
  return Float64Array.from({ length: PATHS }, () => {
    let sum = 0;
    for (let session = 0; session < HELD_SESSIONS; session += 1) sum += source[draws.index(source.length)] ?? 0;
    return sum;
  });
}

const sessionsLeft = model.horizon.sessions.toExpiry - HELD_SESSIONS;
const yearsLeft = model.horizon.years.toExpiry - model.horizon.years.holding;
/** The profits of all paths by the package, one leg at a time, sorted; their mean. */
function meanByPackage(): number {
  const profits = Array.from(drawPaths(), (logReturn) => {
    const price = model.spotPrice * Math.exp(logReturn);
    let profit = -model.position.costToOpen - model.position.feesToClose;
    for (const { type, strikePrice, signedShares, dailyVolatility } of model.repricedLegs) {
      const yearlyVolatility = dailyVolatility * Math.sqrt(sessionsLeft / yearsLeft);
      profit +=
        signedShares *
        blackScholesPackage.blackScholes(price, strikePrice, yearsLeft, yearlyVolatility, input.ratePerYear, type);
    }
    return profit;
  }).sort((one, other) => one - other);
  return profits.reduce((sum, profit) => sum + profit, 0) / PATHS;
}

function wholeForecast(): number {
  const fresh = planModel(input, planHorizon(input, usOptionsCalendar));
  const forecast = makeForecast(input, usOptionsCalendar);
  return resampledForecast(fresh, drawPaths()).mean.value + 0 * forecast.forwardPrice;
}

const difference = Math.abs(wholeForecast() - meanByPackage());
if (!(difference < 1e-6)) throw new Error(`The forecast and the package differ by ${difference}.`);

const repeat = (once: () => number) => (count: number) => {
  let sum = 0;
  for (let done = 0; done < count; done += 1) sum += once();
  return sum;
};
const rows = compareSpeed({ name: 'black-scholes: mean profit over the paths alone', work: repeat(meanByPackage) }, [
  { name: 'whole forecast with 10,000 paths', work: repeat(wholeForecast) },
  { name: 'whole forecast without paths', work: repeat(() => makeForecast(input, usOptionsCalendar).forwardPrice) },
]);
reportSpeed({ title: 'Forecasts of a plan of four legs a second', aim: 20, rows });
