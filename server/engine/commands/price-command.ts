import { z } from 'zod';
import { europeanOptionValue } from '@/journal/pricing/european-option';
import { engineCommand } from '@/server/engine/commands/engine-command';
import { optionCaseFields, optionOfCase } from '@/server/engine/commands/option-case';

/** Price, five Greeks and risk-neutral odds of an option. */
export const priceCommand = engineCommand(
  z.strictObject({ ...optionCaseFields, dailyVolatility: z.number() }),
  ({ dailyVolatility, ...option }) => europeanOptionValue({ ...optionOfCase(option), dailyVolatility }),
);
