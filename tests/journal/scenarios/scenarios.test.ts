import { positionGreeks } from '@/journal/scenarios/position-greeks';
import { type RepricedLeg } from '@/journal/scenarios/reprice';
import { runScenarios } from '@/journal/scenarios/run-scenarios';
import { type Scenario, unchanged } from '@/journal/scenarios/scenario';
import { type ScenarioAxis, scenarioGrid } from '@/journal/scenarios/scenario-grid';
import { priceAfter, profitInState, type ScenarioPosition } from '@/journal/scenarios/scenario-position';
import { eventScenarios, standardScenarios } from '@/journal/scenarios/standard-scenarios';
import { europeanOptionPrice } from '@/journal/pricing/european-option';

const condor: ScenarioPosition = {
  legs: (
    [
      ['put', 92, 100],
      ['put', 96, -100],
      ['call', 104, -100],
      ['call', 108, 100],
    ] as const
  ).map(([type, strikePrice, signedShares], index) => ({
    type,
    strikePrice,
    signedShares,
    dailyVolatility: 0.015 + 0.0005 * index,
  })),
  shares: 0,
  costToOpen: -120,
  spotPrice: 100,
  holdDeviation: 0.015 * Math.sqrt(10),
  sessionsToExpiry: 10,
  yearsToExpiry: 14 / 365,
  ratePerYear: 0.04,
  dividendYield: 0.01,
  eventDeviation: null,
};

/** Independent: every leg priced on its own. */
function direct(position: ScenarioPosition, price: number, elapsed: number, shifts: readonly number[]): number {
  const left = 1 - elapsed / position.sessionsToExpiry;
  return position.legs.reduce(
    (sum, { type, strikePrice, signedShares, dailyVolatility }, index) =>
      sum +
      signedShares *
        europeanOptionPrice({
          type,
          strikePrice,
          spotPrice: price,
          dailyVolatility: dailyVolatility + (shifts[index] ?? 0),
          sessions: position.sessionsToExpiry * left,
          years: position.yearsToExpiry * left,
          ratePerYear: 0.04,
          dividendYield: 0.01,
        }),
    -position.costToOpen,
  );
}

describe('the scenario grid', () => {
  const moves = [-2, -1, 0, 1, 2].map((sigmas) => ({ kind: 'sigmas' as const, sigmas }));
  const percents = [-5, 0, 5].map((percent) => ({ kind: 'percent' as const, percent }));
  const shifts = [-0.004, 0, 0.01].map((dailyShift) => ({ kind: 'parallel' as const, dailyShift }));
  const byLeg = [{ kind: 'byLeg' as const, dailyShifts: [0.001, 0.002, 0.003, 0.004] }];
  const elapsed = [0, 3, 10];
  const axes: Record<string, ScenarioAxis> = {
    sigmas: { kind: 'move', moves },
    percents: { kind: 'move', moves: percents },
    sessions: { kind: 'sessions', sessionsElapsed: elapsed },
    shifts: { kind: 'volatility', shifts },
    byLeg: { kind: 'volatility', shifts: byLeg },
  };
  const fixed: Scenario = { ...unchanged, sessionsElapsed: 2, move: { kind: 'percent', percent: 1 } };

  /** What a cell is worth by pricing every leg on its own. */
  function cell(axisNames: readonly string[], indexes: readonly number[]): number {
    let [price, sessions] = [101, 2];
    let shift = [0, 0, 0, 0];
    for (const [place, name] of axisNames.entries()) {
      const index = indexes[place] ?? 0;
      if (name === 'sigmas') price = 100 * Math.exp((index - 2) * 0.015 * Math.sqrt(10));
      if (name === 'percents') price = 100 + (index - 1) * 5;
      if (name === 'sessions') sessions = elapsed[index] ?? 0;
      if (name === 'shifts') shift = shift.map(() => shifts[index]?.dailyShift ?? 0);
      if (name === 'byLeg') shift = [0.001, 0.002, 0.003, 0.004];
    }
    return direct(condor, price, sessions, shift);
  }

  it.each([
    ['sigmas', 'sessions'],
    ['percents', 'shifts'],
    ['percents', 'byLeg'],
    ['sessions', 'sigmas'],
    ['sessions', 'shifts'],
    ['shifts', 'percents'],
    ['byLeg', 'sessions'],
  ])('has rows of %s and columns of %s, each cell as its legs priced alone', (rowName, columnName) => {
    const [rows, columns] = [axes[rowName], axes[columnName]];
    if (rows === undefined || columns === undefined) throw new Error('no such axis');
    const grid = scenarioGrid(condor, { rows, columns, fixed });
    for (const [row, values] of grid.entries()) {
      for (const [column, profit] of values.entries()) {
        expect(profit).toBeCloseTo(cell([rowName, columnName], [row, column]), 8);
      }
    }
  });

  it('refuses two axes of one kind', () => {
    const rows: ScenarioAxis = { kind: 'move', moves };
    const columns: ScenarioAxis = { kind: 'move', moves: percents };
    expect(() => scenarioGrid(condor, { rows, columns, fixed })).toThrow('scenario-axes-equal');
  });
});

describe('scenarios', () => {
  it('reprice an event straddle: fair 4.17 before, 3.24 at 83.20 once the event is past', () => {
    // QYBD 80, event 6 %, base 1.5 % a session, 3 sessions: 6.538 % in all.
    const dailyVolatility = Math.sqrt((3 * 0.015 ** 2 + 0.06 ** 2) / 3);
    expect(dailyVolatility * Math.sqrt(3)).toBeCloseTo(0.06538, 5);
    const leg = (type: 'call' | 'put'): RepricedLeg => ({ type, strikePrice: 80, signedShares: 100, dailyVolatility });
    const straddle: ScenarioPosition = {
      legs: [leg('call'), leg('put')],
      shares: 0,
      costToOpen: 0,
      spotPrice: 80,
      holdDeviation: 0.06538,
      sessionsToExpiry: 3,
      yearsToExpiry: 5 / 365,
      ratePerYear: 0,
      dividendYield: 0,
      eventDeviation: 0.06,
    };
    const after = { ...unchanged, sessionsElapsed: 1, isEventPast: true };
    const results = runScenarios(straddle, [
      { ...unchanged, name: 'now' },
      { ...after, name: 'next session', move: { kind: 'percent', percent: 4 } },
      { ...unchanged, name: 'a session later, event to come', sessionsElapsed: 1 },
    ]);
    expect(results.map(({ price }) => price)).toEqual([80, 83.2, 80]);
    expect((results[0]?.profit ?? 0) / 100).toBeCloseTo(4.17, 2);
    expect((results[1]?.profit ?? 0) / 100).toBeCloseTo(3.24, 2);
    // 2 sessions and the event: √(2 × 1.5² + 6²) = 6.364 %, straddle 2·80·(2Φ(σ/2) − 1).
    expect((results[2]?.profit ?? 0) / 100).toBeCloseTo(80 * 2 * 0.02538, 2);
  });

  it('name what they are, and lose nothing when nothing moves and no time passes', () => {
    const named = [...standardScenarios(0), ...eventScenarios({ deviation: 0.06, sessionsElapsed: 1 })];
    expect(new Set(named.map(({ name }) => name)).size).toBe(named.length);
    const [still] = runScenarios(condor, named);
    expect(still?.profit).toBeCloseTo(direct(condor, 100, 0, [0, 0, 0, 0]), 9);
  });

  it('move by what was priced in for the event', () => {
    const [, up, down] = eventScenarios({ deviation: 0.06, sessionsElapsed: 1 });
    expect(Math.log(priceAfter(condor, up?.move ?? unchanged.move) / 100)).toBeCloseTo(0.06, 12);
    expect(Math.log(priceAfter(condor, down?.move ?? unchanged.move) / 100)).toBeCloseTo(-0.06, 12);
  });

  it('value shares beside the options', () => {
    const covered = { ...condor, shares: 100, costToOpen: 10_000 };
    const profitAt = profitInState(covered, unchanged);
    expect(profitAt(105) - profitInState(condor, unchanged)(105)).toBeCloseTo(100 * 105 - 10_120, 8);
  });

  it.each<[string, ScenarioPosition, Partial<Scenario>, string]>([
    ['sessions beyond expiry', condor, { sessionsElapsed: 11 }, 'scenario-sessions-invalid'],
    ['sessions that are no number', condor, { sessionsElapsed: NaN }, 'scenario-sessions-invalid'],
    ['a fall of everything', condor, { move: { kind: 'percent', percent: -100 } }, 'scenario-move-invalid'],
    ['volatility below 0', condor, { volatility: { kind: 'parallel', dailyShift: -0.02 } }, 'volatility-shift-invalid'],
    [
      'too few shifts by leg',
      condor,
      { volatility: { kind: 'byLeg', dailyShifts: [0.001] } },
      'volatility-shift-invalid',
    ],
    ['a cost that is no number', { ...condor, costToOpen: NaN }, {}, 'scenario-value-not-finite'],
    ['an event larger than the legs know', { ...condor, eventDeviation: 0.2 }, {}, 'event-variance-too-large'],
  ])('refuse %s', (_, position, given, code) => {
    expect(() => runScenarios(position, [{ ...unchanged, ...given, name: 'bad' }])).toThrow(code);
  });
});

describe('the Greeks of a position', () => {
  const moment = { sessions: 10, years: 14 / 365, ratePerYear: 0.04, dividendYield: 0 };
  const call: RepricedLeg = { type: 'call', strikePrice: 102, signedShares: 100, dailyVolatility: 0.015 };

  it('are those of test A times 100: gamma 0.0788 per 1%, theta −0.0943, vega 0.1182 and 0.0744, rho 0.0133', () => {
    const greeks = positionGreeks({ legs: [call], spotPrice: 100, moment, yearsPerNextSession: 1 / 365 });
    expect(greeks.shareEquivalent / 100).toBeCloseTo(0.35889, 5);
    expect(greeks.gammaPerPercent / 100).toBeCloseTo(0.0788, 4);
    expect(greeks.thetaNextSession / 100).toBeCloseTo(-0.0943, 4);
    expect(greeks.vegaPerTenthDailyPoint / 100).toBeCloseTo(0.1182, 4);
    expect(greeks.vegaPerAnnualPoint / 100).toBeCloseTo(0.0744, 4);
    expect(greeks.rhoPerPercent / 100).toBeCloseTo(0.0133, 4);
  });

  it('have gamma per 1% at the money of 0.084, 0.266 and 0.841 with 10, 1 and 0.1 sessions left', () => {
    const gamma = (sessions: number) =>
      positionGreeks({
        legs: [{ ...call, strikePrice: 100, signedShares: 1 }],
        spotPrice: 100,
        moment: { sessions, years: 0, ratePerYear: 0, dividendYield: 0 },
      }).gammaPerPercent;
    expect(gamma(10)).toBeCloseTo(0.084, 3);
    expect(gamma(1)).toBeCloseTo(0.266, 3);
    expect(gamma(0.1)).toBeCloseTo(0.841, 3);
  });

  it('sum over legs and take shares as themselves', () => {
    const covered = positionGreeks({
      legs: [{ ...call, signedShares: -100 }],
      shares: 100,
      spotPrice: 100,
      moment,
    });
    expect(covered.shareEquivalent).toBeCloseTo(100 - 35.889, 3);
    expect(covered.gammaPerPercent).toBeLessThan(0);
  });

  it('price a later leg on its own life', () => {
    const later = positionGreeks({
      legs: [{ ...call, sessionsBeyond: 5, yearsBeyond: 7 / 365 }],
      spotPrice: 100,
      moment: { ...moment, sessions: 5, years: 7 / 365 },
      yearsPerNextSession: 1 / 365,
    });
    const whole = positionGreeks({ legs: [call], spotPrice: 100, moment, yearsPerNextSession: 1 / 365 });
    for (const key of ['shareEquivalent', 'thetaNextSession', 'vegaPerAnnualPoint'] as const) {
      expect(later[key]).toBeCloseTo(whole[key], 9);
    }
  });
});
