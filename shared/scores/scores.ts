import { z } from 'zod';
import { horizonClasses } from '@/journal/scoring/horizon-class';
import { currencySchema, decimalTextSchema, idSchema, sessionDateSchema } from '@/shared/contract/fields';

const number = z.number();
const count = z.int();

/** What may be shown from so many cases: under 20 a list only, and so no figures unless they were asked for by name. */
function sampled<Figures extends z.ZodType>(figures: Figures) {
  return z.strictObject({
    count,
    sampleRule: z.enum(['list-only', 'provisional', 'shown']),
    figures: figures.nullable(),
  });
}

/** score = miscalibration − discrimination + uncertainty. */
const partsSchema = z.strictObject({
  score: number,
  miscalibration: number,
  discrimination: number,
  uncertainty: number,
});

const oddsFiguresSchema = z.strictObject({
  /** What the odds count for, since those of overlapping entries move together. */
  effectiveCount: number,
  /** Events that happened, and how many the odds added up to; z of the difference, null when every answer was certain. */
  events: count,
  expectedEvents: number,
  z: number.nullable(),
  brier: partsSchema,
  log: partsSchema,
  /** Odds of less than one in 10,000 that were scored as that. */
  clippedCount: count,
  /** Tenths that hold a forecast; low and high: 90 % of frequencies were the odds right. */
  bins: z.array(z.strictObject({ forecast: number, observed: number, count, low: number, high: number })),
  curve: z.array(z.strictObject({ forecast: number, observed: number })),
  /** Where the curve would lie 9 times in 10 were the odds right. */
  band: z.array(z.strictObject({ forecast: number, low: number, high: number })),
});

/** Two methods on the same calls: own − market, below 0 where one's own are better. */
const pairedSchema = z.strictObject({
  own: number,
  market: number,
  difference: number,
  /** 95 % by chance alone, allowing for calls that move together; null from a single cluster. */
  allowance: number.nullable(),
});

const placesSchema = z.strictObject({
  /** Outcomes in each eighth of their forecast; parts of one where it fell on a lump. */
  counts: z.array(number),
  due: number,
  /** Where 90 % of such counts fall by chance. */
  low: number,
  high: number,
  test: z.strictObject({ kind: z.enum(['kolmogorov-smirnov', 'chi-square']), pValue: number }),
});

const bandSchema = z.strictObject({
  deviations: number,
  stated: number,
  hits: count,
  count,
  observed: number,
  low: number,
  high: number,
  pValue: number,
  /** That misses come one after the other; null when it cannot be told. */
  clusteringPValue: number.nullable(),
});

/** Realised over planned daily volatility (root mean square), 95 % interval. */
const ratioSchema = z.strictObject({
  ratio: number,
  low: number.nullable(),
  high: number.nullable(),
  effectiveCount: number,
});

const moneyFiguresSchema = z.strictObject({
  expected: number,
  realised: decimalTextSchema,
  /** Summed in the order of time; deviation of the sum were entries independent. */
  points: z.array(
    z.strictObject({
      sessionDate: sessionDateSchema,
      entries: count,
      expected: number,
      realised: number,
      deviation: number,
    }),
  ),
  mean: number,
  standardDeviation: number,
  /** Null where all entries are one cluster. */
  standardError: number.nullable(),
  low: number.nullable(),
  high: number.nullable(),
  effectiveCount: number,
  /** Entries to tell such a mean from 0; null where there is nothing to tell. */
  casesNeeded: count.nullable(),
  sources: z
    .strictObject({
      count,
      expected: number,
      move: decimalTextSchema,
      time: decimalTextSchema,
      volatility: decimalTextSchema,
      carry: decimalTextSchema,
      markResidual: decimalTextSchema,
      slippage: decimalTextSchema,
      fees: decimalTextSchema,
      realised: decimalTextSchema,
    })
    .nullable(),
});

const cutSchema = sampled(
  z.strictObject({
    effectiveCount: number,
    stated: number,
    observed: number,
    low: number,
    high: number,
    brierScore: number,
    /** Farther off than chance allows, seen among all cuts together. */
    standsOut: z.boolean(),
  }),
).extend({ value: z.string(), label: z.string() });

const listedEntrySchema = z.strictObject({
  entryId: idSchema,
  symbol: z.string(),
  currency: currencySchema,
  structureName: z.string(),
  traderName: z.string(),
  exitSessionDate: sessionDateSchema,
  isLateSeal: z.boolean(),
  volatilityMethod: z.string(),
  moveDeviations: number.nullable(),
  movePlace: number.nullable(),
  volatilityRatio: number.nullable(),
  profitPlaceLow: number.nullable(),
  profitPlaceHigh: number.nullable(),
  expectedMean: number,
  realisedProfit: decimalTextSchema.nullable(),
  isFollowed: z.boolean().nullable(),
  exitTag: z.string().nullable(),
});

const resolvedOddsSchema = z.strictObject({
  entryId: idSchema,
  symbol: z.string(),
  structureName: z.string(),
  traderName: z.string(),
  key: z.string(),
  /** "97 put in the money". */
  statement: z.string(),
  dueSessionDate: sessionDateSchema,
  probability: number,
  marketImplied: number.nullable(),
  happened: z.boolean(),
  brierScore: number,
  isLateSeal: z.boolean(),
});

export const cutKinds = ['structure', 'underlying', 'horizon', 'tag'] as const;
export type CutKind = (typeof cutKinds)[number];

export const scoresSchema = z.strictObject({
  whose: z.enum(['own', 'mentored']),
  /** What the record says, before any figure. */
  sentence: z.string(),
  /** What there is to choose from, whatever is chosen. */
  choices: z.strictObject({
    traders: z.array(z.strictObject({ id: idSchema, displayName: z.string() })),
    underlyings: z.array(z.strictObject({ id: idSchema, symbol: z.string() })),
    structureKinds: z.array(z.string()),
    horizonClasses: z.array(z.enum(horizonClasses)),
    tags: z.array(z.string()),
  }),
  entryCount: count,
  pendingCount: count,
  cannotTellCount: count,
  odds: sampled(oddsFiguresSchema),
  /** Sealed after the first fill: scored apart. */
  late: sampled(z.strictObject({ stated: number, observed: number, brierScore: number })),
  market: sampled(z.strictObject({ brier: pairedSchema, log: pairedSchema })),
  moves: sampled(placesSchema),
  profits: sampled(placesSchema),
  coverage: sampled(z.strictObject({ bands: z.array(bandSchema) })),
  volatility: z.array(sampled(ratioSchema).extend({ method: z.string() })),
  money: z.array(sampled(moneyFiguresSchema).extend({ currency: currencySchema })),
  process: sampled(z.strictObject({ share: number, low: number, high: number })).extend({
    followedGood: count,
    followedBad: count,
    leftGood: count,
    leftBad: count,
  }),
  cuts: z.record(z.enum(cutKinds), z.array(cutSchema)),
  /** Stated odds that are resolved, newest first, at most 500. */
  resolved: z.array(resolvedOddsSchema),
  resolvedCount: count,
  /** The entries behind the figures, newest first, at most 500. */
  entries: z.array(listedEntrySchema),
});
export type Scores = z.infer<typeof scoresSchema>;
export type ListedEntry = Scores['entries'][number];
