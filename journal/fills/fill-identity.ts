import { DomainError } from '@/journal/errors/domain-error';
import { type Fill } from '@/journal/fills/fill';
import { instrumentKey } from '@/journal/fills/instrument-key';
import { type DecimalText, toDecimal, toDecimalText } from '@/journal/money/decimal';

/** What a row of a file says of an execution, as far as it tells it from others. */
export interface IdentifiedRow {
  readonly account: string;
  /** The broker's own id of the execution; null where the file has none. */
  readonly executionId: string | null;
  readonly fill: Pick<Fill, 'kind' | 'instrument' | 'quantity' | 'price' | 'tradedAt'>;
}

/**
 * The identity of each row, so that the same file read twice adds nothing: account and execution id where there is one; else what
 * the row says (contract, side, quantity, price, time) with its running number among the rows of the file that say the same, since
 * two equal partial fills can be genuine.
 * @param rows of one file, in its order.
 * @returns one text a row, in the same order; equal texts mean the same execution. Not meant to be read.
 * @throws {DomainError} `account-missing`, `execution-id-missing` for an empty text, `decimal-invalid`, `trade-time-invalid`.
 * @see common practice; ExecID of the FIX protocol is unique within an account and day.
 */
export function fillIdentities(rows: readonly IdentifiedRow[]): string[] {
  const counts = new Map<string, number>();
  return rows.map(({ account, executionId, fill }) => {
    if (account === '') throw new DomainError('account-missing');
    if (executionId === '') throw new DomainError('execution-id-missing', { account });
    if (executionId !== null) return JSON.stringify(['execution', account, executionId]);
    const saying = JSON.stringify([account, fingerprintOf(fill)]);
    const number = (counts.get(saying) ?? 0) + 1;
    counts.set(saying, number);
    return JSON.stringify(['row', account, fingerprintOf(fill), number]);
  });
}

/** Equal for fills that say the same, however their decimals and instants are written. @throws {DomainError} as fillIdentities. */
export function fingerprintOf({ kind, instrument, quantity, price, tradedAt }: IdentifiedRow['fill']): string {
  const time = Date.parse(tradedAt);
  if (!Number.isFinite(time)) throw new DomainError('trade-time-invalid', { tradedAt });
  return [instrumentKey(instrument), kind, plain(quantity), plain(price), new Date(time).toISOString()].join(' ');
}

function plain(text: DecimalText): DecimalText {
  return toDecimalText(toDecimal(text));
}
