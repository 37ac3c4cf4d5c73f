import { type OutcomeBar } from '@/journal/outcome/entry-outcome';

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
