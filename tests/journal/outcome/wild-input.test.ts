import * as fc from 'fast-check';
import { attributeByGreeks } from '@/journal/attribution/attribute-by-greeks';
import { attributeProfit } from '@/journal/attribution/attribute-profit';
import { type AttributedLeg, type LegEnd } from '@/journal/attribution/attributed-leg';
import { applyCorrections } from '@/journal/fills/apply-corrections';
import { type ExecutionRow } from '@/journal/fills/execution-row';
import { type Fill } from '@/journal/fills/fill';
import { fillIdentities } from '@/journal/fills/fill-identity';
import { type InstrumentChange } from '@/journal/fills/instrument-change';
import { matchLots } from '@/journal/fills/lots';
import { openPositions } from '@/journal/fills/position';
import { sharesFromExercise } from '@/journal/fills/underlying-shares';
import { DomainError } from '@/journal/errors/domain-error';
import { realisedMove } from '@/journal/outcome/realised-move';
import { realisedVolatility, volatilityRatioRange } from '@/journal/outcome/realised-volatility';
import { exitCost } from '@/journal/process/exit-cost';
import { runs } from '@/tests/journal/deep-runs';

const options = { seed: 20261201, numRuns: runs(1_000, 50_000) };
const wild = fc.oneof(
  fc.constantFrom(0, -0, NaN, Infinity, -Infinity, 5e-324, 2.3e-308, 1.7e308, 1e-200, 1e200, 1, -1, 0.01, 100),
  fc.double(),
  fc.double({ min: 0, max: 200, noNaN: true }),
);
const wildText = fc.oneof(
  fc.constantFrom('0', '-0', '', ' ', '1e3', 'NaN', 'Infinity', '1,2', '+1', '-1', '1', '100', '0.01', '.5', '٣'),
  fc.constantFrom('9'.repeat(40), `0.${'0'.repeat(38)}1`, '9'.repeat(41), `1.${'3'.repeat(39)}`),
  fc.integer({ min: -5, max: 500 }).map(String),
);
const wildTime = fc.constantFrom(
  '2026-12-09T15:00:00.000Z',
  '2026-12-09T16:00:00.000Z',
  '',
  'noon',
  '+275760-09-14T00:00:00Z',
);

/** Every number and text of an answer, however deep. */
function leavesOf(value: unknown): unknown[] {
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(leavesOf) : [value];
}

function answersOrRefuses(ask: () => unknown): void {
  let answer: unknown;
  try {
    answer = ask();
  } catch (error) {
    expect(error).toBeInstanceOf(DomainError);
    return;
  }
  for (const leaf of leavesOf(answer)) {
    expect(leaf).not.toBeNaN();
    expect(['NaN', 'Infinity', '-Infinity', '-0']).not.toContain(leaf);
  }
}

const instrument = fc.oneof(
  fc.record({
    kind: fc.constant('option' as const),
    underlyingSymbol: fc.constantFrom('ZQXA', 'HVYQ'),
    expirySessionDate: fc.constant('2026-12-18'),
    type: fc.constantFrom('call' as const, 'put' as const),
    strikePrice: wildText,
    multiplier: fc.oneof(fc.constantFrom('100', '1'), wildText),
  }),
  fc.constant({ kind: 'stock' as const, symbol: 'ZQXA', multiplier: '1' as const }),
);
const fill: fc.Arbitrary<Fill> = fc.record({
  id: fc.string({ minLength: 1, maxLength: 2 }),
  kind: fc.constantFrom('buy' as const, 'sell' as const, 'expiry' as const, 'assignment' as const, 'exercise' as const),
  instrument,
  quantity: wildText,
  price: wildText,
  fees: wildText,
  tradedAt: wildTime,
  sequence: wild,
});
const change: fc.Arbitrary<InstrumentChange> = fc.record({
  id: fc.string({ minLength: 1, maxLength: 2 }),
  changedAt: wildTime,
  sequence: wild,
  from: instrument,
  to: instrument,
  oldQuantity: wildText,
  newQuantity: wildText,
});

describe('whatever comes in, an answer is a number or the refusal is a documented one:', () => {
  it('moves', () => {
    const question = fc.record({
      startPrice: wild,
      endPrice: wild,
      dailyVolatility: wild,
      sessions: wild,
      logDrift: wild,
      degreesOfFreedom: fc.option(wild),
    });
    fc.assert(
      fc.property(question, (asked) => answersOrRefuses(() => realisedMove(asked))),
      options,
    );
  });

  it('realised volatilities and the range of their ratio', () => {
    const returns = fc.array(fc.record({ logReturn: wild, sessions: wild }), { maxLength: 4 });
    fc.assert(
      fc.property(returns, wild, (some, confidence) => {
        answersOrRefuses(() => realisedVolatility(some));
        answersOrRefuses(() => realisedVolatility(some, confidence));
      }),
      options,
    );
    fc.assert(
      fc.property(wild, wild, wild, (returnsRealised, degreesOfFreedom, confidence) => {
        answersOrRefuses(() => volatilityRatioRange({ returnsRealised, degreesOfFreedom, confidence }));
      }),
      options,
    );
  });

  it('lots, positions and deliveries', () => {
    const method = fc.constantFrom('fifo' as const, 'lifo' as const, 'average' as const);
    fc.assert(
      fc.property(
        fc.array(fill, { maxLength: 3 }),
        fc.array(change, { maxLength: 1 }),
        method,
        (fills, changes, by) => {
          answersOrRefuses(() => matchLots(fills, { method: by, changes }));
          answersOrRefuses(() => openPositions(fills, changes));
          for (const one of fills) answersOrRefuses(() => sharesFromExercise(one, { id: 'shares' }));
        },
      ),
      options,
    );
  });

  it('corrections and identities', () => {
    const id = fc.string({ minLength: 1, maxLength: 1 });
    const row: fc.Arbitrary<ExecutionRow> = fc.oneof(
      fc.record({ kind: fc.constant('trade' as const), fill }),
      fc.record({ kind: fc.constant('correction' as const), fill, corrects: id }),
      fc.record({ kind: fc.constant('bust' as const), id, reportedAt: wildTime, sequence: wild, busts: id }),
    );
    fc.assert(
      fc.property(fc.array(row, { maxLength: 4 }), (rows) => {
        answersOrRefuses(() => applyCorrections(rows).rows.map(({ state }) => state));
        const fills = rows.flatMap((one) => (one.kind === 'bust' ? [] : [one.fill]));
        answersOrRefuses(() => fillIdentities(fills.map((one) => ({ account: one.id, executionId: null, fill: one }))));
      }),
      options,
    );
  });

  it('attributions and the cost of an exit', () => {
    const end: fc.Arbitrary<LegEnd> = fc.record({
      state: fc.record({ spotPrice: wild, sessions: wild, years: wild, ratePerYear: wild, dividendYield: wild }),
      fillPrice: wildText,
      midPrice: fc.option(wildText),
      fees: wildText,
      dailyVolatility: fc.option(wild),
    });
    const leg: fc.Arbitrary<AttributedLeg> = fc.record({
      legId: fc.constant('leg'),
      instrument: fc.oneof(
        fc.record({
          kind: fc.constant('option' as const),
          type: fc.constantFrom('call' as const, 'put' as const),
          strikePrice: wild,
        }),
        fc.constant({ kind: 'stock' as const }),
      ),
      signedQuantity: wildText,
      multiplier: wildText,
      entry: end,
      exit: end,
    });
    fc.assert(
      fc.property(leg, wild, wildText, (one, fallbackDailyVolatility, text) => {
        answersOrRefuses(() => attributeProfit([one], { fallbackDailyVolatility }));
        answersOrRefuses(() => attributeByGreeks([one], { fallbackDailyVolatility }));
        const price = one.entry.fillPrice;
        answersOrRefuses(() => exitCost({ rulePrice: text, exitPrice: price, entryPrice: text, signedShares: price }));
      }),
      options,
    );
  });
});
