import { type PlanModel } from '@/journal/forecast/plan-model';
import { type OutcomeBar } from '@/journal/outcome/entry-outcome';
import { type HoldEnd } from '@/journal/outcome/hold-end';

/** The answer to one stated probability, or what is waited for. */
export type Answer =
  | { readonly kind: 'known'; readonly happened: boolean; readonly monitoredBy: 'range' | 'closes' | null }
  | { readonly kind: 'waiting'; readonly waitsFor: string }
  /** All bars are there, and the question falls inside one of them. */
  | { readonly kind: 'cannot-tell' };

export interface AnswerContext {
  readonly model: PlanModel;
  readonly barsSince: readonly OutcomeBar[];
  /** Sessions from the one of the spot price through the planned exit. */
  readonly watchedSessionDates: readonly string[];
  /** Where the planned exit falls. */
  readonly end: HoldEnd;
  /** Profit after fees of a position that was flat before the session after the planned exit; else null. */
  readonly profitByExit: number | null;
  /** True when the spot price was seen inside the first watched session, whose range began before it. */
  readonly startsInsideSession: boolean;
}
