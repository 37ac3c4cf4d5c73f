import { makeForecast } from '@/journal/forecast/make-forecast';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { engineCommand } from '@/server/engine/commands/engine-command';
import { forecastInputSchema } from '@/shared/entries/forecast-schema';

/** A whole plan with its prices: the forecast as the product shows and seals it. */
export const forecastCommand = engineCommand(forecastInputSchema, (input) => makeForecast(input, usOptionsCalendar));
