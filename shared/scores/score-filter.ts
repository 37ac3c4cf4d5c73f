import { z } from 'zod';
import { horizonClasses } from '@/journal/scoring/horizon-class';
import { idSchema, sessionDateSchema } from '@/shared/contract/fields';

/** Which entries the scores are of; what is left out does not narrow. */
export const scoreFilterSchema = z.strictObject({
  /** One of the traders a mentor reads. */
  traderId: idSchema.optional(),
  underlyingId: idSchema.optional(),
  structureKind: z.string().min(1).max(40).optional(),
  horizonClass: z.enum(horizonClasses).optional(),
  tag: z.string().min(1).max(40).optional(),
  /** Session of the planned exit, both ends included. */
  from: sessionDateSchema.optional(),
  to: sessionDateSchema.optional(),
  traded: z.enum(['yes', 'no']).optional(),
  /** The sums behind samples too small for a rate, asked for by name. */
  evenIfFew: z.literal('yes').optional(),
});
export type ScoreFilter = z.infer<typeof scoreFilterSchema>;
