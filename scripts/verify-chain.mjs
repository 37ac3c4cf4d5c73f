// Checks seal chains. Written apart from the server on purpose: it shares no code with what it checks.
import { createHash } from 'node:crypto';

const sha256 = (...parts) => {
  const hash = createHash('sha256');
  for (const part of parts) hash.update(part);
  return hash.digest();
};
const uint64 = (value) => {
  const hex = BigInt(value).toString(16).padStart(16, '0');
  return Buffer.from(hex, 'hex');
};
const bytesOfUuid = (id) => Buffer.from(id.split('-').join(''), 'hex');

/** RFC 8785 for the values a seal holds: objects, lists, text, true, false, null (numbers stand as text). */
const rewrite = (value) => {
  if (Array.isArray(value)) return `[${value.map(rewrite).join(',')}]`;
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  const keys = Object.keys(value).sort(); // by UTF-16 code unit, as RFC 8785 asks
  return `{${keys.map((key) => `${JSON.stringify(key)}:${rewrite(value[key])}`).join(',')}}`;
};

/**
 * @param seals rows of one trader's chain, by sequence: { deskId, traderId, sequence, previousHash, hash, commitment,
 *   sealedAtMicroseconds, salt, payload } with salt and payload null once erased
 * @returns the findings, empty when the chain holds: { sequence, finding }
 */
export function verifyChain(seals) {
  const findings = [];
  let previousHash = '0'.repeat(64);
  let due = 1;
  for (const seal of seals) {
    const report = (finding) => findings.push({ sequence: Number(seal.sequence), finding });
    if (Number(seal.sequence) !== due) report(`number ${due} is missing or out of order`);
    if (seal.previousHash !== previousHash) report('does not follow the seal before it');
    if (seal.payload !== null && seal.salt !== null) {
      const commitment = sha256(Buffer.from(seal.salt, 'hex'), Buffer.from(seal.payload, 'utf8')).toString('hex');
      if (commitment !== seal.commitment) report('the sealed content was changed');
      if (!isCanonical(seal.payload)) report('the sealed content is not in canonical form');
    }
    const hash = sha256(
      Buffer.from('brierbook-seal', 'utf8'),
      Buffer.of(1),
      bytesOfUuid(seal.deskId),
      bytesOfUuid(seal.traderId),
      uint64(seal.sequence),
      Buffer.from(seal.previousHash, 'hex'),
      uint64(seal.sealedAtMicroseconds),
      Buffer.from(seal.commitment, 'hex'),
    ).toString('hex');
    if (hash !== seal.hash) report('desk, trader, number, time or content was changed');
    previousHash = seal.hash;
    due = Number(seal.sequence) + 1;
  }
  return findings;
}

function isCanonical(text) {
  try {
    return rewrite(JSON.parse(text)) === text && text.normalize('NFC') === text;
  } catch {
    return false; // JSON.parse throws on what is not JSON, so it is not canonical either
  }
}
