import { z } from 'zod';
import { DomainError } from '@/journal/errors/domain-error';
import { estimateVolatility } from '@/journal/volatility/estimate-volatility';
import { type VolatilityMethod } from '@/journal/volatility/volatility-method';
import { engineCommand } from '@/server/engine/commands/engine-command';

const barSchema = z.tuple([z.number(), z.number(), z.number(), z.number()]);
const volatilityCaseSchema = z
  .strictObject({
    closes: z.array(z.number()).optional(),
    bars: z.array(barSchema).optional(),
    method: z.enum(['close', 'ewma', 'parkinson', 'garmanKlass', 'rogersSatchell', 'yangZhang']),
    /** Returns, the latest ones; all that there are when it is left out. */
    window: z.int().min(2).optional(),
    lambda: z.number().default(0.94),
    confidence: z.number().default(0.95),
  })
  .refine(({ closes, bars }) => (closes === undefined) !== (bars === undefined), 'Give either closes or bars.');

/** Daily volatility of a series with its interval. */
export const volatilityCommand = engineCommand(volatilityCaseSchema, (one) => {
  const closes = one.closes ?? one.bars?.map(([, , , close]) => close) ?? [];
  const returns = one.window ?? Math.max(closes.length - 1, 1);
  const method = methodOf(one, returns);
  // A window of weighted returns starts anew at its first, as if nothing had gone before.
  const used = method.kind === 'ewma' && one.window !== undefined ? closes.slice(-(returns + 1)) : closes;
  const { dailyVolatility, mean, low, high, confidence, returnsUsed } = estimateVolatility(
    used,
    method,
    one.confidence,
  );
  return { dailyVolatility, mean, low, high, confidence, sessions: returnsUsed };
});

function methodOf({ method, lambda }: z.output<typeof volatilityCaseSchema>, window: number): VolatilityMethod {
  if (method === 'close') return { kind: 'window', window };
  if (method === 'ewma') return { kind: 'ewma', lambda };
  throw new DomainError('method-not-supported', { method });
}
