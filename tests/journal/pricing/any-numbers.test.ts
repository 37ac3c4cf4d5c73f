import { DomainError } from '@/journal/errors/domain-error';
import { europeanValueColumns, valueColumns } from '@/journal/pricing/european-columns';
import { europeanOptionPrice, europeanOptionValue } from '@/journal/pricing/european-option';
import { impliedDailyVolatility } from '@/journal/pricing/implied-daily-volatility';
import { impliedQuote } from '@/journal/pricing/implied-quote';
import { secondOpinion } from '@/journal/pricing/second-opinion';
import { seededRandom } from '@/journal/random/seeded-random';
import { columnsOf } from '@/tests/bench/column-options';
import { runs } from '@/tests/journal/deep-runs';

const random = seededRandom(20261201);
const ONE_SECOND = 1 / (6.5 * 3600); // of a session
const extremes = [0, -0, 5e-324, -5e-324, 1e-310, 2 ** -1022, 1e-160, 1e-16, ONE_SECOND, 1, -1, 2 ** 53, 1e160, 1e300];
const awkward = [...extremes, Number.MAX_VALUE, -Number.MAX_VALUE, Infinity, -Infinity, NaN];
const between = (low: number, high: number) => low + (high - low) * random.uniform();

/** Mostly within a range or at its ends, now and then any double, so that most inputs get past the checks. */
function number(low: number, high: number): number {
  const chance = random.uniform();
  if (chance < 0.85) return between(low, high);
  if (chance < 0.9) return random.uniform() < 0.5 ? low : high;
  if (chance < 0.95) return (random.uniform() < 0.7 ? 1 : -1) * 10 ** between(-320, 308);
  return awkward[random.index(awkward.length)] ?? NaN;
}

function anyOption() {
  const spotPrice = number(1, 300);
  const sessions = random.uniform() < 0.3 ? number(0, 60 * ONE_SECOND) : number(0, 45);
  return {
    type: random.uniform() < 0.5 ? ('call' as const) : ('put' as const),
    spotPrice,
    strikePrice: random.uniform() < 0.3 ? spotPrice * number(0.99, 1.01) : number(1, 300),
    dailyVolatility: number(0, 0.1),
    sessions,
    years: random.uniform() < 0.5 ? sessions / 252 : number(0, 0.2),
    ratePerYear: number(-0.02, 0.1),
    dividendYield: number(0, 0.1),
  };
}

/** For each of the seven ways in: 210,000 in all, seven million in the long run. */
const count = runs(30_000, 1_000_000);

/** Calls with any numbers; every figure of an answer has to be finite and every error one that is announced. */
function answered<Input>(codes: readonly string[], inputOf: () => Input, call: (input: Input) => object): number {
  let answers = 0;
  for (let run = 0; run < count; run += 1) {
    const input = inputOf();
    try {
      if (!isFinite(call(input))) throw new Error('a figure is not finite');
      answers += 1;
    } catch (error) {
      if (error instanceof DomainError && codes.includes(error.code)) continue;
      throw new Error(`run ${run}: ${show(input)}: ${String(error)}`);
    }
  }
  return answers / count;
}

function isFinite(answer: object): boolean {
  for (const figure of Object.values(answer)) {
    if (typeof figure === 'number' && !Number.isFinite(figure)) return false;
    if (typeof figure === 'object' && figure !== null && !isFinite(figure)) return false;
  }
  return true;
}

/** JSON would hide what is not finite. */
const show = (input: unknown) =>
  JSON.stringify(input, (_, value: unknown) => (typeof value === 'number' ? String(value) : value));

/** Less would mean that the inputs hardly ever get past the checks. */
const A_QUARTER = 0.25;
const optionCodes = ['option-input-invalid', 'option-value-out-of-range'];

describe('pricing, whatever numbers it is given', () => {
  it('prices with finite numbers or says why not', () => {
    const answers = answered(optionCodes, anyOption, (option) => ({ price: europeanOptionPrice(option) }));
    expect(answers).toBeGreaterThan(A_QUARTER);
  });

  it('values with finite Greeks and odds, in range, or says why not', () => {
    const answers = answered(
      optionCodes,
      () => ({ option: anyOption(), years: number(0, 0.01) }),
      ({ option, years }) => {
        const value = europeanOptionValue(option, years);
        const isInRange =
          value.price >= 0 &&
          value.gamma >= 0 &&
          value.vegaPerDailyPoint >= 0 &&
          0 <= value.oddsInTheMoney &&
          value.oddsInTheMoney <= 1;
        if (!isInRange) throw new Error(`out of range: ${JSON.stringify(value)}`);
        return value;
      },
    );
    expect(answers).toBeGreaterThan(A_QUARTER);
  });

  it('fills columns with finite numbers or says why not', () => {
    const values = valueColumns(1);
    const figures: readonly Float64Array[] = Object.values(values);
    const answers = answered(optionCodes, anyOption, (option) => {
      europeanValueColumns(columnsOf([option]), values, 1 / 365);
      return figures.map(([figure]) => figure);
    });
    expect(answers).toBeGreaterThan(A_QUARTER);
  });

  it('finds a finite volatility, or none with a finite bound, or says why not', () => {
    const quoteOf = () => ({ ...anyOption(), price: number(0, 30) });
    expect(answered(optionCodes, quoteOf, impliedDailyVolatility)).toBeGreaterThan(A_QUARTER);
  });

  it('finds volatilities of prices from the narrow band in which they have some', () => {
    const quoteOf = () => {
      const option = anyOption();
      const most = option.type === 'call' ? option.spotPrice : option.strikePrice;
      const intrinsic = Math.max((option.spotPrice - option.strikePrice) * (option.type === 'call' ? 1 : -1), 0);
      return { ...option, price: intrinsic + (most - intrinsic) * 10 ** between(-40, 0) };
    };
    expect(answered(optionCodes, quoteOf, impliedDailyVolatility)).toBeGreaterThan(A_QUARTER);
  });

  it('finds the volatilities of any quote, or says why not', () => {
    const quoteOf = () => {
      const bidPrice = number(0, 10);
      return { ...anyOption(), bidPrice, askPrice: bidPrice + number(0, 1), tickSize: number(0.01, 0.05) };
    };
    const codes = [...optionCodes, 'quote-invalid', 'quote-crossed'];
    expect(answered(codes, quoteOf, (quote) => impliedQuote(quote))).toBeGreaterThan(A_QUARTER / 2);
  });

  it('has a finite second opinion or says why not', () => {
    expect(answered([...optionCodes, 'second-opinion-missing'], anyOption, secondOpinion)).toBeGreaterThan(A_QUARTER);
  });
});
