import { type Fill } from '@/journal/fills/fill';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type Forecast } from '@/journal/forecast/forecast';
import { isFlat } from '@/journal/fills/position';
import { toDecimal } from '@/journal/money/decimal';
import { type FillMarks, type MarketQuestion, underlyingAt } from '@/journal/outcome/market-at';
import { entryWithinLimit, type EntryWithinLimit } from '@/journal/process/entry-within-limit';
import { type ExitRule, type ExitTag } from '@/journal/process/exit-rule';
import { exitTag } from '@/journal/process/exit-tag';
import { isPlanFollowed, isSealedBeforeFill } from '@/journal/process/plan-followed';
import { sizeWithinPlan, type SizeWithinPlan } from '@/journal/process/size-within-plan';

/** How an entry was carried out, kept apart from what it brought. */
export interface EntryProcess {
  readonly isSealedBeforeFill: boolean;
  readonly size: SizeWithinPlan;
  /** Null while a leg has no opening fill. */
  readonly limit: EntryWithinLimit | null;
  /** Null while the position is open, or while the price that tells is not there. */
  readonly exitTag: ExitTag | null;
  /** Null while the position is open. */
  readonly isFollowed: boolean | null;
}

/**
 * Judges the fills of an entry against its sealed plan: seal before fill, size, price, and by which rule it was left.
 * @param sealedAt instant of the seal.
 * @returns null without fills.
 * @throws {DomainError} as the functions it composes.
 */
export function entryProcess(
  question: MarketQuestion & {
    readonly forecast: Forecast;
    readonly fills: readonly Fill[];
    readonly marks: ReadonlyMap<string, FillMarks>;
    readonly sealedAt: string;
  },
): EntryProcess | null {
  const { input, fills, sealedAt } = question;
  const isBefore = isSealedBeforeFill(sealedAt, fills);
  if (isBefore === null) return null;
  const plan = { symbol: input.underlying.symbol, multiplier: input.underlying.multiplier, legs: input.legs };
  const size = sizeWithinPlan(plan, fills);
  const limit = entryWithinLimit({ ...plan, allowance: '0' }, fills);
  const isClosed = isFlat(fills);
  const tag = isClosed ? lastExit(question) : null;
  return {
    isSealedBeforeFill: isBefore,
    size,
    limit,
    exitTag: tag,
    isFollowed:
      !isClosed || tag === null
        ? null
        : isPlanFollowed({
            isSealedBeforeFill: isBefore,
            isSizeWithinPlan: size.isWithin,
            isEntryWithinLimit: limit?.isWithin ?? null,
            exitTag: tag,
          }),
  };
}

/** By which rule the last fill left the position; null while the price that tells is not there. */
function lastExit(question: Parameters<typeof entryProcess>[0]): ExitTag | null {
  const { input, forecast, fills, marks, calendar } = question;
  const options = fills.filter(({ instrument }) => instrument.kind === 'option');
  const last = options.reduce<Fill | null>(
    (latest, fill) => (latest === null || fill.tradedAt >= latest.tradedAt ? fill : latest),
    null,
  );
  const exitSession = calendar.sessionOn(forecast.exitSessionDate);
  const expiry = calendar.sessionOn(forecast.expirySessionDate);
  if (last === null || exitSession === null || expiry === null) return null;
  const seen = underlyingAt(question, last.tradedAt, marks.get(last.id)?.underlyingPrice ?? null);
  const hasLevels = input.targetPrice !== null || input.stopPrice !== null;
  if (seen === null && hasLevels) return null;
  return exitTag(
    {
      kind: last.kind,
      at: last.tradedAt,
      underlyingPrice: seen === null ? null : String(seen.price),
      netPrice: null,
    },
    {
      target: ruleAt(input, input.targetPrice),
      stop: ruleAt(input, input.stopPrice),
      time: input.holding.kind === 'toExpiry' ? null : { from: exitSession.opensAt, to: exitSession.closesAt },
      event: null,
      expiryOpensAt: expiry.opensAt,
    },
  );
}

function ruleAt({ spot }: ForecastInput, level: string | null): ExitRule | null {
  if (level === null) return null;
  const isAbove = toDecimal(level).greaterThan(toDecimal(spot.price));
  return {
    basis: 'underlying',
    level,
    heldWhen: isAbove ? 'at-or-above' : 'at-or-below',
    startLevel: spot.price,
  };
}
