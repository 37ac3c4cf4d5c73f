import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { garchReturns } from '@/tests/journal/volatility-forecast/invented-series';

const root = path.resolve(__dirname, '../..');
const folder = mkdtempSync(path.join(tmpdir(), 'skill-'));
afterAll(() => rmSync(folder, { recursive: true }));

let close = 100;
const closes = garchReturns(535, 21, { deviation: 0.01, reaction: 0.08, persistence: 0.97, degrees: 6 }).map(
  (value) => (close *= Math.exp(value)),
);

function skill(rows: readonly string[], header = '# invented\n# two lines\nsession,time,JQVO') {
  const file = path.join(folder, 'closes.csv');
  writeFileSync(file, `${[header, ...rows].join('\n')}\n`);
  return spawnSync(process.execPath, [path.join(root, 'scripts/run-ts.mjs'), 'server/cli/skill.ts', '--json', file], {
    cwd: root,
    encoding: 'utf8',
  });
}

const rowsOf = (values: readonly (number | string)[]) =>
  values.map((value, index) => `${index},${index / 260},${value}`);

it('prints an object a line for each series, horizon and method, and one method is the default', () => {
  const { stdout, status, stderr } = skill(rowsOf(closes));
  expect(stderr).toBe('');
  expect(status).toBe(0);
  const rows: Record<string, unknown>[] = stdout
    .trimEnd()
    .split('\n')
    .map((line) => JSON.parse(line));
  expect(Object.keys(rows[0] ?? {}).sort()).toEqual([
    'coverage68',
    'coverage95',
    'crps',
    'forecasts',
    'horizon',
    'isDefault',
    'logScore',
    'method',
    'series',
  ]);
  expect(new Set(rows.map(({ series }) => series))).toEqual(new Set(['JQVO']));
  expect(new Set(rows.filter(({ isDefault }) => isDefault).map(({ method }) => method)).size).toBe(1);
  expect(rows.every(({ logScore, forecasts }) => Number.isFinite(logScore) && forecasts === 2)).toBe(true);
});

it('leaves out sessions without a close, and reads dates and line ends of any kind', () => {
  const holes = closes.flatMap((value, index) => (index === 99 ? [value, '', 'NA'] : [value]));
  const rows = holes.map((value, index) => `day ${index},${value}\r`);
  expect(skill(rows, 'Date,JQVO\r').stdout).toBe(skill(rowsOf(closes)).stdout);
});

it.each([
  ['a series too short', closes.slice(0, 500), /closes\.csv, column JQVO: 500 closes, and 526 are needed/],
  [
    'a close of 0',
    closes.map((value, index) => (index === 4 ? 0 : value)),
    /closes\.csv, line 8, column JQVO: 0 is not above 0/,
  ],
  ['a word', closes.map((value, index) => (index === 4 ? 'high' : value)), /line 8, column JQVO: "high" is no number/],
  ['closes that never move', closes.map(() => 7), /column JQVO: the closes do not move/],
])('refuses %s with status 1, saying where', (_, values, message) => {
  const { stdout, stderr, status } = skill(rowsOf(values));
  expect(status).toBe(1);
  expect(stderr).toMatch(message);
  expect(stdout).toBe('');
});

it('refuses a header without a series', () => {
  expect(skill(['1', '2'], 'session').stderr).toMatch(/line 1: the header names no series/);
});
