import fc from 'fast-check';
import { buildStructure } from '@/journal/contracts/build-structure';
import { expiryPayoff } from '@/journal/contracts/expiry-payoff';
import { structureEnds } from '@/journal/contracts/structure-ends';
import { costToOpen, structurePayoff } from '@/journal/contracts/structure-payoff';
import { structureTable } from '@/journal/contracts/structure-table';
import { DomainError } from '@/journal/errors/domain-error';
import { breakEvenMoves } from '@/journal/forecast/break-even-moves';
import { forecastFirstExpiry } from '@/journal/forecast/forecast-first-expiry';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { planHorizon } from '@/journal/forecast/plan-horizon';
import { planModel } from '@/journal/forecast/plan-model';
import { profitLaw } from '@/journal/forecast/profit-law';
import { resampledProfit } from '@/journal/forecast/resampled-profit';
import { latticeGrid } from '@/journal/scenarios/lattice';
import { positionGreeks } from '@/journal/scenarios/position-greeks';
import { runScenarios } from '@/journal/scenarios/run-scenarios';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { allowedQuantity } from '@/journal/sizing/allowed-quantity';
import { kellyOutcomes, logGrowth } from '@/journal/sizing/kelly-outcomes';
import { cappedKelly, kellySize } from '@/journal/sizing/kelly-size';
import { breakEvenProbability } from '@/journal/sizing/kelly-two-outcomes';
import { runs } from '@/tests/journal/deep-runs';
import { longCall } from '@/tests/journal/forecast/plan-examples';

/** Mostly plausible, now and then what formulas stumble over. */
const number = (min: number, max: number) =>
  fc.oneof(
    { weight: 12, arbitrary: fc.double({ min, max, noNaN: true }) },
    {
      weight: 1,
      arbitrary: fc.constantFrom(0, -0, 1, -1, 1e-9, 1e-300, 5e-324, 1e150, 1.7e308, Infinity, -Infinity, NaN),
    },
  );
const text = (min: number, max: number) =>
  fc.oneof(
    { weight: 12, arbitrary: fc.double({ min, max, noNaN: true }).map((value) => value.toFixed(2)) },
    { weight: 1, arbitrary: fc.constantFrom('', '0', '-1', '1e5', 'NaN', '0.000000000001', '999999999999.99', '1,5') },
  );
const type = fc.constantFrom('call' as const, 'put' as const);
const side = fc.constantFrom('buy' as const, 'sell' as const);
const name = fc.constantFrom(...structureTable.map((row) => row.name));
const whole = fc.oneof({ weight: 10, arbitrary: fc.integer({ min: 1, max: 20 }) }, number(0, 3));

const plannedLeg = fc.record({
  id: fc.uuid(),
  side,
  type,
  strikePrice: text(60, 150),
  expirySessionDate: fc.constantFrom('2026-12-11', '2026-12-23', '2026-12-18', '2026-12-25', 'soon'),
  quantity: whole,
  premium: text(0, 9),
});
const stockLeg = fc.record({
  id: fc.uuid(),
  side,
  type: fc.constant('shares' as const),
  quantity: whole,
  price: text(60, 150),
});
const repricedLeg = fc.record({
  type,
  strikePrice: number(50, 150),
  signedShares: number(-500, 500),
  dailyVolatility: number(0.001, 0.08),
  sessionsBeyond: fc.oneof(fc.constant(0), number(0, 20)),
  yearsBeyond: fc.oneof(fc.constant(0), number(0, 0.1)),
});
const legs = fc.array(repricedLeg, { maxLength: 4 });
const moment = fc.record({
  sessions: number(0, 20),
  years: number(0, 0.1),
  ratePerYear: number(-0.02, 0.1),
  dividendYield: number(-0.02, 0.1),
});
const move = fc.oneof(
  fc.record({ kind: fc.constant('sigmas' as const), sigmas: number(-3, 3) }),
  fc.record({ kind: fc.constant('percent' as const), percent: number(-50, 50) }),
);
const shift = fc.oneof(
  fc.record({ kind: fc.constant('parallel' as const), dailyShift: number(-0.01, 0.01) }),
  fc.record({ kind: fc.constant('byLeg' as const), dailyShifts: fc.array(number(-0.01, 0.01), { maxLength: 4 }) }),
  fc.record({ kind: fc.constant('relative' as const), percent: number(-50, 50) }),
);
const plan = fc.record({
  legs: fc.array(plannedLeg, { maxLength: 4 }),
  spot: text(60, 150),
  held: fc.oneof(fc.constant(null), number(0, 10)),
  volatility: fc.tuple(number(0.005, 0.01), number(0.01, 0.02), number(0.02, 0.05)),
  drift: number(-0.01, 0.01),
  rate: number(-0.02, 0.1),
  dividendYield: number(-0.02, 0.1),
  level: fc.oneof(fc.constant(null), text(60, 150)),
});
type Plan = typeof plan extends fc.Arbitrary<infer Value> ? Value : never;
const inputOf = (drawn: Plan): ForecastInput => ({
  ...longCall,
  underlying: { ...longCall.underlying, dividendYield: drawn.dividendYield },
  legs: drawn.legs,
  spot: { ...longCall.spot, price: drawn.spot },
  holding: drawn.held === null ? { kind: 'toExpiry' } : { kind: 'sessions', sessions: drawn.held },
  volatility: {
    ...longCall.volatility,
    low: drawn.volatility[0],
    base: drawn.volatility[1],
    high: drawn.volatility[2],
  },
  drift: { kind: 'ownView', expectedLogReturnPerSession: drawn.drift },
  ratePerYear: drawn.rate,
  targetPrice: drawn.level,
});

function given<Input>(arbitrary: fc.Arbitrary<Input>, compute: (input: Input) => unknown, times = 3000) {
  return () =>
    fc.assert(
      fc.property(arbitrary, (input) => {
        let answer: unknown;
        try {
          answer = compute(input);
        } catch (error) {
          if (error instanceof DomainError) return;
          throw error;
        }
        expect(numbersIn(answer).some(Number.isNaN)).toBe(false);
      }),
      { seed: 20261209, numRuns: runs(times, times * 20) },
    );
}

function numbersIn(value: unknown): number[] {
  if (typeof value === 'number') return [value];
  if (typeof value !== 'object' || value === null) return [];
  return Object.values(value).flatMap(numbersIn);
}

describe('whatever it is given, an answer has no NaN and a refusal is one of the domain', () => {
  it(
    'makeForecast',
    given(plan, (drawn) => makeForecast(inputOf(drawn), usOptionsCalendar), 1500),
  );
  it(
    'forecastFirstExpiry',
    given(plan, (drawn) => forecastFirstExpiry(inputOf(drawn), usOptionsCalendar), 1500),
  );
  it(
    'breakEvenMoves',
    given(
      plan,
      (drawn) => {
        const input = inputOf(drawn);
        return breakEvenMoves(planModel(input, planHorizon(input, usOptionsCalendar)));
      },
      1500,
    ),
  );
  it(
    'structurePayoff and costToOpen',
    given(
      fc.record({
        structure: fc.array(fc.oneof(plannedLeg, stockLeg), { maxLength: 4 }),
        premiumMultiplier: text(1, 200),
        deliverableShares: text(1, 200),
        deliverableCash: text(0, 20),
        feePerContract: text(0, 2),
      }),
      ({ structure, feePerContract, ...terms }) => {
        const costs = { feePerContract, feePerShare: '0' };
        const { breakEvens, greatestGain } = structurePayoff(structure, terms, costs);
        return [breakEvens, greatestGain, costToOpen(structure, terms, costs).toNumber()];
      },
    ),
  );
  it(
    'buildStructure and structureEnds',
    given(
      fc.record({
        name,
        quantity: whole,
        few: whole,
        many: whole,
        spotPrice: number(50, 150),
        totalDeviation: number(0.01, 0.1),
        distances: fc.array(number(-3, 3), { maxLength: 4 }),
        strikeStep: text(0.5, 5),
        cost: number(-5, 5),
        strikes: fc.array(number(50, 150), { maxLength: 4 }),
      }),
      ({ name: structure, quantity, few, many, cost, strikes, ...places }) => {
        const ends = structureEnds(structure, { strikes: strikes.sort((one, two) => one - two), cost, few, many });
        buildStructure(structure, {
          places: { kind: 'sigmas', ...places },
          expirySessionDates: ['2026-12-23'],
          quantity,
          ratio: { few, many },
          nextId: () => 'a',
        });
        return ends;
      },
    ),
  );
  it(
    'profitLaw of expiryPayoff',
    given(
      fc
        .record({ legs, cost: number(-500, 500), spotPrice: number(50, 150), logDrift: number(-0.1, 0.1) })
        .chain((drawn) => fc.record({ drawn: fc.constant(drawn), totalDeviation: number(0.01, 0.3) })),
      ({ drawn: { legs: drawnLegs, cost, ...price }, totalDeviation }) => {
        const law = profitLaw(expiryPayoff({ legs: drawnLegs, cost }).segments, { ...price, totalDeviation });
        return [law.mean, law.atOrBelow(0), law.quantile(0.05), law.expectedShortfall(0.05), law.rangesAbove(0)];
      },
    ),
  );
  it(
    'latticeGrid',
    given(
      fc.record({
        legs,
        costToOpen: number(-500, 500),
        spotPrice: number(50, 150),
        sigmas: fc.array(number(-3, 3), { maxLength: 4 }),
        holdDeviation: number(0, 0.2),
        dailyVolatility: number(0, 0.1),
        sessionsElapsed: fc.array(number(0, 10), { maxLength: 4 }),
        sessionsToExpiry: number(0, 20),
        yearsToExpiry: number(0, 0.1),
        ratePerYear: number(-0.02, 0.1),
        dividendYield: number(-0.02, 0.1),
      }),
      latticeGrid,
    ),
  );
  it(
    'runScenarios and positionGreeks',
    given(
      fc.record({
        legs,
        moment,
        shares: number(-500, 500),
        costToOpen: number(-500, 500),
        spotPrice: number(50, 150),
        holdDeviation: number(0, 0.2),
        eventDeviation: fc.oneof(fc.constant(null), number(0, 0.05)),
        move,
        volatility: shift,
        sessionsElapsed: number(0, 10),
        isEventPast: fc.boolean(),
      }),
      ({ moment: drawn, move: drawnMove, volatility, sessionsElapsed, isEventPast, ...position }) => [
        runScenarios({ ...position, ...drawn, sessionsToExpiry: drawn.sessions, yearsToExpiry: drawn.years }, [
          { name: 'any', move: drawnMove, volatility, sessionsElapsed, isEventPast },
        ]),
        positionGreeks({ ...position, moment: drawn }),
      ],
    ),
  );
  it(
    'resampledProfit',
    given(
      fc.record({
        spotPrice: number(50, 150),
        totalLogReturns: fc.array(number(-0.1, 0.1), { minLength: 98, maxLength: 130 }),
      }),
      (drawn) => resampledProfit({ ...drawn, profitAt: (price) => price - 100 }),
      500,
    ),
  );
  it(
    'Kelly',
    given(
      fc.record({
        outcomes: fc.array(fc.record({ profit: number(-5, 5), probability: fc.constantFrom(0.25, 0.5) }), {
          maxLength: 4,
        }),
        fraction: number(0, 1),
        win: number(0, 5),
        loss: fc.oneof(fc.constant(null), number(0, 5)),
        probability: fc.record({ low: number(0, 0.4), base: number(0.4, 0.6), high: number(0.6, 1) }),
        share: number(0, 0.25),
      }),
      ({ outcomes, fraction, win, loss, probability, share }) => {
        const sizes = [kellySize({ win, loss, probability }, share), cappedKelly(probability)];
        return [
          sizes,
          breakEvenProbability({ win, loss: loss ?? 1 }),
          kellyOutcomes(outcomes),
          logGrowth(outcomes, fraction),
        ];
      },
    ),
  );
  it(
    'Kelly of outcomes alone',
    given(fc.array(number(-5, 5), { minLength: 4, maxLength: 4 }), (profits) =>
      kellyOutcomes(profits.map((profit) => ({ profit, probability: 0.25 }))),
    ),
  );
  it(
    'allowedQuantity',
    given(
      fc.record({
        greatestLoss: text(1, 500),
        contracts: whole,
        entry: text(0, 5000),
        open: text(0, 500),
        most: whole,
      }),
      ({ greatestLoss, contracts, entry, open, most }) =>
        allowedQuantity(
          { greatestLoss, contracts },
          {
            lossPerEntry: entry,
            riskPerUnderlying: { limit: entry, open },
            shareOfAccount: { share: '0.02', accountValue: entry },
            contracts: most,
          },
        ),
    ),
  );
});
