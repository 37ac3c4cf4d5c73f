import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type OutcomeBar, type OutcomeQuestion } from '@/journal/outcome/entry-outcome';

/** A bar with a close and nothing else but what is said. */
export const outcomeBar = (sessionDate: string, close: number, rest: Partial<OutcomeBar> = {}): OutcomeBar => ({
  sessionDate,
  open: null,
  close,
  high: null,
  low: null,
  settlement: null,
  ...rest,
});

/** What stands beside fills when nothing was noted with them and the plan was sealed at its spot price. */
export const nothingNoted = (input: ForecastInput): Pick<OutcomeQuestion, 'marks' | 'sealedAt'> => ({
  marks: new Map(),
  sealedAt: input.spot.at,
});
