import { z } from 'zod';
import { CANNOT_TELL } from '@/journal/outcome/entry-outcome';
import { decimalTextSchema, idSchema, sessionDateSchema } from '@/shared/contract/fields';
import { statedOddsSchema } from '@/shared/entries/forecast-schema';

const number = z.number();
// Outcomes stored before a field was added are read with its default, until they are computed again.
const moveSchema = z.strictObject({
  sessionDate: sessionDateSchema,
  pricedBy: z.enum(['close', 'open', 'settlement', 'close-after-exit']).default('close'),
  sessions: number,
  startPrice: number,
  endPrice: number,
  logReturn: number,
  inSigmas: number,
  percentile: number,
  studentPercentile: number.nullable().default(null),
});

/** Expected against realised for one entry (journal/outcome/entry-outcome). */
export const entryOutcomeSchema = z.strictObject({
  move: moveSchema.nullable(),
  moveWaitsFor: z.string().nullable().default(null),
  moveSoFar: moveSchema.nullable(),
  realisedVolatility: z
    .strictObject({
      dailyVolatility: number,
      low: number.nullable().default(null),
      high: number.nullable().default(null),
      sessions: number,
      ratio: number,
      ratioLow: number.nullable(),
      ratioHigh: number.nullable(),
    })
    .nullable(),
  odds: z.array(
    z.strictObject({
      odds: statedOddsSchema,
      happened: z.boolean().nullable(),
      brierScore: number.nullable(),
      marketBrierScore: number.nullable(),
      logScore: number.nullable(),
      waitsFor: z.string().nullable(),
      cannotTell: z.literal(CANNOT_TELL).nullable().default(null),
      monitoredBy: z.enum(['range', 'closes']).nullable(),
    }),
  ),
  profit: z
    .strictObject({
      realised: decimalTextSchema,
      fees: decimalTextSchema,
      isFinal: z.boolean(),
      percentileLow: number.nullable(),
      percentileHigh: number.nullable(),
      horizon: z.enum(['expiry', 'exit']),
      expectedMean: number,
    })
    .nullable(),
  sources: z
    .strictObject({
      move: decimalTextSchema,
      time: decimalTextSchema,
      volatility: decimalTextSchema,
      carry: decimalTextSchema,
      markResidual: decimalTextSchema,
      slippage: decimalTextSchema,
      fees: decimalTextSchema,
      realisedProfit: decimalTextSchema,
      underlyingFrom: z.enum(['noted', 'close']),
      isSlippageKnown: z.boolean(),
    })
    .nullable()
    .default(null),
  process: z
    .strictObject({
      isSealedBeforeFill: z.boolean(),
      size: z.strictObject({
        isWithin: z.boolean(),
        legs: z.array(
          z.strictObject({
            legId: idSchema.nullable(),
            planned: decimalTextSchema,
            greatest: decimalTextSchema,
            isWithin: z.boolean(),
          }),
        ),
      }),
      limit: z
        .strictObject({
          netPremium: decimalTextSchema,
          limit: decimalTextSchema,
          beyond: decimalTextSchema,
          isWithin: z.boolean(),
        })
        .nullable(),
      exitTag: z.enum(['target', 'stop', 'time', 'event', 'expiry', 'unplanned']).nullable(),
      isFollowed: z.boolean().nullable(),
    })
    .nullable()
    .default(null),
  isComplete: z.boolean(),
});
