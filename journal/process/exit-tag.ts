import { DomainError } from '@/journal/errors/domain-error';
import { toDecimal } from '@/journal/money/decimal';
import {
  type ActualExit,
  type ExitRule,
  type ExitRules,
  type ExitTag,
  type ExitWindow,
} from '@/journal/process/exit-rule';
import { instantMilliseconds } from '@/journal/sessions/instant';

/** A stop that is overrun by more than this share of its distance was not followed. (Common practice.) */
const STOP_TOLERANCE = 0.1;

/**
 * Says by which rule of the plan a position was left. A stop counts as followed up to a small overrun, beyond it the exit is
 * unplanned, whatever other rule it might also meet; a target counts however far it was passed. After these, leaving ahead of an
 * event comes before leaving by the clock. An option that ends on its expiry day ends by expiry; an assignment or exercise before
 * that day was not planned.
 * @param options.stopTolerance share of the distance from start to stop, 0 or more; 0.1 by default.
 * @throws {DomainError} `stop-tolerance-invalid`, `exit-rule-invalid` for a level that its start already meets, `instant-invalid`,
 *   `decimal-invalid`.
 * @see common practice.
 */
export function exitTag(
  exit: ActualExit,
  rules: ExitRules,
  { stopTolerance = STOP_TOLERANCE }: { readonly stopTolerance?: number } = {},
): ExitTag {
  if (!(stopTolerance >= 0 && stopTolerance < Infinity)) {
    throw new DomainError('stop-tolerance-invalid', { stopTolerance });
  }
  const at = instantMilliseconds(exit.at);
  if (exit.kind !== 'buy' && exit.kind !== 'sell') {
    return at >= instantMilliseconds(rules.expiryOpensAt) ? 'expiry' : 'unplanned';
  }
  const overrun = rules.stop === null ? null : overrunOf(rules.stop, exit);
  if (overrun !== null && overrun >= 0) return overrun <= stopTolerance ? 'stop' : 'unplanned';
  const passed = rules.target === null ? null : overrunOf(rules.target, exit);
  if (passed !== null && passed >= 0) return 'target';
  if (isWithin(at, rules.event)) return 'event';
  return isWithin(at, rules.time) ? 'time' : 'unplanned';
}

/** How far beyond a level the exit was, as a share of its distance from the start; below 0 when not there, null when not known. */
function overrunOf({ basis, level, heldWhen, startLevel }: ExitRule, exit: ActualExit): number | null {
  const direction = heldWhen === 'at-or-above' ? 1 : -1;
  const distance = toDecimal(level).minus(toDecimal(startLevel)).times(direction);
  if (!distance.greaterThan(0)) throw new DomainError('exit-rule-invalid', { level, startLevel, heldWhen });
  const price = basis === 'underlying' ? exit.underlyingPrice : exit.netPrice;
  if (price === null) return null;
  return toDecimal(price).minus(toDecimal(level)).times(direction).dividedBy(distance).toNumber();
}

function isWithin(at: number, window: ExitWindow | null): boolean {
  return window !== null && at >= instantMilliseconds(window.from) && at <= instantMilliseconds(window.to);
}
