import { spawn, spawnSync } from 'node:child_process';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';

const root = path.resolve(__dirname, '../..');

function engine(command: string, lines: readonly string[]) {
  const { stdout, stderr, status } = spawnSync(
    process.execPath,
    [path.join(root, 'scripts/run-ts.mjs'), 'server/cli/engine.ts', command],
    { cwd: root, input: lines.map((line) => `${line}\n`).join(''), encoding: 'utf8', maxBuffer: 2 ** 26 },
  );
  return { answers: stdout.split('\n').slice(0, -1), stderr, status };
}

const option = { type: 'call', spot: 100, sessions: 10, years: 0.04, ratePerYear: 0.04, dailyVolatility: 0.015 };
const optionLine = (strike: number) => JSON.stringify({ ...option, strike });

describe('engine command line', () => {
  it('answers thousands of lines one by one in order and ends with status 0', () => {
    const strikes = Array.from({ length: 5000 }, (_, index) => 90 + index / 250);
    const { answers, status } = engine('price', strikes.map(optionLine));
    expect(status).toBe(0);
    const prices = answers.map((answer) => Number(JSON.parse(answer).price));
    expect(prices).toHaveLength(strikes.length);
    expect(prices.every((price, index) => price < (prices[index - 1] ?? Infinity))).toBe(true);
  });

  it('answers a bad line with an error in its place, the others as ever, and ends with status 1', () => {
    const { answers, status } = engine('price', [optionLine(100), 'not JSON', optionLine(102), optionLine(-1)]);
    expect(status).toBe(1);
    const results = answers.map((answer) => JSON.parse(answer));
    expect(results.map(({ error }) => error && [error.code, error.line])).toEqual([
      undefined,
      ['json-invalid', 2],
      undefined,
      ['option-input-invalid', 4],
    ]);
    expect(results[0].price).toBeGreaterThan(results[2].price);
  });

  it('names its commands and ends with status 2 for one it does not know', () => {
    const { answers, stderr, status } = engine('guess', []);
    expect(status).toBe(2);
    expect(answers).toEqual([]);
    expect(stderr).toContain('price|implied|volatility');
  });

  it('answers 200,000 cases in a heap that could not hold them', async () => {
    const count = 200_000;
    const child = spawn(process.execPath, ['--import', 'tsx', 'server/cli/engine.ts', 'price'], {
      cwd: root,
      env: { ...process.env, TSX_TSCONFIG_PATH: 'server/tsconfig.json', NODE_OPTIONS: '--max-old-space-size=64' },
      stdio: ['pipe', 'pipe', 'inherit'],
    });
    const ended = new Promise<number | null>((resolve) => child.once('exit', resolve));
    const cases = function* () {
      for (let index = 0; index < count; index += 1) yield `${optionLine(90 + index / count)}\n`;
    };
    const fed = pipeline(Readable.from(cases()), child.stdin);
    let answered = 0;
    for await (const answer of createInterface({ input: child.stdout }))
      if (answer.startsWith('{"price":')) answered += 1;
    await fed;
    expect([await ended, answered]).toEqual([0, count]);
  }, 120_000);
});
