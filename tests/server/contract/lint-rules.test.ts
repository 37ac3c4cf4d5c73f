import { ESLint, type Linter } from 'eslint';

// Handed over, since jest cannot load a configuration the way the command line does.
const overrideConfig: Linter.Config[] = jest.requireActual('@/eslint.config.js');
// Under CI the parser takes it that each file is read once, from the disk, and would give these texts the types of the file's own.
const readsTextsAnew: Linter.Config = {
  files: ['**/*.ts'],
  languageOptions: { parserOptions: { disallowAutomaticSingleRunInference: true } },
};
const eslint = new ESLint({ overrideConfigFile: true, overrideConfig: [...overrideConfig, readsTextsAnew] });

const LOADING_MS = 120_000;
beforeAll(async () => {
  await problemsOf('server/today/today-service.ts', ['export {};']); // reads all types once
}, LOADING_MS);

/** Lints a text as if it stood in that file. */
async function problemsOf(filePath: string, lines: readonly string[]): Promise<string[]> {
  const [result] = await eslint.lintText(`${lines.join('\n')}\n`, { filePath }).catch((cause: unknown) => {
    // A rule that fails throws an error that holds the syntax tree, which jest cannot pass on: keep its words.
    throw new Error(cause instanceof Error ? cause.message : String(cause));
  });
  return (result?.messages ?? [])
    .filter(({ ruleId }) => ruleId?.includes('restricted'))
    .map(({ line, message }) => `${line}: ${message}`);
}

describe('lint in a service of the server', () => {
  const service = 'server/today/today-service.ts';

  it.each([
    ['takes the mapper’s classes', "import { DataSource } from 'typeorm';\nexport const x = DataSource;", /DeskScope/],
    ['makes routes of its own', "import { Router } from 'express';\nexport const x = Router();", /mount-endpoints/],
    ['saves an object', 'export const f = (m: { save(x: object): void }) => m.save({});', /overwrites whichever row/],
    ['reaches for a repository', 'export const f = (d: { getRepository(): void }) => d.getRepository();', /DeskScope/],
    [
      'finds by a computed condition',
      'export const f = (d: { findOneBy(w: object): void }, w: object) => d.findOneBy(w);',
      /any row/,
    ],
    [
      'finds by an empty list of conditions it was given',
      'export const f = (d: { findBy(w: object[]): void }, w: object[]) => d.findBy(w);',
      /any row/,
    ],
    [
      'adds an alternative beside the desk',
      "export const f = (q: { orWhere(t: string): void }) => q.orWhere('1');",
      /leaves the desk/,
    ],
    [
      'writes a value into a statement',
      'export const f = (d: { query(t: string): void }, x: string) => d.query(`SELECT ${x}`);',
      /parameters/,
    ],
    [
      'removes without a condition',
      'export const f = (q: { delete(): { execute(): void } }) => q.delete().execute();',
      /every row/,
    ],
    ['reads the clock', 'export const x = Date.now();', /clock/],
    ['makes today’s date', 'export const x = new Date();', /clock/],
    ['throws dice', 'export const x = Math.random();', /seeded source/],
    ['takes from the client', "import '@/hooks/client/api-client';", /server\/ may import only from/],
  ])('refuses code that %s', async (_, text, message) => {
    expect(await problemsOf(service, text.split('\n'))).toEqual([expect.stringMatching(message)]);
  });

  it('lets the same be done within bounds', async () => {
    const bounded = [
      "import { Brackets, type DataSource } from 'typeorm';",
      "export const either = new Brackets((part) => part.where('a = 1').orWhere('b = 2'));",
      'export const one = (d: { findOneBy(w: object): void }, id: string) => d.findOneBy({ id });',
      "export const ask = (d: DataSource) => d.query('SELECT ?', [1]);",
      'export const then = new Date(0);',
    ];
    expect(await problemsOf(service, bounded)).toEqual([]);
  });
});

describe('lint in the core', () => {
  it.each([
    ['the clock', 'export const x = Date.now();'],
    ['today', 'export const x = new Date();'],
    ['chance', 'export const x = Math.random();'],
    ['files', "import 'node:fs';"],
    ['the server', "import '@/server/runtime/clock';"],
  ])('refuses %s', async (_, text) => {
    expect(await problemsOf('journal/money/decimal.ts', [text])).not.toEqual([]);
  });
});
