import { z } from 'zod';
import { americanOptionValue } from '@/journal/pricing/american-option';
import { europeanOptionValue } from '@/journal/pricing/european-option';
import { engineCommand } from '@/server/engine/commands/engine-command';
import { optionCaseFields, optionOfCase } from '@/server/engine/commands/option-case';

/** Price, five Greeks and risk-neutral odds of an option; of an American one also whether, and where, it is exercised now. */
export const priceCommand = engineCommand(
  z.strictObject({ ...optionCaseFields, dailyVolatility: z.number() }),
  ({ dailyVolatility, ...one }) => {
    const option = { ...optionOfCase(one), dailyVolatility };
    return one.style === 'european' ? europeanOptionValue(option) : americanOptionValue(option);
  },
);
