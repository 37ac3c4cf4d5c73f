import { type DecimalText, toDecimal } from '@/journal/money/decimal';
import { type ExitTag } from '@/journal/process/exit-rule';
import { sampleSizeRule, type SampleRule } from '@/journal/scoring/sample-size-rule';
import { wilsonInterval } from '@/journal/scoring/wilson-interval';
import { instantMilliseconds } from '@/journal/sessions/instant';

/** The marks of process of one entry, kept apart from its result; null where nothing can be said. */
export interface ProcessMarks {
  readonly isSealedBeforeFill: boolean | null;
  readonly isSizeWithinPlan: boolean | null;
  readonly isEntryWithinLimit: boolean | null;
  /** Null while the position is open. */
  readonly exitTag: ExitTag | null;
}

/** A plan is followed when no mark says otherwise. */
export function isPlanFollowed(marks: ProcessMarks): boolean {
  const { isSealedBeforeFill, isSizeWithinPlan, isEntryWithinLimit, exitTag } = marks;
  const isBroken = [isSealedBeforeFill, isSizeWithinPlan, isEntryWithinLimit].includes(false);
  return !isBroken && exitTag !== 'unplanned';
}

/**
 * Whether the forecast was sealed no later than the first fill.
 * @returns null without fills.
 * @throws {DomainError} `instant-invalid`.
 */
export function isSealedBeforeFill(sealedAt: string, fills: readonly { readonly tradedAt: string }[]): boolean | null {
  const sealed = instantMilliseconds(sealedAt);
  if (fills.length === 0) return null;
  return fills.every(({ tradedAt }) => sealed <= instantMilliseconds(tradedAt));
}

export interface JudgedEntry {
  readonly isFollowed: boolean;
  /** After fees, decimal text. */
  readonly realisedProfit: DecimalText;
}

/** Plan followed or not, by result: good is a profit above 0. */
export interface ProcessTable {
  readonly followedGood: number;
  readonly followedBad: number;
  readonly leftGood: number;
  readonly leftBad: number;
}

/** Counts entries by process and result. @throws {DomainError} `decimal-invalid`. */
export function processTable(entries: readonly JudgedEntry[]): ProcessTable {
  const count = (isFollowed: boolean, isGood: boolean) =>
    entries.filter(
      (entry) => entry.isFollowed === isFollowed && toDecimal(entry.realisedProfit).greaterThan(0) === isGood,
    ).length;
  return {
    followedGood: count(true, true),
    followedBad: count(true, false),
    leftGood: count(false, true),
    leftBad: count(false, false),
  };
}

export interface AdherenceRate {
  readonly followed: number;
  readonly count: number;
  /** Below 20 entries the rate is not to be shown. */
  readonly sampleRule: SampleRule;
  /** Followed of all with its interval; null without entries. */
  readonly rate: { readonly share: number; readonly low: number; readonly high: number } | null;
}

/**
 * How often plans were followed.
 * @param confidence above 0 and below 1; 0.95 by default.
 * @throws {DomainError} `confidence-invalid`.
 * @see wilsonInterval, sampleSizeRule.
 */
export function adherenceRate(entries: readonly Pick<JudgedEntry, 'isFollowed'>[], confidence = 0.95): AdherenceRate {
  const count = entries.length;
  const followed = entries.filter(({ isFollowed }) => isFollowed).length;
  return {
    followed,
    count,
    sampleRule: sampleSizeRule(count),
    rate: count === 0 ? null : { share: followed / count, ...wilsonInterval({ hits: followed, count, confidence }) },
  };
}
