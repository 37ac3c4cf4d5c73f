export interface Contender {
  readonly name: string;
  /** Does its work `count` times and returns a number made of every result, so that none can be left out. */
  readonly work: (count: number) => number;
}

/** A process of its own that times itself, once a round. */
export interface TimedElsewhere {
  readonly name: string;
  readonly measurePerSecond: () => number;
}

export interface SpeedRow {
  readonly name: string;
  readonly perSecond: number;
  /** How many times as fast as the baseline, by the medians of rounds that alternate. */
  readonly ratio: number;
}

const ROUNDS = 15;
const ROUND_MILLISECONDS = 60;

/**
 * Measures contenders against a baseline in one run. Rounds alternate between all of them, so that a slow moment of the machine
 * falls on each alike, and medians are compared.
 */
export function compareSpeed(baseline: Contender | TimedElsewhere, contenders: readonly Contender[]): SpeedRow[] {
  const measured = [baseline, ...contenders].map((contender) => ({
    contender,
    measure: measureOf(contender),
    rates: [] as number[],
  }));
  for (let round = 0; round < ROUNDS; round += 1) {
    for (const { measure, rates } of measured) rates.push(measure());
  }
  const [slow, ...rest] = measured.map(({ contender, rates }) => ({
    name: contender.name,
    perSecond: median(rates),
  }));
  if (slow === undefined) throw new Error('nothing was measured');
  return [slow, ...rest].map((row) => ({
    ...row,
    ratio: row.perSecond / slow.perSecond,
  }));
}

function measureOf(contender: Contender | TimedElsewhere): () => number {
  if ('measurePerSecond' in contender) return contender.measurePerSecond;
  const count = countForRound(contender);
  return () => (count * 1000) / timeOf(() => contender.work(count));
}

/** Doubles the count until a round takes long enough to be timed; this also warms the code up. */
function countForRound({ work }: Contender): number {
  for (let count = 1; ; count *= 2) {
    const milliseconds = timeOf(() => work(count));
    if (milliseconds >= ROUND_MILLISECONDS) return Math.ceil((count * ROUND_MILLISECONDS) / milliseconds);
  }
}

function timeOf(work: () => number): number {
  const start = performance.now();
  const result = work();
  const milliseconds = performance.now() - start;
  if (Number.isNaN(result)) throw new Error('a contender returned NaN');
  return milliseconds;
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((left, right) => left - right);
  return sorted[Math.floor(sorted.length / 2)] ?? NaN;
}
