import { type Answer, type AnswerContext } from '@/journal/outcome/answer';
import { type OutcomeBar } from '@/journal/outcome/entry-outcome';

/** What one session's bar says of a level: reached within the hold, not, or reached at an hour that the bar does not tell. */
interface Evidence {
  readonly reached: 'yes' | 'no' | 'unsure';
  readonly monitoredBy: 'range' | 'closes';
}

/**
 * Whether a level was touched between the moment of the spot price and the end of the hold, as far as daily bars tell. Of a session
 * that the hold begins or ends within, a range that stays short of the level proves that it was not touched; a range that reaches it
 * proves nothing, since the touch may lie outside the hold. What is settled from openings ends with that value.
 */
export function answerTouch(level: number, context: AnswerContext): Answer {
  const { watchedSessionDates, barsSince, end } = context;
  let monitoredBy: Evidence['monitoredBy'] = 'range';
  let missing: string | null = null;
  let isUnsure = false;
  for (const [index, date] of watchedSessionDates.entries()) {
    const bar = barsSince.find(({ sessionDate }) => sessionDate === date);
    const isLast = date === end.session.date;
    const isSettlement = isLast && end.kind === 'settled-from-openings';
    if (bar === undefined || (isSettlement && bar.settlement === null)) {
      missing ??= isSettlement ? `the settlement value of ${date}` : `the close of ${date}`;
      continue;
    }
    const evidence = evidenceOf(bar, {
      ...levelSeen(level, context.model.spotPrice),
      startsInside: index === 0 && context.startsInsideSession,
      end: isLast ? end.kind : 'close',
    });
    if (evidence.monitoredBy === 'closes') monitoredBy = 'closes';
    if (evidence.reached === 'yes') return { kind: 'known', happened: true, monitoredBy };
    if (evidence.reached === 'unsure') isUnsure = true;
  }
  if (missing !== null) return { kind: 'waiting', waitsFor: missing };
  return isUnsure ? { kind: 'cannot-tell' } : { kind: 'known', happened: false, monitoredBy };
}

interface Watch {
  readonly isBeyond: (price: number) => boolean;
  readonly isAbove: boolean;
  /** The hold begins between this session's open and close. */
  readonly startsInside: boolean;
  readonly end: 'close' | 'open' | 'inside' | 'settled-from-openings';
}

function levelSeen(level: number, spotPrice: number): Pick<Watch, 'isAbove' | 'isBeyond'> {
  const isAbove = level > spotPrice;
  return { isAbove, isBeyond: (price) => (isAbove ? price >= level : price <= level) };
}

function evidenceOf(bar: OutcomeBar, { isAbove, isBeyond, startsInside, end }: Watch): Evidence {
  if (end === 'settled-from-openings') return yesOrNo(isBeyond(bar.settlement ?? bar.close), 'range');
  const open = startsInside ? null : bar.open;
  if (end === 'open' && open !== null) return yesOrNo(isBeyond(open), 'range');
  const extreme = isAbove ? bar.high : bar.low;
  const monitoredBy = extreme === null ? 'closes' : 'range';
  const isReached = isBeyond(extreme ?? bar.close) || isBeyond(bar.close);
  if (end === 'close' && !startsInside) return yesOrNo(isReached, monitoredBy);
  if (end === 'close' && isBeyond(bar.close)) return { reached: 'yes', monitoredBy: 'closes' };
  if (end === 'inside' && open !== null && isBeyond(open)) return { reached: 'yes', monitoredBy };
  return { reached: isReached ? 'unsure' : 'no', monitoredBy };
}

function yesOrNo(isReached: boolean, monitoredBy: Evidence['monitoredBy']): Evidence {
  return { reached: isReached ? 'yes' : 'no', monitoredBy };
}
