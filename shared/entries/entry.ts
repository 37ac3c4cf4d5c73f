import { z } from 'zod';
import {
  decimalTextSchema,
  idSchema,
  instantSchema,
  nonNegativeDecimalSchema,
  positiveDecimalSchema,
  sessionDateSchema,
} from '@/shared/contract/fields';
import { draftPlanSchema } from '@/shared/entries/draft-plan';
import { forecastInputSchema, forecastSchema } from '@/shared/entries/forecast-schema';
import { outcomeStepSchema } from '@/shared/entries/outcome-history';
import { entryOutcomeSchema } from '@/shared/entries/outcome-schema';

export const entryStates = ['draft', 'sealed', 'open', 'closed', 'reviewed', 'abandoned'] as const;
export const entryStateSchema = z.enum(entryStates);
export type EntryState = z.infer<typeof entryStateSchema>;

/** Marks of the landing strip, in total deviations of the hold. */
export const stripSchema = z.strictObject({
  strikes: z.array(z.number()),
  breakEvens: z.array(z.number()),
  target: z.number().nullable(),
  stop: z.number().nullable(),
  /** Where it landed, or null; and where it is while it is running, or null. */
  landed: z.number().nullable(),
  now: z.number().nullable(),
});
export type Strip = z.infer<typeof stripSchema>;

export const entryRowSchema = z.strictObject({
  id: idSchema,
  version: z.int().min(1),
  state: entryStateSchema,
  /** Whose entry it is. */
  trader: z.strictObject({ id: idSchema, displayName: z.string() }),
  underlying: z.strictObject({ id: idSchema, symbol: z.string(), currency: z.string() }),
  /** In the trade's words: "bull put 97 / 95"; "no legs yet" for an empty draft. */
  structureName: z.string(),
  tags: z.array(z.string()),
  createdAt: instantSchema,
  sealedAt: instantSchema.nullable(),
  isLateSeal: z.boolean(),
  firstFillAt: instantSchema.nullable(),
  lastFillAt: instantSchema.nullable(),
  expirySessionDate: sessionDateSchema.nullable(),
  exitSessionDate: sessionDateSchema.nullable(),
  holdingSessions: z.number().nullable(),
  strip: stripSchema.nullable(),
  /** After fees; null before the first fill. Final once the position is flat. */
  realisedProfit: decimalTextSchema.nullable(),
  expectedMean: z.number().nullable(),
  needsLesson: z.boolean(),
});
export type EntryRow = z.infer<typeof entryRowSchema>;

export const sealReceiptSchema = z.strictObject({
  forecastId: idSchema,
  /** Place in the trader's chain, from 1. */
  sequence: z.int().min(1),
  sealedAt: instantSchema,
  /** Hexadecimal SHA-256 of this seal, and of the one before it (64 zeros for the first). */
  hash: z.string().length(64),
  previousHash: z.string().length(64),
  engineVersion: z.string(),
  isLate: z.boolean(),
});

const optionInstrumentSchema = z.strictObject({
  kind: z.literal('option'),
  underlyingSymbol: z.string(),
  expirySessionDate: sessionDateSchema,
  type: z.enum(['call', 'put']),
  strikePrice: positiveDecimalSchema,
  multiplier: positiveDecimalSchema,
});
const stockInstrumentSchema = z.strictObject({
  kind: z.literal('stock'),
  symbol: z.string(),
  multiplier: z.literal('1'),
});
export const instrumentSchema = z.discriminatedUnion('kind', [optionInstrumentSchema, stockInstrumentSchema]);

export const fillKinds = ['buy', 'sell', 'expiry', 'assignment', 'exercise'] as const;
export const fillSchema = z.strictObject({
  id: idSchema,
  kind: z.enum(fillKinds),
  instrument: instrumentSchema,
  quantity: positiveDecimalSchema,
  price: nonNegativeDecimalSchema,
  fees: decimalTextSchema,
  tradedAt: instantSchema,
  /** The zone the time was typed in. */
  timeZone: z.string(),
  /** Price of the underlying at the time, and middle of bid and ask when it was decided; null where it was not noted. */
  underlyingPrice: positiveDecimalSchema.nullable(),
  midPrice: nonNegativeDecimalSchema.nullable(),
  sequence: z.int(),
  /** Cash in (positive) or out, after fees; 0 for an option that ends without cash. */
  cash: decimalTextSchema,
  /** The exercise or assignment that made this stock fill; null for all others. */
  madeBy: idSchema.nullable(),
});
export type EntryFill = z.infer<typeof fillSchema>;

export const entrySchema = z.strictObject({
  row: entryRowSchema,
  plan: draftPlanSchema,
  planSavedAt: instantSchema,
  /** Null before sealing. */
  sealed: z
    .strictObject({ receipt: sealReceiptSchema, input: forecastInputSchema, forecast: forecastSchema })
    .nullable(),
  fills: z.array(fillSchema),
  outcome: entryOutcomeSchema.nullable(),
  /** How the outcome came to say what it says, oldest first. */
  history: z.array(outcomeStepSchema),
  lesson: z.string(),
  /** True when the reader may change it. */
  isOwn: z.boolean(),
});
export type Entry = z.infer<typeof entrySchema>;
