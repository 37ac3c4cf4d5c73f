import { execFile } from 'node:child_process';
import path from 'node:path';
import { promisify } from 'node:util';
import { createTestDatabase } from '@/tests/server/support/test-database';

jest.setTimeout(120_000);

const root = path.resolve(__dirname, '../../..');
const zones = ['America/New_York', 'Asia/Kolkata', 'Pacific/Kiritimati', 'America/St_Johns'];

interface Collected {
  readonly zone: string;
  readonly result: {
    readonly desks: readonly { readonly createdAt: string }[];
    readonly barsByOrm: readonly (readonly [string, string])[];
    readonly barsAsked: readonly string[];
    readonly rawBars: readonly { readonly session_date: string }[];
    readonly csv: { readonly bars: readonly { readonly sessionDate: string }[] };
    readonly xlsx: { readonly bars: readonly { readonly sessionDate: string }[] };
    readonly fills: readonly { readonly kind: string; readonly fill?: { readonly tradedAt: string } }[];
  };
}

/** What the server's ways with time give in a process of that zone, on a fresh database. */
async function collect(zone: string): Promise<Collected> {
  const database = await createTestDatabase();
  try {
    const { stdout } = await promisify(execFile)(
      process.execPath,
      ['--import', 'tsx', path.join(root, 'tests/server/time/collect-times.ts'), database.applicationUrl],
      { cwd: root, env: { ...process.env, TZ: zone, TSX_TSCONFIG_PATH: path.join(root, 'server/tsconfig.json') } },
    );
    const collected: Collected = JSON.parse(stdout);
    return collected;
  } finally {
    await database.drop();
  }
}

describe('times and dates', () => {
  let utc: Collected;
  beforeAll(async () => {
    utc = await collect('UTC');
  });

  it('come back as they were written, by every way, from a process in UTC', () => {
    const { desks, barsByOrm, barsAsked, rawBars, csv, xlsx, fills } = utc.result;
    const dates = ['2024-02-29', '2026-03-08', '2026-03-29', '2026-11-01', '2026-12-31'];
    expect(desks.map(({ createdAt }) => createdAt)).toEqual([
      '2026-11-01T05:30:00.000Z',
      '2026-11-01T06:30:00.000Z',
      '2026-03-08T07:00:00.000Z',
      '2026-12-31T23:59:59.999Z',
      '2027-01-01T00:00:00.000Z',
    ]);
    expect(barsByOrm.map(([date]) => date)).toEqual(dates);
    expect(rawBars.map(({ session_date: date }) => date)).toEqual(dates);
    expect(barsAsked).toEqual(['2026-03-08']);
    expect(csv.bars.map(({ sessionDate }) => sessionDate)).toEqual(xlsx.bars.map(({ sessionDate }) => sessionDate));
    expect(fills.map(({ kind, fill }) => fill?.tradedAt ?? kind)).toEqual([
      'incomplete', // twice that night
      'incomplete', // not at all that night
      '2026-12-09T20:52:00.000Z',
    ]);
  });

  it.each(zones)('are the same from a process in %s', async (zone) => {
    const other = await collect(zone);
    expect(other.zone).not.toBe(utc.zone); // the process did run elsewhere
    expect(other.result).toEqual(utc.result);
  });
});
