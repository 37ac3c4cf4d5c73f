import { z } from 'zod';
import { matchLots } from '@/journal/fills/lots';
import { engineCommand } from '@/server/engine/commands/engine-command';

const instrumentSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('option'),
    underlyingSymbol: z.string().min(1),
    expirySessionDate: z.string(),
    type: z.enum(['call', 'put']),
    strikePrice: z.string(),
    multiplier: z.string(),
    /** Of an adjusted series: what one contract delivers. */
    deliverable: z
      .strictObject({ symbol: z.string().min(1), sharesPerContract: z.string(), cashPerContract: z.string() })
      .optional(),
  }),
  z.strictObject({ kind: z.literal('stock'), symbol: z.string().min(1), multiplier: z.literal('1').default('1') }),
]);

const lotsCaseSchema = z.strictObject({
  fills: z.array(
    z.strictObject({
      id: z.string().min(1),
      kind: z.enum(['buy', 'sell', 'expiry', 'assignment', 'exercise']),
      instrument: instrumentSchema,
      quantity: z.string(),
      price: z.string(),
      fees: z.string().default('0'),
      tradedAt: z.string(),
      /** Order among fills of one instant; that of the list when it is left out. */
      sequence: z.int().optional(),
    }),
  ),
  method: z.enum(['fifo', 'lifo', 'average']),
  /** Splits, symbol changes and other adjustments of what is held. */
  changes: z
    .array(
      z.strictObject({
        id: z.string().min(1),
        changedAt: z.string(),
        sequence: z.int().default(0),
        from: instrumentSchema,
        to: instrumentSchema,
        oldQuantity: z.string(),
        newQuantity: z.string(),
      }),
    )
    .default([]),
});

/** Closed and open lots with the realised profit, all amounts as decimal texts. */
export const lotsCommand = engineCommand(lotsCaseSchema, ({ fills, method, changes }) =>
  matchLots(
    fills.map((fill, index) => ({ ...fill, sequence: fill.sequence ?? index })),
    { method, changes },
  ),
);
