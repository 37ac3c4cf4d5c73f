import { createHash, createHmac, randomBytes } from 'node:crypto';

/** A new secret of 256 bits, as text that can stand in an address. */
export function newSecret(): string {
  return randomBytes(32).toString('base64url');
}

/** 16 random bytes in hexadecimal: the salt of a seal. */
export function newSalt(): string {
  return randomBytes(16).toString('hex');
}

/** What is stored of a secret: enough to recognise it, not to use it. */
export function secretDigest(secret: string): string {
  return createHash('sha256').update(secret, 'utf8').digest('hex');
}

/** A password made long-proof and useless without the pepper: bcrypt itself cuts at 72 bytes. */
export function pepperedPassword(password: string, pepper: string): string {
  return createHmac('sha384', pepper).update(password, 'utf8').digest('base64');
}
