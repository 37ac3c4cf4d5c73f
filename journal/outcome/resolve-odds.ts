import { payoffAt } from '@/journal/contracts/expiry-payoff';
import { type StatedOdds } from '@/journal/forecast/forecast';
import { profitAtExit, type PlanModel } from '@/journal/forecast/plan-model';
import { toModelNumber } from '@/journal/money/decimal';
import { type OutcomeBar } from '@/journal/outcome/entry-outcome';

/** The answer to one stated probability, or what is waited for. */
export type Answer =
  | { readonly kind: 'known'; readonly happened: boolean; readonly monitoredBy: 'range' | 'closes' | null }
  | { readonly kind: 'waiting'; readonly waitsFor: string };

export interface AnswerContext {
  readonly model: PlanModel;
  readonly barsSince: readonly OutcomeBar[];
  /** Sessions from the one of the spot price through the planned exit. */
  readonly watchedSessionDates: readonly string[];
  /** Profit after fees of a position that was flat before the session after the planned exit; else null. */
  readonly profitByExit: number | null;
  /** True when the spot price was seen inside the first watched session, whose range began before it. */
  readonly startsInsideSession: boolean;
}

const known = (happened: boolean, monitoredBy: 'range' | 'closes' | null = null): Answer => ({
  kind: 'known',
  happened,
  monitoredBy,
});

/**
 * Resolves a stated probability from official values.
 * Odds to expiry resolve at expiry by the settlement value, even when the trade was closed earlier: resolving only what was
 * held would bias the record. Profit at the planned exit is that of the trade closed by then, and for a plan that was not traded,
 * or was still open, the model's at the exit session's close; what is done later changes no answer.
 * @see scoring at the stated horizon: common practice; Brier (1950) asks for events fixed beforehand.
 */
export function answerOdds({ event, dueSessionDate }: StatedOdds, context: AnswerContext): Answer {
  switch (event.kind) {
    case 'in-the-money': {
      const leg = context.model.position.legs.find(({ legId }) => legId === event.legId);
      const value = settlementValue(context);
      if (leg === undefined || value === null) return waitForSettlement(context);
      return known(leg.type === 'call' ? value > leg.strikePrice : value < leg.strikePrice);
    }
    case 'profit-at-expiry': {
      const value = settlementValue(context);
      return value === null ? waitForSettlement(context) : known(payoffAt(context.model.payoff, value) > 0);
    }
    case 'profit-at-exit': {
      if (context.profitByExit !== null) return known(context.profitByExit > 0);
      const bar = barOn(context, dueSessionDate);
      return bar === null
        ? { kind: 'waiting', waitsFor: `the close of ${dueSessionDate}` }
        : known(profitAtExit(context.model)(bar.close) > 0);
    }
    case 'touch-target':
    case 'touch-stop':
      return answerTouch(toModelNumber(event.level), context);
  }
}

/** The value that settles the plan's options, or null while it is not there. */
export function settlementValue({ model, barsSince }: Pick<AnswerContext, 'model' | 'barsSince'>): number | null {
  const bar = barsSince.find(({ sessionDate }) => sessionDate === model.horizon.expirySessionDate);
  if (bar === undefined) return null;
  // Settled from openings, the close says nothing: only the official value does.
  return bar.settlement ?? (model.input.underlying.settlementTime === 'pm' ? bar.close : null);
}

function waitForSettlement({ model }: AnswerContext): Answer {
  const { expirySessionDate } = model.horizon;
  const what = model.input.underlying.settlementTime === 'am' ? 'the settlement value' : 'the close';
  return { kind: 'waiting', waitsFor: `${what} of ${expirySessionDate}` };
}

function barOn({ barsSince }: AnswerContext, date: string): OutcomeBar | null {
  return barsSince.find(({ sessionDate }) => sessionDate === date) ?? null;
}

function answerTouch(level: number, context: AnswerContext): Answer {
  const isAbove = level > context.model.spotPrice;
  let hasRanges = true;
  let missing: string | null = null;
  for (const [index, date] of context.watchedSessionDates.entries()) {
    const bar = barOn(context, date);
    if (bar === null) {
      missing ??= date;
      continue;
    }
    const isPartial = index === 0 && context.startsInsideSession;
    const extreme = isPartial ? bar.close : ((isAbove ? bar.high : bar.low) ?? bar.close);
    if (isPartial || bar.high === null || bar.low === null) hasRanges = false;
    if (isAbove ? extreme >= level : extreme <= level) return known(true, hasRanges ? 'range' : 'closes');
  }
  return missing === null
    ? known(false, hasRanges ? 'range' : 'closes')
    : { kind: 'waiting', waitsFor: `the close of ${missing}` };
}
