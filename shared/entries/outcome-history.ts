import { z } from 'zod';
import {
  decimalTextSchema,
  idSchema,
  instantSchema,
  nonNegativeDecimalSchema,
  positiveDecimalSchema,
  sessionDateSchema,
} from '@/shared/contract/fields';

const knownMoveSchema = z.strictObject({
  sessionDate: sessionDateSchema,
  endPrice: z.number(),
  inSigmas: z.number(),
  isFinal: z.boolean(),
});

/** One thing an outcome says otherwise than before (journal/outcome/outcome-changes); odds also in words. */
const outcomeChangeSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('move'),
    before: knownMoveSchema.nullable(),
    after: knownMoveSchema.nullable(),
  }),
  z.strictObject({
    kind: z.literal('odds'),
    oddsKey: z.string(),
    /** "97 put in the money". */
    statement: z.string(),
    before: z.boolean().nullable(),
    after: z.boolean().nullable(),
  }),
  z.strictObject({
    kind: z.literal('profit'),
    before: decimalTextSchema.nullable(),
    after: decimalTextSchema.nullable(),
  }),
  z.strictObject({ kind: z.literal('completeness'), before: z.boolean(), after: z.boolean() }),
]);
export type KeptOutcomeChange = z.infer<typeof outcomeChangeSchema>;

export const priceFields = ['close', 'open', 'high', 'low', 'settlement'] as const;

/** One price of one session that was stored, corrected or taken away; prices are decimal text. */
const priceChangeSchema = z.strictObject({
  sessionDate: sessionDateSchema,
  field: z.enum(priceFields),
  before: nonNegativeDecimalSchema.nullable(),
  after: nonNegativeDecimalSchema.nullable(),
});
export type PriceChange = z.infer<typeof priceChangeSchema>;

const namedFillSchema = z.strictObject({
  kind: z.enum(['buy', 'sell', 'expiry', 'assignment', 'exercise']),
  /** "18 Dec 97 put" without its date in words: "2026-12-18 97 put", or "HVYQ shares". */
  contract: z.string(),
  quantity: positiveDecimalSchema,
  price: nonNegativeDecimalSchema,
});

/** Why an outcome was computed again. */
export const outcomeCauseSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('seal') }),
  z.strictObject({ kind: z.enum(['bar', 'settlement']), prices: z.array(priceChangeSchema) }),
  z.strictObject({ kind: z.literal('fill'), act: z.enum(['added', 'taken-out']), fill: namedFillSchema }),
]);
export type OutcomeCause = z.infer<typeof outcomeCauseSchema>;

/** One step in the history of an outcome. */
export const outcomeStepSchema = z.strictObject({
  id: idSchema,
  at: instantSchema,
  cause: outcomeCauseSchema,
  changes: z.array(outcomeChangeSchema),
});
export type OutcomeStep = z.infer<typeof outcomeStepSchema>;
