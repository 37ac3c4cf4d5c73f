import { z } from 'zod';
import { americanImpliedVolatility } from '@/journal/pricing/american-implied-volatility';
import { impliedDailyVolatility } from '@/journal/pricing/implied-daily-volatility';
import { engineCommand } from '@/server/engine/commands/engine-command';
import { optionCaseFields, optionOfCase } from '@/server/engine/commands/option-case';

/** Daily volatility of a price; null, with the bound that was broken and its value, for a price that no volatility gives. */
export const impliedCommand = engineCommand(
  z.strictObject({ ...optionCaseFields, price: z.number() }),
  ({ price, ...one }) => {
    const question = { ...optionOfCase(one), price };
    const answer = one.style === 'european' ? impliedDailyVolatility(question) : americanImpliedVolatility(question);
    return answer.kind === 'found'
      ? { dailyVolatility: answer.dailyVolatility }
      : { dailyVolatility: null, bound: answer.bound, limit: answer.limit };
  },
);
