import { z } from 'zod';
import { decimalTextSchema, sessionDateSchema } from '@/shared/contract/fields';
import { statedOddsSchema } from '@/shared/entries/forecast-schema';

const number = z.number();
const moveSchema = z.strictObject({
  sessionDate: sessionDateSchema,
  sessions: number,
  startPrice: number,
  endPrice: number,
  logReturn: number,
  inSigmas: number,
  percentile: number,
});

/** Expected against realised for one entry (journal/outcome/entry-outcome). */
export const entryOutcomeSchema = z.strictObject({
  move: moveSchema.nullable(),
  moveSoFar: moveSchema.nullable(),
  realisedVolatility: z
    .strictObject({
      dailyVolatility: number,
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
