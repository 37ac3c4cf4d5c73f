import { createConnection, type Connection } from 'mysql2/promise';
import { verifyChain } from '@/scripts/verify-chain.mjs';
import { type Endpoint } from '@/shared/contract/define-endpoint';
import { entryEndpoints } from '@/shared/entries/entry-endpoints';
import { chainRows } from '@/tests/server/support/chain-rows';
import { addDraft, addSealed, addUnderlying, completePlan } from '@/tests/server/support/journal';
import { methodOf, sampleBody } from '@/tests/server/support/sample-calls';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

jest.setTimeout(60_000);

let app: TestApp;
let trader: TestPerson;
let underlyingId: string;
let asOwner: Connection;
let asApplication: Connection;
beforeAll(async () => {
  app = await startTestApp();
  trader = await app.person({ role: 'trader' });
  underlyingId = await addUnderlying(trader);
  asOwner = await createConnection(app.database.migrationUrl);
  asApplication = await createConnection(app.database.applicationUrl);
});
afterAll(async () => {
  await asOwner.end();
  await asApplication.end();
  await app.stop();
});

const chainOf = (traderId: string) => chainRows((sql, values) => app.dataSource.query(sql, values), traderId);
const frozen = async () =>
  JSON.stringify(await app.dataSource.query('CHECKSUM TABLE sealed_forecast, sealed_content, entry, fill, outcome'));

describe('a sealed entry', () => {
  it('shows the receipt, the input and the outputs that were frozen', async () => {
    const id = await addSealed(trader, completePlan(underlyingId));
    const { body } = await trader.get(`/entries/${id}`).expect(200);
    expect(body).toMatchObject({
      row: { state: 'sealed', version: 2, sealedAt: '2026-12-09T22:00:00.000Z', isLateSeal: false },
      sealed: {
        receipt: { sealedAt: '2026-12-09T22:00:00.000Z', isLate: false },
        input: {
          spot: { price: '98.4', source: 'bar' },
          volatility: { low: 0.008, base: 0.01, high: expect.closeTo(0.013, 15) },
        },
        forecast: { structureName: 'bull put 97 / 95', cost: { netPremium: expect.stringMatching(/^-?48$/) } },
      },
    });
    expect(body.sealed.forecast.odds.length).toBeGreaterThan(0);
  });

  it('refuses every route that writes plans, whatever the version, and stays as it was', async () => {
    const id = await addSealed(trader, completePlan(underlyingId));
    const writes: readonly Endpoint[] = [
      entryEndpoints.saveDraft,
      entryEndpoints.discardDraft,
      entryEndpoints.sealEntry,
    ];
    const before = await frozen();
    for (const endpoint of writes) {
      for (const version of ['1', '2', '3']) {
        const call = trader[methodOf(endpoint)](endpoint.path.replace(':entryId', id)).set('If-Match', version);
        const answer = await (endpoint.body === null
          ? call
          : call.send(sampleBody(endpoint, { deskId: '', underlyingId, entryId: id, uploadId: '', reviewId: '' })));
        expect([endpoint.name, version, answer.status, answer.body.error.code]).toEqual([
          endpoint.name,
          version,
          409,
          'entry-sealed',
        ]);
      }
    }
    const again = await trader.post('/entries').send({ id, plan: completePlan(underlyingId, { idea: 'other' }) });
    expect(again.body.plan.idea).toBe('It stays above 97.');
    expect(await frozen()).toBe(before);
  });

  it('is sealed once of two requests at once', async () => {
    const id = await addDraft(trader, completePlan(underlyingId));
    const seal = () => trader.post(`/entries/${id}/seal`).set('If-Match', '1');
    const answers = await Promise.all([seal(), seal(), seal()]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409]);
  });
});

describe('the chain of a trader', () => {
  it('is one line of 1 to 50 after fifty seals at once, and an independent check accepts it', async () => {
    const person = await app.person({ role: 'trader' });
    const own = await addUnderlying(person);
    const ids = [];
    for (let number = 0; number < 50; number += 1) ids.push(await addDraft(person, completePlan(own)));
    const seal = (id: string) => person.post(`/entries/${id}/seal`).set('If-Match', '1');
    const sealUnlessBusy = async (id: string) => {
      let answer = await seal(id);
      // A server with no connection to spare says so; whoever wants the seal asks again.
      while (answer.status === 503) answer = await seal(id);
      return answer;
    };
    const answers = await Promise.all(ids.map(sealUnlessBusy));
    expect(answers.map(({ status }) => status)).toEqual(ids.map(() => 200));
    const sequences = answers.map(({ body }) => Number(body.sealed.receipt.sequence)).sort((a, b) => a - b);
    expect(sequences).toEqual(Array.from({ length: 50 }, (_, index) => index + 1));
    expect(verifyChain(await chainOf(person.id))).toEqual([]);
  });

  it('gives away a row that the owner of the schema changed, at its number', async () => {
    const person = await app.person({ role: 'trader' });
    const own = await addUnderlying(person);
    for (let number = 0; number < 4; number += 1) await addSealed(person, completePlan(own));
    await asOwner.query('DROP TRIGGER tr_sealed_content_update');
    await asOwner.query(
      `UPDATE sealed_content SET payload = REPLACE(payload, 'It stays above 97.', 'It stays above 96.')
       WHERE forecast_id = (SELECT id FROM sealed_forecast WHERE trader_id = ? AND sequence = 3)`,
      [person.id],
    );
    expect(verifyChain(await chainOf(person.id))).toEqual([{ sequence: 3, finding: 'the sealed content was changed' }]);
  });

  it('gives away a time and a link that the owner of the schema changed', async () => {
    const person = await app.person({ role: 'trader' });
    const own = await addUnderlying(person);
    for (let number = 0; number < 4; number += 1) await addSealed(person, completePlan(own));
    await asOwner.query('DROP TRIGGER tr_sealed_forecast_update');
    await asOwner.query(
      'UPDATE sealed_forecast SET sealed_at_microseconds = sealed_at_microseconds - 1 WHERE trader_id = ? AND sequence = 2',
      [person.id],
    );
    expect((await chainOf(person.id)).length).toBe(4);
    expect(verifyChain(await chainOf(person.id))[0]?.sequence).toBe(2);
  });
});

describe('the application’s own account', () => {
  const forbidden = [1142, 1370, 1044, 1227, 1143];
  it.each(
    ['sealed_forecast', 'sealed_content', 'audit_event'].flatMap((table) => [
      `UPDATE ${table} SET id = id`,
      `DELETE FROM ${table}`,
      `REPLACE INTO ${table} SELECT * FROM ${table}`,
      `INSERT INTO ${table} SELECT * FROM ${table} ON DUPLICATE KEY UPDATE id = VALUES(id)`,
      `TRUNCATE ${table}`,
      `DROP TABLE ${table}`,
      `ALTER TABLE ${table} ADD COLUMN x INT`,
      `CREATE TRIGGER x BEFORE INSERT ON ${table} FOR EACH ROW SET @x = 1`,
    ]),
  )('may not: %s', async (statement) => {
    const failure: unknown = await asApplication.query(statement).catch((error: unknown) => error);
    expect(forbidden).toContain(failure instanceof Error && 'errno' in failure ? failure.errno : 'it went through');
  });

  it('may drop no trigger and sees no other database', async () => {
    await expect(asApplication.query('DROP TRIGGER tr_audit_event_update')).rejects.toMatchObject({ errno: 1142 });
    await expect(asApplication.query('SELECT * FROM mysql.user')).rejects.toMatchObject({ errno: 1142 });
  });

  it('is stopped by a second line: not even the owner updates or deletes while the triggers stand', async () => {
    for (const statement of [
      'UPDATE audit_event SET id = id',
      'DELETE FROM audit_event',
      'DELETE FROM sealed_forecast',
    ])
      await expect(asOwner.query(statement)).rejects.toMatchObject({ sqlState: '45000' });
  });
});
