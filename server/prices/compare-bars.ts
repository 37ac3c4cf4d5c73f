import { rangeProblem, type FileBar } from '@/server/prices/reading/read-bars';

export interface BarPrices {
  readonly close: string;
  readonly open: string | null;
  readonly high: string | null;
  readonly low: string | null;
}

export interface ComparedBars {
  /** Bars to write: new ones and changed ones, each as it shall stand. */
  readonly writes: { readonly sessionDate: string; readonly prices: BarPrices }[];
  readonly added: number;
  readonly unchanged: number;
  readonly changes: { row: number; sessionDate: string; from: string; to: string }[];
}

/** What shall stand: a price the file leaves out stays while the close stays; a new close takes the old range with it. */
function mergedPrices(bar: FileBar, stored: BarPrices | undefined): BarPrices {
  const own = { close: bar.close, open: bar.open, high: bar.high, low: bar.low };
  if (stored === undefined || stored.close !== bar.close) return own;
  const merged = {
    close: bar.close,
    open: bar.open ?? stored.open,
    high: bar.high ?? stored.high,
    low: bar.low ?? stored.low,
  };
  return rangeProblem(merged) === null ? merged : own;
}

const describeOthers = ({ open, high, low }: BarPrices): string =>
  `open ${open ?? 'none'}, high ${high ?? 'none'}, low ${low ?? 'none'}`;

/** Compares the bars of a file with those the desk keeps; prices are compared in their one plain spelling. */
export function compareBars(bars: readonly FileBar[], storedByDate: ReadonlyMap<string, BarPrices>): ComparedBars {
  const writes: ComparedBars['writes'] = [];
  const changes: ComparedBars['changes'] = [];
  let added = 0;
  let unchanged = 0;
  for (const bar of bars) {
    const { row, sessionDate } = bar;
    const stored = storedByDate.get(sessionDate);
    const prices = mergedPrices(bar, stored);
    if (stored === undefined) {
      added += 1;
    } else if (stored.close !== prices.close) {
      changes.push({ row, sessionDate, from: stored.close, to: prices.close });
    } else if (describeOthers(stored) !== describeOthers(prices)) {
      changes.push({ row, sessionDate, from: describeOthers(stored), to: describeOthers(prices) });
    } else {
      unchanged += 1;
      continue;
    }
    writes.push({ sessionDate, prices });
  }
  return { writes, added, unchanged, changes };
}
