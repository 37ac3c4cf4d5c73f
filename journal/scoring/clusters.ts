import { DomainError } from '@/journal/errors/domain-error';

/** What makes two forecasts dependent: the same underlying over the same days. */
export interface ForecastSpan {
  readonly underlying: string;
  /** First and last session the forecast looks over, 'YYYY-MM-DD'. */
  readonly from: string;
  readonly through: string;
}

interface Chain {
  readonly underlying: string;
  readonly through: string;
  /** The forecast the chain began with. */
  readonly head: number;
}

/**
 * Puts forecasts that share an underlying and a session into one cluster; chains of overlaps belong together.
 * @returns the number of each forecast's cluster, from 0 in the order of first appearance.
 * @throws {DomainError} `span-invalid` with the index.
 * @see Common practice: overlapping trades on one underlying are not independent.
 */
export function overlapClusters(spans: readonly ForecastSpan[]): number[] {
  for (const [index, { from, through }] of spans.entries()) {
    if (!(from <= through)) throw new DomainError('span-invalid', { index, from, through });
  }
  const byStart = spans
    .map((span, index) => ({ span, index }))
    .sort(
      (one, other) =>
        compareTexts(one.span.underlying, other.span.underlying) || compareTexts(one.span.from, other.span.from),
    );
  const heads = new Array<number>(spans.length).fill(0);
  let chain: Chain | undefined;
  for (const { span, index } of byStart) {
    if (chain === undefined || chain.underlying !== span.underlying || span.from > chain.through) {
      chain = { underlying: span.underlying, through: span.through, head: index };
    } else if (span.through > chain.through) {
      chain = { ...chain, through: span.through };
    }
    heads[index] = chain.head;
  }
  const numbers = new Map<number, number>();
  return heads.map((head) => {
    const number = numbers.get(head) ?? numbers.size;
    numbers.set(head, number);
    return number;
  });
}

function compareTexts(one: string, other: string): number {
  if (one === other) return 0;
  return one < other ? -1 : 1;
}

/**
 * Gathers values by cluster.
 * @param clusters one label a value.
 * @throws {DomainError} `clusters-not-matching`, `values-missing`.
 */
export function byCluster<Value>(values: readonly Value[], clusters: readonly number[]): Value[][] {
  if (values.length === 0) throw new DomainError('values-missing');
  if (values.length !== clusters.length) {
    throw new DomainError('clusters-not-matching', { values: values.length, clusters: clusters.length });
  }
  const groups = new Map<number, Value[]>();
  for (const [index, value] of values.entries()) {
    const label = clusters[index] ?? 0;
    const group = groups.get(label);
    if (group === undefined) groups.set(label, [value]);
    else group.push(value);
  }
  return [...groups.values()];
}
