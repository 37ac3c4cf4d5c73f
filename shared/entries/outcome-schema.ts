import { z } from 'zod';
import { CANNOT_TELL } from '@/journal/outcome/entry-outcome';
import { decimalTextSchema, sessionDateSchema } from '@/shared/contract/fields';
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
  isComplete: z.boolean(),
});
