import { formatDate, formatInstant, formatMoney, formatSigma, withDatesInWords } from '@/components/ui/number-format';
import { fillActs } from '@/components/entry/fill-words';
import { nextSession } from '@/journal/sessions/exchange-calendar';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type KeptOutcomeChange, type OutcomeCause, type OutcomeStep } from '@/shared/entries/outcome-history';

const ZONE = 'America/New_York';

export interface ChangeWords {
  readonly key: string;
  /** "The close of 9 December was corrected from 98.40 to 98.10 on 11 Dec, 17:05". */
  readonly cause: string;
  /** "Move −0.54σ became −0.61σ". */
  readonly effects: readonly string[];
}

/**
 * What changed in an outcome after it was first known, newest first. First answers are no change, but for those that a settlement
 * value brought after the next session had opened.
 */
export function whatChanged(history: readonly OutcomeStep[], currency: string): ChangeWords[] {
  const known = new Set<string>();
  const words: ChangeWords[] = [];
  for (const { id, at, cause, changes } of history) {
    const told = changes.filter((change) => wasKnown(change) || known.has(subjectOf(change)) || isLate(cause, at));
    for (const change of changes) if (change.after !== null) known.add(subjectOf(change));
    const effects = told.flatMap((change) => effectWords(change, currency));
    if (effects.length > 0) words.unshift({ key: id, cause: causeWords(cause, at), effects });
  }
  return words;
}

const subjectOf = (change: KeptOutcomeChange): string => (change.kind === 'odds' ? change.oddsKey : change.kind);
const wasKnown = (change: KeptOutcomeChange): boolean =>
  change.kind === 'completeness' ? change.before : change.before !== null;

/** Whether a settlement value brought it after the next session had opened. */
function isLate(cause: OutcomeCause, at: string): boolean {
  if (cause.kind !== 'settlement') return false;
  return cause.prices.some(
    ({ field, sessionDate, before }) =>
      field === 'settlement' && before === null && nextSession(usOptionsCalendar, sessionDate).opensAt <= at,
  );
}

function causeWords(cause: OutcomeCause, at: string): string {
  const when = formatInstant(at, ZONE);
  switch (cause.kind) {
    case 'seal':
      return `Sealed on ${when}`;
    case 'fill': {
      const { kind, contract, quantity, price } = cause.fill;
      const fill = `${fillActs[kind]} ${formatMoney(quantity, { places: 0 })} × ${withDatesInWords(contract)} at ${formatMoney(price)}`;
      return `${fill} was ${cause.act === 'added' ? 'added' : 'taken out'} on ${when}`;
    }
    case 'bar':
    case 'settlement': {
      const [told, ...others] = sentences(cause.prices);
      if (told === undefined) return `New bars came on ${when}`;
      return `${told} on ${when}${others.length > 0 ? `, with ${others.length} other ${others.length === 1 ? 'price' : 'prices'}` : ''}`;
    }
  }
}

type Prices = Extract<OutcomeCause, { prices: unknown }>['prices'];

function sentences(prices: Prices): string[] {
  return prices.map(({ field, sessionDate, before, after }) => {
    const what = `The ${field === 'settlement' ? 'settlement value' : field} of ${formatDate(sessionDate, 'long')}`;
    if (before === null) return `${what}, ${formatMoney(after ?? '')}, came`;
    if (after === null) return `${what}, ${formatMoney(before)}, was taken away`;
    return `${what} was corrected from ${formatMoney(before)} to ${formatMoney(after)}`;
  });
}

function effectWords(change: KeptOutcomeChange, currency: string): string[] {
  switch (change.kind) {
    case 'move':
      return [turned('Move', change, ({ inSigmas }) => formatSigma(inSigmas))];
    case 'odds':
      return [turned(`“${change.statement}”`, change, (happened) => (happened ? 'yes' : 'no'))];
    case 'profit':
      return [turned('Profit', change, (amount) => formatMoney(amount, { sign: true, currency }))];
    case 'completeness':
      return change.after ? ['Everything is known'] : ['Something is waited for again'];
  }
}

function turned<T>(
  what: string,
  { before, after }: { readonly before: T | null; readonly after: T | null },
  words: (value: T) => string,
): string {
  if (before === null) return after === null ? `${what} is not known` : `${what} is now ${words(after)}`;
  return after === null
    ? `${what} ${words(before)} is no longer known`
    : `${what} ${words(before)} became ${words(after)}`;
}
