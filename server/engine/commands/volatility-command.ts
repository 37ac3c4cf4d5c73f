import { z } from 'zod';
import { estimateVolatility, largestWindow, type PriceHistory } from '@/journal/volatility/estimate-volatility';
import { type VolatilityMethod } from '@/journal/volatility/volatility-method';
import { engineCommand } from '@/server/engine/commands/engine-command';

const barSchema = z.tuple([z.number(), z.number(), z.number(), z.number()]);
const volatilityCaseSchema = z
  .strictObject({
    closes: z.array(z.number()).optional(),
    bars: z.array(barSchema).optional(),
    method: z.enum([
      'close',
      'ewma',
      'parkinson',
      'garmanKlass',
      'rogersSatchell',
      'garmanKlassYangZhang',
      'yangZhang',
    ]),
    /** Returns, or sessions of a range method, the latest ones; all that there are when it is left out. */
    window: z.int().min(2).optional(),
    /** Of close: its mean removed with n - 1, or taken as 0. */
    mean: z.enum(['sample', 'zero']).default('sample'),
    lambda: z.number().default(0.94),
    confidence: z.number().default(0.95),
  })
  .refine(({ closes, bars }) => (closes === undefined) !== (bars === undefined), 'Give either closes or bars.');

/** Daily volatility of a series with its interval. */
export const volatilityCommand = engineCommand(volatilityCaseSchema, (one) => {
  const history = historyOf(one);
  const { dailyVolatility, mean, low, high, confidence, returnsUsed } = estimateVolatility(
    history,
    methodOf(one, one.window ?? largestWindow(history, one.method)),
    one.confidence,
  );
  return { dailyVolatility, mean, low, high, confidence, sessions: returnsUsed };
});

type VolatilityCase = z.output<typeof volatilityCaseSchema>;

function historyOf({ closes, bars = [], method, window }: VolatilityCase): PriceHistory {
  // A window of weighted returns starts anew at its first, as if nothing had gone before.
  const from = method === 'ewma' && window !== undefined ? -(window + 1) : 0;
  if (closes !== undefined) return { closes: closes.slice(from) };
  return { bars: bars.slice(from).map(([open, high, low, close]) => ({ open, high, low, close })) };
}

function methodOf({ method, lambda, mean }: VolatilityCase, window: number): VolatilityMethod {
  if (method === 'ewma') return { kind: 'ewma', lambda };
  return method === 'close' ? { kind: 'close', window, mean } : { kind: method, window };
}
