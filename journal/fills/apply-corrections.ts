import { DomainError } from '@/journal/errors/domain-error';
import { type AppliedCorrections, type ExecutionRow, type JudgedRow } from '@/journal/fills/execution-row';
import { type Fill } from '@/journal/fills/fill';
import { fingerprintOf } from '@/journal/fills/fill-identity';
import { toDecimal, toDecimalText } from '@/journal/money/decimal';

/** One execution through its corrections. */
interface Chain {
  readonly tradedAt: string;
  readonly sequence: number;
  /** The row that counts, or null once busted. */
  head: { readonly index: number; readonly fill: Fill } | null;
}

/**
 * Applies corrections and busts to a record of executions: a correction takes the place and the time of the trade it corrects, a
 * bust removes it, and both leave the old row in the list with a link. A row with an id that was there before is a duplicate when
 * it says the same. Nothing is dropped and nothing guessed: what cannot be applied is listed as such.
 * @param rows in source order. A correction or bust may stand before the row it refers to; several that refer to one execution act
 *   in the order of their own times, then sequences.
 * @throws {DomainError} `trade-time-invalid` for a row whose time is no instant; `decimal-invalid`.
 * @see FIX execution reports (ExecID, ExecRefID; correction and bust): a reference names the row before it in the chain.
 */
export function applyCorrections(rows: readonly ExecutionRow[]): AppliedCorrections {
  const judged: JudgedRow[] = rows.map((row) => ({ row, state: 'unresolved', linkedId: null }));
  const judge = (index: number, state: JudgedRow['state'], linkedId: string | null) => {
    const row = rows[index];
    if (row !== undefined) judged[index] = { row, state, linkedId };
  };
  const distinct = distinctRows(rows, judge);
  const chains = new Map<string, Chain>();
  for (const { row, index } of distinct) {
    if (row.kind !== 'trade') continue;
    const { fill } = row;
    chains.set(fill.id, { tradedAt: fill.tradedAt, sequence: fill.sequence, head: { index, fill } });
    judge(index, 'effective', null);
  }
  let waiting = inOrderOfReport(distinct.filter(({ row }) => row.kind !== 'trade'));
  // A reference may name a correction that comes later in the list, so the rest is tried again while anything changes.
  for (let before = -1; waiting.length !== before;) {
    before = waiting.length;
    waiting = waiting.filter((placed) => !act(placed, chains, judge));
  }
  const effective = [...new Set(chains.values())].flatMap(({ head, tradedAt, sequence }) =>
    head === null ? [] : [{ ...head.fill, tradedAt, sequence }],
  );
  effective.sort(
    (one, other) => Date.parse(one.tradedAt) - Date.parse(other.tradedAt) || one.sequence - other.sequence,
  );
  return { effective, rows: judged };
}

interface PlacedRow {
  readonly row: ExecutionRow;
  readonly index: number;
}
type Judge = (index: number, state: JudgedRow['state'], linkedId: string | null) => void;

/** Acts on the chain a row refers to; false when there is none yet. */
function act({ row, index }: PlacedRow, chains: Map<string, Chain>, judge: Judge): boolean {
  if (row.kind === 'trade') return true;
  const chain = chains.get(row.kind === 'bust' ? row.busts : row.corrects);
  if (chain === undefined) return false;
  const { head } = chain;
  // What was busted cannot be corrected or busted again.
  if (head === null) return true;
  if (row.kind === 'bust') {
    judge(head.index, 'busted', row.id);
    judge(index, 'bust', head.fill.id);
    chain.head = null;
    return true;
  }
  judge(head.index, 'corrected', row.fill.id);
  judge(index, 'effective', head.fill.id);
  chain.head = { index, fill: row.fill };
  chains.set(row.fill.id, chain);
  return true;
}

/** Rows under ids of their own; those that come again are judged on the spot. */
function distinctRows(rows: readonly ExecutionRow[], judge: Judge): PlacedRow[] {
  const seen = new Map<string, string>();
  return rows.flatMap((row, index) => {
    const id = idOf(row);
    if (!Number.isFinite(Date.parse(reportOf(row).at))) {
      throw new DomainError('trade-time-invalid', { fillId: id, tradedAt: reportOf(row).at });
    }
    const known = seen.get(id);
    if (known !== undefined) {
      judge(index, known === sayingOf(row) ? 'duplicate' : 'conflict', id);
      return [];
    }
    seen.set(id, sayingOf(row));
    return [{ row, index }];
  });
}

function inOrderOfReport(rows: readonly PlacedRow[]): PlacedRow[] {
  return [...rows].sort((one, other) => {
    const [first, second] = [reportOf(one.row), reportOf(other.row)];
    return Date.parse(first.at) - Date.parse(second.at) || first.sequence - second.sequence || one.index - other.index;
  });
}

function idOf(row: ExecutionRow): string {
  return row.kind === 'bust' ? row.id : row.fill.id;
}

function reportOf(row: ExecutionRow): { at: string; sequence: number } {
  return row.kind === 'bust'
    ? { at: row.reportedAt, sequence: row.sequence }
    : { at: row.fill.tradedAt, sequence: row.fill.sequence };
}

/** Equal for rows that say the same; their place in a file is no part of it. */
function sayingOf(row: ExecutionRow): string {
  if (row.kind === 'bust') return JSON.stringify([row.busts, row.reportedAt]);
  const corrects = row.kind === 'correction' ? row.corrects : null;
  return JSON.stringify([corrects, fingerprintOf(row.fill), toDecimalText(toDecimal(row.fill.fees))]);
}
