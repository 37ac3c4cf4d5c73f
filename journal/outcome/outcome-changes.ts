import { type EntryOutcome, type MoveOutcome } from '@/journal/outcome/entry-outcome';

/** A move as far as it was known: to the planned exit, or to the latest bar while it runs. */
export interface KnownMove {
  readonly sessionDate: string;
  readonly endPrice: number;
  readonly inSigmas: number;
  readonly isFinal: boolean;
}

/** One thing that an outcome says otherwise than before; `before` is null where it was not known, `after` where it no longer is. */
export type OutcomeChange =
  | { readonly kind: 'move'; readonly before: KnownMove | null; readonly after: KnownMove | null }
  | {
      readonly kind: 'odds';
      readonly oddsKey: string;
      readonly before: boolean | null;
      readonly after: boolean | null;
    }
  /** Decimal text; of a position that was flat. */
  | { readonly kind: 'profit'; readonly before: string | null; readonly after: string | null }
  | { readonly kind: 'completeness'; readonly before: boolean; readonly after: boolean };

/**
 * What a newly computed outcome says otherwise than the one before, as far as it matters: the move, the answers, the profit of a
 * flat position, and whether all is known. A running move that only goes on to a later session, and the profit of an open position,
 * follow the market and are no change.
 * @param before null for the first outcome of an entry. @returns none when nothing of it changed. Never throws.
 * @see common practice.
 */
export function outcomeChanges(before: EntryOutcome | null, after: EntryOutcome): OutcomeChange[] {
  return [
    ...moveChange(before === null ? null : knownMove(before), knownMove(after)),
    ...oddsChanges(before, after),
    ...profitChange(before === null ? null : finalProfit(before), finalProfit(after)),
    ...(after.isComplete === (before?.isComplete ?? false)
      ? []
      : [{ kind: 'completeness', before: before?.isComplete ?? false, after: after.isComplete } as const]),
  ];
}

function knownMove({ move, moveSoFar }: EntryOutcome): KnownMove | null {
  const view = ({ sessionDate, endPrice, inSigmas }: MoveOutcome, isFinal: boolean) => ({
    sessionDate,
    endPrice,
    inSigmas,
    isFinal,
  });
  if (move !== null) return view(move, true);
  return moveSoFar === null ? null : view(moveSoFar, false);
}

function moveChange(before: KnownMove | null, after: KnownMove | null): OutcomeChange[] {
  const isFinal = before?.isFinal === true || after?.isFinal === true;
  // Two running moves are compared where they end in the same session only.
  if (!isFinal && before?.sessionDate !== after?.sessionDate) return [];
  const isSame =
    before?.isFinal === after?.isFinal &&
    before?.sessionDate === after?.sessionDate &&
    before?.endPrice === after?.endPrice &&
    before?.inSigmas === after?.inSigmas;
  if (isSame) return [];
  const known = (move: KnownMove | null) => (isFinal && move?.isFinal === false ? null : move);
  return [{ kind: 'move', before: known(before), after: known(after) }];
}

function oddsChanges(before: EntryOutcome | null, after: EntryOutcome): OutcomeChange[] {
  const answers = new Map(before?.odds.map(({ odds, happened }) => [odds.key, happened]));
  return after.odds.flatMap(({ odds: { key }, happened }) => {
    const known = answers.get(key) ?? null;
    return known === happened ? [] : [{ kind: 'odds', oddsKey: key, before: known, after: happened } as const];
  });
}

const finalProfit = ({ profit }: EntryOutcome): string | null => (profit?.isFinal === true ? profit.realised : null);

function profitChange(before: string | null, after: string | null): OutcomeChange[] {
  return before === after ? [] : [{ kind: 'profit', before, after }];
}
