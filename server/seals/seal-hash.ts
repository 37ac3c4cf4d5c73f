import { createHash } from 'node:crypto';

const TAG = 'brierbook-seal';
const VERSION = 1;
/** What the first seal of a chain follows. */
export const firstPreviousHash = '0'.repeat(64);

export interface SealPlace {
  readonly deskId: string;
  readonly traderId: string;
  /** Place in the trader's chain, from 1. */
  readonly sequence: number;
  /** Hexadecimal hash of the seal before. */
  readonly previousHash: string;
  readonly sealedAtMicroseconds: bigint;
}

/** SHA-256 (FIPS 180-4) of salt and text: says what was sealed without telling it once salt and text are erased. */
export function commitmentOf(saltHex: string, canonicalText: string): string {
  return createHash('sha256').update(Buffer.from(saltHex, 'hex')).update(canonicalText, 'utf8').digest('hex');
}

/**
 * The hash that chains a seal to the one before: SHA-256 over fields of fixed width, so that no two different
 * seals give the same bytes: tag, version (1), desk (16), trader (16), sequence (8), previous (32), time (8), commitment (32).
 */
export function sealHash(place: SealPlace, commitment: string): string {
  const numbers = Buffer.alloc(8);
  numbers.writeBigUInt64BE(BigInt(place.sequence));
  const time = Buffer.alloc(8);
  time.writeBigUInt64BE(place.sealedAtMicroseconds);
  return createHash('sha256')
    .update(TAG, 'utf8')
    .update(Buffer.from([VERSION]))
    .update(uuidBytes(place.deskId))
    .update(uuidBytes(place.traderId))
    .update(numbers)
    .update(Buffer.from(place.previousHash, 'hex'))
    .update(time)
    .update(Buffer.from(commitment, 'hex'))
    .digest('hex');
}

function uuidBytes(id: string): Buffer {
  const bytes = Buffer.from(id.replaceAll('-', ''), 'hex');
  if (bytes.length !== 16) throw new TypeError('A seal names desk and trader by UUID.');
  return bytes;
}
