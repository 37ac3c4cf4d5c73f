import { z } from 'zod';
import { currencySchema, fractionSchema, nonNegativeDecimalSchema, shortTextSchema } from '@/shared/contract/fields';

/** What a desk presets for every plan. */
export const deskSettingsFields = {
  name: shortTextSchema,
  currency: currencySchema,
  /** Continuous, a fraction per calendar year. */
  ratePerYear: z.number().min(-0.1).max(0.5),
  /** Share of a session's variance that falls before its open. */
  overnightShare: fractionSchema,
  feePerContract: nonNegativeDecimalSchema,
};
export const deskSettingsSchema = z.strictObject({ ...deskSettingsFields, version: z.int().min(1) });
export type DeskSettings = z.infer<typeof deskSettingsSchema>;
