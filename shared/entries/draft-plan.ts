import { z } from 'zod';
import { idSchema, longTextSchema } from '@/shared/contract/fields';

/** What a person has typed into a field so far, kept as it is. */
const typedSchema = z.string().max(40);

export const draftLegSchema = z.strictObject({
  id: idSchema,
  side: z.enum(['buy', 'sell']),
  type: z.enum(['call', 'put']),
  strikePrice: typedSchema,
  expirySessionDate: typedSchema,
  quantity: typedSchema,
  premium: typedSchema,
});
export type DraftLeg = z.infer<typeof draftLegSchema>;

export const volatilityWindows = [10, 21, 63, 126, 252] as const;

/**
 * A plan while it is being written: every field as typed, so that nothing is lost, empty where nothing is typed.
 * `readPlan` turns it into a forecast's input or names what is missing.
 */
export const draftPlanSchema = z.strictObject({
  underlyingId: idSchema,
  /** Empty: the close of the last bar. */
  spotPrice: typedSchema,
  /** When the typed spot price was seen, an instant; empty with an empty spot price. */
  spotAt: typedSchema,
  legs: z.array(draftLegSchema).max(20),
  holding: z.enum(['toExpiry', 'sessions']),
  holdingSessions: typedSchema,
  volatility: z.strictObject({
    source: z.enum(['window', 'ewma', 'typed']),
    window: z.union(volatilityWindows.map((window) => z.literal(window))),
    /** Percent per session. */
    lowPercent: typedSchema,
    basePercent: typedSchema,
    highPercent: typedSchema,
    reason: longTextSchema,
  }),
  drift: z.strictObject({
    kind: z.enum(['zeroReturn', 'riskNeutral', 'ownView']),
    /** Expected price change over the hold, percent. */
    expectedReturnPercent: typedSchema,
    reason: longTextSchema,
  }),
  /** Percent per year, continuous. */
  ratePercent: typedSchema,
  /** Percent. */
  overnightSharePercent: typedSchema,
  feePerContract: typedSchema,
  targetPrice: typedSchema,
  stopPrice: typedSchema,
  idea: longTextSchema,
  exitRule: longTextSchema,
  tags: z.array(z.string().trim().min(1).max(40)).max(20),
});
export type DraftPlan = z.infer<typeof draftPlanSchema>;
