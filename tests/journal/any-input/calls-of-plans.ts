import { buildStructure } from '@/journal/contracts/build-structure';
import { recogniseStructure } from '@/journal/contracts/recognise-structure';
import { structureTable } from '@/journal/contracts/structure-table';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { averagedEffects } from '@/journal/attribution/averaged-effects';
import { realisedMove } from '@/journal/outcome/realised-move';
import { realisedVolatility } from '@/journal/outcome/realised-volatility';
import { impliedQuote } from '@/journal/pricing/implied-quote';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { kellyOutcomes } from '@/journal/sizing/kelly-outcomes';
import { kellySize } from '@/journal/sizing/kelly-size';
import { type Draw } from '@/tests/journal/any-input/draw';
import { given, type Prepared } from '@/tests/journal/any-input/prepared-call';

const counter = () => {
  let last = 0;
  return () => String((last += 1));
};
const places = ({ number, oneOf, list, decimal }: Draw) =>
  oneOf([
    { kind: 'strikes' as const, strikePrices: list(4, () => decimal(50, 150)) },
    { kind: 'widths' as const, lowestStrikePrice: decimal(50, 150), widths: list(3, () => decimal(0, 20)) },
    {
      kind: 'sigmas' as const,
      spotPrice: number(50, 150),
      totalDeviation: number(0, 0.3),
      distances: list(4, () => number(-3, 3)),
      strikeStep: decimal(0, 5),
    },
  ]);
const plan = (draw: Draw): Parameters<typeof makeForecast>[0] => {
  const { number, whole, oneOf, list, decimal } = draw;
  return {
    underlying: {
      symbol: 'HVYQ',
      style: oneOf(['european', 'american'] as const),
      settlement: oneOf(['cash', 'physical'] as const),
      settlementTime: oneOf(['pm', 'am'] as const),
      multiplier: oneOf(['100', '10', decimal(1, 1000)]),
      dividendYield: number(0, 0.05),
    },
    spot: { price: decimal(90, 110), at: oneOf(['2026-12-09T21:00:00.000Z', draw.instant()]), source: 'bar' },
    legs: list(4, () => ({
      id: String(whole(0, 9)),
      side: oneOf(['buy', 'sell'] as const),
      type: oneOf(['call', 'put'] as const),
      strikePrice: decimal(80, 120),
      expirySessionDate: oneOf(['2026-12-18', '2026-12-18', draw.sessionDate()]),
      quantity: whole(1, 10),
      premium: decimal(0, 10),
    })),
    holding: oneOf([{ kind: 'toExpiry' as const }, { kind: 'sessions' as const, sessions: number(0.1, 7) }]),
    volatility: {
      source: 'typed',
      window: null,
      lambda: null,
      low: number(0.005, 0.01),
      base: number(0.01, 0.015),
      high: number(0.015, 0.03),
      lastSessionDate: null,
    },
    drift: oneOf([
      { kind: 'zeroReturn' as const },
      { kind: 'riskNeutral' as const },
      { kind: 'ownView' as const, expectedLogReturnPerSession: number(-0.01, 0.01) },
    ]),
    ratePerYear: number(-0.01, 0.06),
    overnightShare: number(0, 1),
    feePerContract: decimal(0, 2),
    targetPrice: oneOf([null, decimal(80, 120)]),
    stopPrice: oneOf([null, decimal(80, 120)]),
  };
};

export const callsOfPlans: Readonly<Record<string, Prepared>> = {
  buildStructure: given(
    (draw) => ({
      name: draw.oneOf(structureTable).name,
      request: {
        places: places(draw),
        expirySessionDates: draw.list(2, draw.sessionDate),
        quantity: draw.whole(1, 10),
        nextId: counter(),
      },
    }),
    ({ name, request }) => recogniseStructure(buildStructure(name, request)),
  ),
  makeForecast: given(plan, (input) => makeForecast(input, usOptionsCalendar), 20),
  impliedQuote: given(
    ({ number, oneOf }) => ({
      type: oneOf(['call', 'put'] as const),
      spotPrice: number(1, 300),
      strikePrice: number(1, 300),
      sessions: number(0, 40),
      years: number(0, 0.2),
      ratePerYear: number(-0.02, 0.1),
      dividendYield: number(-0.02, 0.1),
      bidPrice: number(0, 10),
      askPrice: number(0, 12),
      tickSize: number(0.01, 0.1),
    }),
    (question) => impliedQuote(question),
  ),
  kellySize: given(
    ({ number }) => ({
      probability: { low: number(0, 0.5), base: number(0.3, 0.7), high: number(0.5, 1) },
      win: number(0, 500),
      loss: number(0, 500),
    }),
    (question) => kellySize(question),
  ),
  kellyOutcomes: given((draw) => {
    const outcomes = draw.list(5, () => ({ profit: draw.number(-100, 100), weight: draw.number(0.1, 1) }));
    const total = outcomes.reduce((sum, { weight }) => sum + weight, 0);
    return outcomes.map(({ profit, weight }) => ({ profit, probability: weight / total }));
  }, kellyOutcomes),
  averagedEffects: given(
    (draw) => ({ values: Array.from({ length: 8 }, () => draw.number(-10, 10)), factors: draw.whole(1, 3) }),
    ({ values, factors }) =>
      averagedEffects((isNew) => values[isNew.reduce((sum, one, bit) => sum + (one ? 2 ** bit : 0), 0)] ?? 0, factors),
  ),
  realisedMove: given(
    ({ number, oneOf }) => ({
      startPrice: number(1, 300),
      endPrice: number(1, 300),
      dailyVolatility: number(0, 0.1),
      sessions: number(0, 40),
      logDrift: number(-0.1, 0.1),
      degreesOfFreedom: oneOf([null, number(1, 252)]),
    }),
    realisedMove,
  ),
  realisedVolatility: given(
    (draw) => draw.list(20, () => ({ logReturn: draw.number(-0.1, 0.1), sessions: draw.number(0, 1) })),
    realisedVolatility,
  ),
};
