import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { DomainError } from '@/journal/errors/domain-error';

const core = path.resolve(__dirname, '../../../journal');

/** The error codes that docstrings of the core name. */
export const documentedCodes: ReadonlySet<string> = new Set(
  readdirSync(core, { recursive: true, encoding: 'utf8' })
    .filter((file) => file.endsWith('.ts'))
    .flatMap((file) => readFileSync(path.join(core, file), 'utf8').match(/\/\*\*[\s\S]*?\*\//g) ?? [])
    .filter((comment) => comment.includes('@throws'))
    .flatMap((comment) => [...comment.matchAll(/`([a-z0-9]+(?:-[a-z0-9]+)*)`/g)].map(([, code]) => code ?? '')),
);

/** How a call went: it answered with numbers, refused with an error that is announced, or did what it must not, in words. */
export type Verdict = { readonly kind: 'answered' | 'refused' } | { readonly kind: 'flawed'; readonly flaw: string };

export function verdictOn(call: () => unknown): Verdict {
  try {
    const where = findNaN(call(), 'answer', 0);
    return where === null ? { kind: 'answered' } : { kind: 'flawed', flaw: `NaN in ${where}` };
  } catch (error) {
    if (!(error instanceof DomainError))
      return { kind: 'flawed', flaw: error instanceof Error ? (error.stack ?? error.message) : String(error) };
    return documentedCodes.has(error.code)
      ? { kind: 'refused' }
      : { kind: 'flawed', flaw: `the code ${error.code} stands in no docstring` };
  }
}

const DEEPEST = 8;

function findNaN(value: unknown, where: string, depth: number): string | null {
  if (typeof value === 'number') return Number.isNaN(value) ? where : null;
  if (typeof value !== 'object' || value === null || depth > DEEPEST) return null;
  if (value instanceof Float64Array) return value.some(Number.isNaN) ? where : null;
  for (const [key, item] of Object.entries(value)) {
    const found = findNaN(item, `${where}.${key}`, depth + 1);
    if (found !== null) return found;
  }
  return null;
}
