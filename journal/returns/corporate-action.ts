import { DomainError } from '@/journal/errors/domain-error';
import { type SessionDate } from '@/journal/sessions/session-date';

/** What happened to a share at the open of its ex-session. */
export type CorporateAction =
  /** `oldShares` became `newShares`: 2 and 1 for two for one, 1 and 10 for one for ten. Whole or fractional, each above 0. */
  | {
      readonly kind: 'split';
      readonly exSessionDate: SessionDate;
      readonly newShares: number;
      readonly oldShares: number;
    }
  /** Paid on each share held then, after a split of the same session: 0 or more, in the currency of the prices. */
  | {
      readonly kind: 'cashDividend' | 'specialDividend';
      readonly exSessionDate: SessionDate;
      readonly amount: number;
    };

/** What all actions of one session come to, for a share held since the close before. */
export interface SessionActions {
  /** Shares after for one before. */
  readonly shares: number;
  /** Cash on each share after. */
  readonly cash: number;
}

/**
 * Actions by the session of a series that they fall into: the first on or after their ex-session.
 * @param sessionDates rising. @returns one a session; actions up to the first session, whose return is not in the series, and those
 *   after the last are left out.
 * @throws {DomainError} `session-dates-not-rising`, `action-invalid`, each with the index.
 */
export function actionsBySession(
  sessionDates: readonly SessionDate[],
  actions: readonly CorporateAction[],
): SessionActions[] {
  const unsorted = sessionDates.findIndex((date, at) => at > 0 && !(date > (sessionDates[at - 1] ?? '')));
  if (unsorted >= 0) throw new DomainError('session-dates-not-rising', { index: unsorted });
  const bySession: SessionActions[] = sessionDates.map(() => ({ shares: 1, cash: 0 }));
  for (const [index, action] of actions.entries()) {
    if (!isValid(action)) throw new DomainError('action-invalid', { index, kind: action.kind });
    const at = sessionDates.findIndex((date) => date >= action.exSessionDate);
    const before = bySession[at];
    if (at <= 0 || before === undefined) continue;
    bySession[at] =
      action.kind === 'split'
        ? { ...before, shares: before.shares * (action.newShares / action.oldShares) }
        : { ...before, cash: before.cash + action.amount };
  }
  return bySession;
}

function isValid(action: CorporateAction): boolean {
  if (action.kind !== 'split') return action.amount >= 0 && action.amount < Infinity;
  const shares = action.newShares / action.oldShares;
  return action.newShares > 0 && action.oldShares > 0 && shares > 0 && shares < Infinity;
}
