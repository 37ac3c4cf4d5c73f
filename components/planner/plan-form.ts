import { createContext, useContext } from 'react';
import { type PlanPreview } from '@/hooks/entries/preview-plan';
import { type PlanProblem } from '@/shared/entries/plan-problem';
import { type UnderlyingDetail } from '@/shared/underlyings/underlying-endpoints';

/** What the parts of the planner share beside the form itself. */
export interface PlanContextValue {
  readonly detail: UnderlyingDetail;
  readonly preview: PlanPreview;
  /** Problems are shown once the person has asked to go on, not while the first letter is typed. */
  readonly showsProblems: boolean;
}

export const PlanContext = createContext<PlanContextValue | null>(null);

export function usePlan(): PlanContextValue {
  const value = useContext(PlanContext);
  if (value === null) throw new Error('usePlan belongs inside the planner.');
  return value;
}

const noProblems: readonly PlanProblem[] = [];

/** The message for one field of the draft, where it is to be shown. */
export function useProblemOf(field: string): string | undefined {
  const { preview, showsProblems } = usePlan();
  const problems = preview.kind === 'incomplete' && showsProblems ? preview.problems : noProblems;
  return problems.find((problem) => problem.field === field)?.message;
}
