/** Words that make a long password easy to guess when little else is in it. */
const easyParts = [
  'password',
  'passwort',
  'motdepasse',
  'letmein',
  'welcome',
  'qwertyuiop',
  'qwertzuiop',
  'azertyuiop',
  'asdfghjkl',
  'zxcvbnm',
  'iloveyou',
  'administrator',
  'trustno',
  'football',
  'baseball',
  'sunshine',
  'princess',
  'superman',
  'brierbook',
  'options',
  'trading',
];
const sequences = ['abcdefghijklmnopqrstuvwxyz', '01234567890123456789', 'qwertyuiopasdfghjklzxcvbnm'];
const FEWEST_LEFT = 8;

/**
 * Why a new password is too easy to guess, or null: too little is left of it once repetitions, rows of keys, well-known
 * words and the person's own name and address are taken out.
 * @param own texts about the person: name, e-mail.
 */
export function passwordWeakness(password: string, own: readonly string[]): string | null {
  const folded = password.normalize('NFKC').toLowerCase();
  const ownParts = own
    .flatMap((text) => text.toLowerCase().split(/[^\p{L}\p{N}]+/u))
    .filter((part) => part.length >= 4);
  let left = folded.replace(/[^\p{L}\p{N}]/gu, '');
  const hasOwn = ownParts.some((part) => left.includes(part));
  for (const part of [...easyParts, ...ownParts]) left = left.replaceAll(part, '');
  for (const row of sequences) left = withoutRuns(left, row);
  const distinct = new Set(left).size;
  if (left.length >= FEWEST_LEFT && distinct >= 5) return null;
  return hasOwn
    ? 'This password is mostly your own name or address. Choose words that nobody connects with you.'
    : 'This password is among the easiest to guess. Choose a few words that do not belong together.';
}

/** Takes out runs of four and more neighbours of a row, forwards and backwards. */
function withoutRuns(text: string, row: string): string {
  const backwards = [...row].reverse().join('');
  let result = text;
  for (const line of [row, backwards]) {
    for (let length = Math.min(line.length, 26); length >= 4; length -= 1) {
      for (let start = 0; start + length <= line.length; start += 1)
        result = result.replaceAll(line.slice(start, start + length), '');
    }
  }
  return result;
}
