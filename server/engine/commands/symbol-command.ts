import { z } from 'zod';
import { decodeOptionSymbol, encodeOptionSymbol } from '@/journal/contracts/option-symbol';
import { engineCommand } from '@/server/engine/commands/engine-command';

const symbolCaseSchema = z.union([
  z.strictObject({ symbol: z.string() }),
  z.strictObject({
    root: z.string(),
    expirySessionDate: z.string(),
    type: z.enum(['call', 'put']),
    strikePrice: z.string(),
  }),
]);

/** A symbol with its fields, from either. */
export const symbolCommand = engineCommand(symbolCaseSchema, (one) => {
  const symbol = 'symbol' in one ? one.symbol : encodeOptionSymbol(one);
  return { symbol, ...decodeOptionSymbol(symbol) };
});
