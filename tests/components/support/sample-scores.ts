import { type Scores } from '@/shared/scores/scores';
import { ids } from '@/tests/components/support/sample-journal';

const few = { count: 3, sampleRule: 'list-only', figures: null } as const;

const resolved = (count: number): Scores['resolved'] =>
  Array.from({ length: count }, (_, index) => ({
    entryId: ids.entry,
    symbol: 'ZZIX',
    structureName: 'long 1540 call',
    traderName: 'Ada Thorn',
    key: `odds-${index}`,
    statement: '1540 call in the money',
    dueSessionDate: '2026-12-23',
    probability: 0.42,
    marketImplied: null,
    happened: true,
    brierScore: 0.3364,
    isLateSeal: false,
  }));

const listed = (index: number): Scores['entries'][number] => ({
  entryId: `01940000-0000-7000-8000-${String(index).padStart(12, '0')}`,
  symbol: 'ZZIX',
  currency: 'USD',
  structureName: 'long 1540 call',
  traderName: 'Ada Thorn',
  exitSessionDate: '2026-12-23',
  isLateSeal: false,
  volatilityMethod: '20 sessions',
  moveDeviations: index === 0 ? -1.4 : 0.3,
  movePlace: 0.6,
  volatilityRatio: 1.1,
  profitPlaceLow: 0,
  profitPlaceHigh: 0.67,
  expectedMean: 12,
  realisedProfit: '22.5',
  isFollowed: index !== 0,
  exitTag: index === 0 ? 'unplanned' : 'target',
});

/** Three resolved odds of three entries: too few for any rate. */
export const fewScores: Scores = {
  whose: 'own',
  sentence: '3 odds are resolved: cannot tell yet.',
  choices: {
    traders: [{ id: ids.trader, displayName: 'Ada Thorn' }],
    underlyings: [{ id: ids.underlying, symbol: 'ZZIX' }],
    structureKinds: ['bull put', 'long call'],
    horizonClasses: ['1-5', '6-30'],
    tags: ['calm'],
  },
  entryCount: 3,
  pendingCount: 2,
  cannotTellCount: 0,
  odds: few,
  late: { ...few, count: 0 },
  market: { ...few, count: 0 },
  moves: few,
  profits: few,
  coverage: few,
  volatility: [{ method: '20 sessions', ...few }],
  money: [{ currency: 'USD', ...few }],
  process: { ...few, followedGood: 2, followedBad: 0, leftGood: 1, leftBad: 0 },
  cuts: {
    structure: [{ value: 'long call', label: 'long call', ...few }],
    underlying: [{ value: ids.underlying, label: 'ZZIX', ...few }],
    horizon: [{ value: '1-5', label: '1-5', ...few }],
    tag: [],
  },
  resolved: resolved(3),
  resolvedCount: 3,
  entries: [0, 1, 2].map(listed),
};

/** The same record with figures to every card. */
export function richScores(count: number): Scores {
  const sampleRule = count > 50 ? 'shown' : 'provisional';
  const parts = { score: 0.209, miscalibration: 0.012, discrimination: 0.053, uncertainty: 0.25 };
  const places = { counts: [8, 8, 7, 4, 5, 4, 5, 7], due: 6, low: 2, high: 10 };
  const paired = { own: 0.209, market: 0.225, difference: -0.016, allowance: 0.02 };
  const shown = { count, sampleRule } as const;
  return {
    ...fewScores,
    sentence: `Your 70% calls came in 61% of the time over ${count} cases: too sure by about 9 points.`,
    entryCount: count,
    odds: {
      ...shown,
      figures: {
        effectiveCount: count / 2,
        events: 12,
        expectedEvents: 14.5,
        z: -0.8,
        brier: parts,
        log: { ...parts, score: 0.61, uncertainty: 0.651 },
        clippedCount: 2,
        bins: [{ forecast: 0.42, observed: 0.4, count, low: 0.3, high: 0.6 }],
        curve: [{ forecast: 0.42, observed: 0.4 }],
        band: [
          { forecast: 0.2, low: 0.1, high: 0.3 },
          { forecast: 0.7, low: 0.6, high: 0.8 },
        ],
      },
    },
    market: { ...shown, figures: { brier: paired, log: { ...paired, difference: 0.03 } } },
    moves: { ...shown, figures: { ...places, test: { kind: 'kolmogorov-smirnov', pValue: 0.31 } } },
    profits: { ...shown, figures: { ...places, test: { kind: 'chi-square', pValue: 0.0004 } } },
    coverage: {
      ...shown,
      figures: {
        bands: [1, 2, 3].map((deviations) => ({
          deviations,
          stated: [0.683, 0.954, 0.997][deviations - 1] ?? 1,
          hits: [28, 42, 46][deviations - 1] ?? 0,
          count,
          observed: 0.6,
          low: 0.443,
          high: 0.712,
          pValue: 0.15,
          clusteringPValue: null,
        })),
      },
    },
    volatility: [
      { method: '20 sessions', ...shown, figures: { ratio: 1.18, low: 1.02, high: 1.31, effectiveCount: 20 } },
      { method: 'typed', ...few },
    ],
    money: [
      {
        currency: 'USD',
        ...shown,
        figures: {
          expected: 670.38,
          realised: '1977.60',
          points: [
            { sessionDate: '2026-09-14', entries: 1, expected: 14, realised: 30, deviation: 300 },
            { sessionDate: '2026-12-09', entries: count, expected: 670.38, realised: 1977.6, deviation: 2078 },
          ],
          mean: 41.2,
          standardDeviation: 310,
          standardError: 44.74,
          low: -48.8,
          high: 131.2,
          effectiveCount: count,
          casesNeeded: 445,
          sources: {
            count,
            expected: 670.38,
            move: '2200',
            time: '-150',
            volatility: '-60',
            carry: '0',
            markResidual: '57.6',
            slippage: '-40',
            fees: '-30',
            realised: '1977.60',
          },
        },
      },
    ],
    process: {
      ...shown,
      followedGood: 16,
      followedBad: 9,
      leftGood: 3,
      leftBad: 6,
      figures: { share: 0.735, low: 0.57, high: 0.85 },
    },
    cuts: {
      ...fewScores.cuts,
      structure: [
        {
          value: 'bull put',
          label: 'bull put',
          ...shown,
          figures: {
            effectiveCount: 17,
            stated: 0.58,
            observed: 0.52,
            low: 0.42,
            high: 0.63,
            brierScore: 0.205,
            standsOut: false,
          },
        },
        { value: 'long call', label: 'long call', ...few },
      ],
    },
  };
}
