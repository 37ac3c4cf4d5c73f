import { randomUUID } from 'node:crypto';
import { type Test } from 'supertest';
import { inTransaction } from '@/server/database/transaction';
import { allEndpoints } from '@/shared/contract/all-endpoints';
import { type Endpoint } from '@/shared/contract/define-endpoint';
import { type FaultPlan, FaultyDriver } from '@/tests/server/support/faulty-driver';
import { addDraft, addSealed, addUnderlying, completePlan, fill, option } from '@/tests/server/support/journal';
import { sampleCall, sampleRows } from '@/tests/server/support/sample-calls';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

jest.setTimeout(240_000);

const POOL_SIZE = 10;

const faults = new FaultyDriver();
let app: TestApp;
let trader: TestPerson;
let underlyingId: string;
beforeAll(async () => {
  app = await startTestApp({}, { driver: faults.driver });
  trader = await app.person({ role: 'trader' });
  underlyingId = await addUnderlying(trader);
});
afterAll(() => app.stop());

/** How much of everything there is: rows by table, and by state where a row has one. */
async function amounts(): Promise<Readonly<Record<string, number>>> {
  const tables = 'bar sealed_forecast sealed_content fill outcome outcome_change scored_odds scored_entry audit_event';
  const counts = tables.split(' ').map((table) => `SELECT '${table}' AS name, COUNT(*) AS number FROM \`${table}\``);
  const states = ['entry', 'price_upload'].map(
    (table) => `SELECT CONCAT('${table} ', state), COUNT(*) FROM \`${table}\` GROUP BY state`,
  );
  const rows: { name: string; number: string }[] = await app.dataSource.query(
    [...counts, ...states].join(' UNION ALL '),
  );
  return Object.fromEntries(rows.map(({ name, number }) => [name, Number(number)]));
}
const changeOf = (before: Readonly<Record<string, number>>, after: Readonly<Record<string, number>>) =>
  Object.fromEntries(
    [...new Set([...Object.keys(before), ...Object.keys(after)])]
      .map((name) => [name, (after[name] ?? 0) - (before[name] ?? 0)] as const)
      .filter(([, change]) => change !== 0)
      .sort(),
  );

/** Takes every connection there is at once: none is lost, none is left inside a transaction. */
async function expectHealthyPool(): Promise<void> {
  const runners = Array.from({ length: POOL_SIZE }, () => app.dataSource.createQueryRunner());
  try {
    const states: { isInside: string | number }[][] = await Promise.all(
      runners.map((runner) => runner.query('SELECT @@in_transaction AS isInside')),
    );
    expect(states.map(([row]) => Number(row?.isInside))).toEqual(runners.map(() => 0));
  } finally {
    await Promise.all(runners.map((runner) => runner.release()));
  }
}

interface Unit {
  /** Makes what the work needs, and gives the call that does it. */
  readonly prepare: () => Promise<() => Test>;
  readonly success: number;
  /** The answer to a call whose work was done already. */
  readonly repeated: number;
}
const units: Readonly<Record<string, Unit>> = {
  'sealing a plan': {
    prepare: async () => {
      const id = await addDraft(trader, completePlan(underlyingId));
      return () => trader.post(`/entries/${id}/seal`).set('If-Match', '1');
    },
    success: 200,
    repeated: 409,
  },
  'adding a fill': {
    prepare: async () => {
      const id = await addSealed(trader, completePlan(underlyingId));
      const sold = fill('sell', option('put', '97'), { price: '0.78', tradedAt: '2026-12-09T22:00:00.000Z' });
      return () => trader.post(`/entries/${id}/fills`).send(sold);
    },
    success: 201,
    repeated: 201,
  },
  'storing a file of prices': {
    prepare: async () => {
      const own = randomUUID();
      await app.dataSource.query(
        `INSERT INTO underlying (id, desk_id, version, symbol, name, style, settlement, settlement_time, multiplier, dividend_yield, currency, created_at)
         SELECT ?, desk_id, 1, ?, name, style, settlement, settlement_time, multiplier, dividend_yield, currency, created_at
         FROM underlying WHERE id = ? AND desk_id = ?`,
        [own, `X${own.slice(0, 6).toUpperCase()}`, underlyingId, trader.deskId],
      );
      const file = Buffer.from('Date,Close\n2026-12-07,97.10\n2026-12-08,97.90\n');
      const upload = await trader
        .post(`/underlyings/${own}/price-uploads`)
        .attach('file', file, 'closes.csv')
        .expect(201);
      return () => trader.post(`/price-uploads/${String(upload.body.id)}/commit`);
    },
    success: 200,
    repeated: 200,
  },
};

describe.each(Object.entries(units))('%s', (_, { prepare, success, repeated }) => {
  let statements: readonly string[];
  let whole: Readonly<Record<string, number>>;
  beforeAll(async () => {
    const call = await prepare();
    const before = await amounts();
    faults.watch(null);
    await call().expect(success);
    statements = faults.transactions[0] ?? [];
    whole = changeOf(before, await amounts());
  });

  /** Runs the work once for each of its statements, which then fails; then again with nothing failing. */
  async function failEach(
    plan: Omit<FaultPlan, 'at'>,
    expected: (at: number) => { readonly status: readonly number[]; readonly isDone: boolean },
  ): Promise<void> {
    expect(statements.length).toBeGreaterThan(6);
    expect([statements[0], statements.at(-1)]).toEqual(['START TRANSACTION', 'COMMIT']);
    for (let at = 0; at < statements.length; at += 1) {
      const call = await prepare();
      const before = await amounts();
      faults.watch({ ...plan, at });
      const { status } = await call();
      const tries = faults.transactions.length;
      faults.watch(null);
      const { status: statusDue, isDone } = expected(at);
      const what = { at, statement: statements[at] };
      expect({ ...what, isStatusDue: statusDue.includes(status), status }).toEqual({
        ...what,
        isStatusDue: true,
        status,
      });
      expect({ ...what, change: changeOf(before, await amounts()) }).toEqual({ ...what, change: isDone ? whole : {} });
      expect({ ...what, wasTried: tries > 0 }).toEqual({ ...what, wasTried: true });
      await expectHealthyPool();
      expect((await call()).status).toBe(isDone ? repeated : success);
      expect({ ...what, change: changeOf(before, await amounts()) }).toEqual({ ...what, change: whole });
    }
  }

  it.each([1213, 1205, 1020] as const)('is done once and whole when any statement fails once with %i', (fault) =>
    failEach({ fault, isLasting: false }, () => ({ status: [success], isDone: true })),
  );

  it('is not done at all when any statement keeps failing with 1213', () =>
    failEach({ fault: 1213, isLasting: true }, () => ({ status: [503], isDone: false })));

  it('is not done at all when any statement meets a duplicate key', () =>
    failEach({ fault: 1062, isLasting: false }, () => ({ status: [409, 500], isDone: false })));

  it('is not done at all when the connection is lost before any statement', () =>
    failEach({ fault: 'lost', isLasting: false }, () => ({ status: [503], isDone: false })));

  it('is done only if the commit was, when the connection is lost after any statement', () =>
    failEach({ fault: 'answer-lost', isLasting: false }, (at) => ({
      status: [503],
      isDone: at === statements.length - 1,
    })));

  it('is not done at all when the rollback after any failure fails too', () =>
    failEach({ fault: 1062, isLasting: false, isRollbackRefused: true }, () => ({
      status: [409, 500],
      isDone: false,
    })));
});

describe('a transaction', () => {
  it('runs on one connection alone, at every endpoint', async () => {
    const changing: string[] = [];
    for (const endpoint of Object.values<Endpoint>(allEndpoints)) {
      const lead = await app.person({ role: 'lead' });
      const rows = await sampleRows(lead);
      faults.watch(null);
      await sampleCall(endpoint.access.kind === 'public' ? app.anonymous : lead, endpoint, rows);
      if (faults.transactions.length > 0) changing.push(endpoint.name);
      expect([endpoint.name, faults.foreign]).toEqual([endpoint.name, []]);
    }
    expect(changing).toEqual(expect.arrayContaining(['signUp', 'createEntry', 'saveDraft', 'sealEntry', 'putBar']));
  });

  it('is caught when it reaches for another connection', async () => {
    faults.watch(null);
    await inTransaction(app.dataSource, () => app.dataSource.query('SELECT 2'));
    expect(faults.foreign).toEqual(['SELECT 2']);
  });
});
