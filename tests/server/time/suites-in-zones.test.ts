import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

jest.setTimeout(180_000);

const root = path.resolve(__dirname, '../../..');
const zones = ['America/New_York', 'Asia/Kolkata', 'Pacific/Kiritimati', 'America/St_Johns'];
/** The tests of everything that reads dates, times of day or zones without a database. */
const suites = [
  'tests/journal/sessions',
  'tests/journal/events/event-variance.test.ts',
  'tests/journal/outcome/resolve-entry.test.ts',
  'tests/journal/outcome/settled-from-openings.test.ts',
  'tests/shared',
];

interface Report {
  readonly testResults: readonly {
    readonly assertionResults: readonly { readonly fullName: string; readonly status: string }[];
  }[];
}

let folder: string;
beforeAll(() => void (folder = mkdtempSync(path.join(tmpdir(), 'brierbook-zones-'))));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const inZone = (zone: string, args: readonly string[]) =>
  spawnSync(process.execPath, args, { cwd: root, env: { ...process.env, TZ: zone }, encoding: 'utf8' });

/** What each test says in a process of that zone. */
function runIn(zone: string): string[] {
  const file = path.join(folder, `${zone.replace('/', '-')}.json`);
  const jest = path.join(root, 'node_modules/jest/bin/jest.js');
  inZone(zone, [jest, '--selectProjects', 'engine', '--runInBand', '--json', `--outputFile=${file}`, ...suites]);
  const report: Report = JSON.parse(readFileSync(file, 'utf8'));
  return report.testResults
    .flatMap(({ assertionResults }) => assertionResults.map(({ fullName, status }) => `${status}: ${fullName}`))
    .sort();
}

describe('the tests of sessions, plans, outcomes and forms', () => {
  let inUtc: readonly string[];
  beforeAll(() => void (inUtc = runIn('UTC')));

  it('pass in UTC', () => {
    expect(inUtc.length).toBeGreaterThan(100);
    expect(inUtc.filter((line) => !line.startsWith('passed'))).toEqual([]);
  });

  it.each(zones)('say the same in %s', (zone) => {
    const { stdout } = inZone(zone, ['-p', 'Intl.DateTimeFormat().resolvedOptions().timeZone']);
    expect(stdout.trim()).not.toBe('UTC'); // the zone is known here
    expect(runIn(zone)).toEqual(inUtc);
  });
});
