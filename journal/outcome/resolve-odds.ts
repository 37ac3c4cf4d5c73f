import { payoffAt } from '@/journal/contracts/expiry-payoff';
import { type StatedOdds } from '@/journal/forecast/forecast';
import { profitAtExit } from '@/journal/forecast/plan-model';
import { toModelNumber } from '@/journal/money/decimal';
import { type Answer, type AnswerContext } from '@/journal/outcome/answer';
import { answerTouch } from '@/journal/outcome/answer-touch';
import { type OutcomeBar } from '@/journal/outcome/entry-outcome';
import { settlementOf } from '@/journal/outcome/settlement-value';

const known = (happened: boolean, monitoredBy: 'range' | 'closes' | null = null): Answer => ({
  kind: 'known',
  happened,
  monitoredBy,
});

/**
 * Resolves a stated probability from official values.
 * Odds to expiry resolve at expiry by the settlement value, even when the trade was closed earlier: resolving only what was
 * held would bias the record. Profit at the planned exit is that of the trade closed by then, and for a plan that was not traded,
 * or was still open, the model's at the price of the exit; what is done later changes no answer.
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
      return bar === null ? { kind: 'waiting', waitsFor: `the close of ${dueSessionDate}` } : answerExit(bar, context);
    }
    case 'touch-target':
    case 'touch-stop':
      return answerTouch(toModelNumber(event.level), context);
  }
}

/** The value that settles the plan's options, or null while it is not there. */
function settlementValue({ model, barsSince }: AnswerContext): number | null {
  const bar = barsSince.find(({ sessionDate }) => sessionDate === model.horizon.expirySessionDate);
  return bar === undefined ? null : settlementOf(model.input, bar);
}

function waitForSettlement({ model }: AnswerContext): Answer {
  const { expirySessionDate } = model.horizon;
  const what = model.input.underlying.settlementTime === 'am' ? 'the settlement value' : 'the close';
  return { kind: 'waiting', waitsFor: `${what} of ${expirySessionDate}` };
}

function barOn({ barsSince }: AnswerContext, date: string): OutcomeBar | null {
  return barsSince.find(({ sessionDate }) => sessionDate === date) ?? null;
}

/** Prices looked at between the lowest and the highest of a session. */
const STEPS = 64;

/**
 * The model's profit at an exit. Between open and close daily bars give no price, only its bounds: the answer is known when the
 * profit has one sign all the way between them.
 */
function answerExit(bar: OutcomeBar, { model, end }: AnswerContext): Answer {
  const profitAt = profitAtExit(model);
  const isProfit = (price: number) => profitAt(price) > 0;
  if (end.kind === 'close') return known(isProfit(bar.close));
  if (end.kind === 'open' && bar.open !== null) return known(isProfit(bar.open));
  const { low, high } = bar;
  if (low === null || high === null) return { kind: 'cannot-tell' };
  const strikes = model.position.legs
    .map(({ strikePrice }) => strikePrice)
    .filter((price) => price > low && price < high);
  const prices = [...Array.from({ length: STEPS + 1 }, (_, step) => low + ((high - low) * step) / STEPS), ...strikes];
  const profits = prices.map(isProfit);
  return profits.every((is) => is === profits[0]) ? known(profits[0] === true) : { kind: 'cannot-tell' };
}
