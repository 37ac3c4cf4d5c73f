import { z } from 'zod';
import {
  currencySchema,
  idSchema,
  nonNegativeDecimalSchema,
  positiveDecimalSchema,
  sessionDateSchema,
} from '@/shared/contract/fields';

export const underlyingFields = {
  /** As the desk writes it; unique on the desk. */
  symbol: z
    .string()
    .trim()
    .regex(
      /^[A-Z0-9][A-Z0-9.]{0,11}$/,
      'Use 1 to 12 capital letters, digits or dots, starting with a letter or digit.',
    ),
  name: z.string().trim().max(120),
  style: z.enum(['european', 'american']),
  settlement: z.enum(['cash', 'physical']),
  settlementTime: z.enum(['pm', 'am']),
  /** Shares a contract. */
  multiplier: positiveDecimalSchema,
  /** Continuous, a fraction per calendar year. */
  dividendYield: z.number().min(-0.5).max(0.5),
  currency: currencySchema,
};

export const underlyingSchema = z.strictObject({ id: idSchema, version: z.int().min(1), ...underlyingFields });
export type Underlying = z.infer<typeof underlyingSchema>;

/** One session's prices. Only the close is needed; the settlement value stands where it differs from the close. */
export const barFields = {
  close: positiveDecimalSchema,
  open: positiveDecimalSchema.nullable(),
  high: positiveDecimalSchema.nullable(),
  low: positiveDecimalSchema.nullable(),
  settlement: nonNegativeDecimalSchema.nullable(),
};
export const barSchema = z.strictObject({
  sessionDate: sessionDateSchema,
  ...barFields,
  source: z.enum(['upload', 'typed', 'demo']),
  /** When this value was stored. */
  storedAt: z.iso.datetime({ precision: 3 }),
});
export type Bar = z.infer<typeof barSchema>;
