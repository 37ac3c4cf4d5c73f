import { type SpeedRow } from '@/tests/bench/compare-speed';

/** Prints the one line of JSON that scripts/bench.mjs reads. `aim` is the ratio wanted of the first contender. */
export function reportSpeed(report: {
  readonly title: string;
  readonly aim: number;
  readonly rows: readonly SpeedRow[];
}): void {
  console.log(JSON.stringify(report));
}

/** Says instead why nothing could be measured here. */
export function reportSkipped(report: { readonly title: string; readonly skipped: string }): void {
  console.log(JSON.stringify(report));
}
