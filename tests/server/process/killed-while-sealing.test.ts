import { createConnection, type Connection, type RowDataPacket } from 'mysql2/promise';
import { type StoredSeal, verifyChain } from '@/scripts/verify-chain.mjs';
import { chainRows } from '@/tests/server/support/chain-rows';
import { addDraft, addUnderlying, completePlan } from '@/tests/server/support/journal';
import { type ServerProcess, serverProcesses, type ServerProcesses } from '@/tests/server/support/server-process';
import { signUpAt } from '@/tests/server/support/sign-up-at';
import { callsOf } from '@/tests/server/support/test-app';
import { createTestDatabase, type TestDatabase } from '@/tests/server/support/test-database';

jest.setTimeout(120_000);

const SEALS = 50;
/** The process is killed once it has answered so many seals since it started; the last process is left to finish. */
const killedAfter = [1, 4, 7, 2, 9, 5];

let database: TestDatabase;
let processes: ServerProcesses;
let owner: Connection;
beforeAll(async () => {
  database = await createTestDatabase();
  processes = serverProcesses(database);
  owner = await createConnection(database.migrationUrl);
});
afterAll(async () => {
  processes.endAll();
  await owner.end();
  await database.drop();
});

const launch = () => processes.launchReady({ at: '2026-12-09T22:00:00.000Z' });

/** Asks for every seal at once; kills the process after some answers. What got no answer is left for the next one. */
async function sealAll(
  server: ServerProcess,
  { cookie, ids, killAfter }: { cookie: string; ids: ReadonlySet<string>; killAfter: number },
): Promise<Map<string, number>> {
  const sequences = new Map<string, number>();
  const { post, get } = callsOf(server.origin, cookie);
  const seal = async (id: string): Promise<void> => {
    const answer = await post(`/entries/${id}/seal`).set('If-Match', '1');
    if (answer.status === 503) return seal(id);
    // 409: the process before sealed it and was killed before it could say so.
    expect([200, 409]).toContain(answer.status);
    const { body } = answer.status === 200 ? answer : await get(`/entries/${id}`).expect(200);
    sequences.set(id, Number(body.sealed.receipt.sequence));
    if (sequences.size === killAfter) server.child.kill('SIGKILL');
  };
  const results = await Promise.allSettled([...ids].map(seal));
  if (killAfter === Infinity) for (const result of results) expect(result.status).toBe('fulfilled');
  return sequences;
}

describe('a server killed while it seals', () => {
  it('leaves one line of 1 to 50, every seal that was answered at the number it was told, and nothing half', async () => {
    let server = await launch();
    const trader = await signUpAt(server.origin);
    const underlyingId = await addUnderlying(trader);
    const waiting = new Set<string>();
    for (let number = 0; number < SEALS; number += 1) waiting.add(await addDraft(trader, completePlan(underlyingId)));

    const told = new Map<string, number>();
    for (const killAfter of [...killedAfter, Infinity]) {
      const answered = await sealAll(server, { cookie: trader.cookie, ids: waiting, killAfter });
      for (const [id, sequence] of answered) {
        told.set(id, sequence);
        waiting.delete(id);
      }
      if (killAfter === Infinity) break;
      expect(await server.ended).toBeNull();
      server = await launch();
    }

    const ask = async (sql: string, values: unknown[]) =>
      (await owner.query<(StoredSeal & RowDataPacket)[]>(sql, values))[0];
    const chain = await chainRows(ask, trader.id);
    expect(chain.map(({ sequence }) => Number(sequence))).toEqual(Array.from({ length: SEALS }, (_, at) => at + 1));
    expect(verifyChain(chain)).toEqual([]);
    const [stored] = await owner.query<RowDataPacket[]>(
      `SELECT f.entry_id AS id, f.sequence, e.state, e.version, c.id IS NOT NULL AS hasContent, o.entry_id IS NOT NULL AS hasOutcome,
              (SELECT COUNT(*) FROM audit_event a WHERE a.subject_id = e.id AND a.action = 'entry-sealed') AS notes
       FROM sealed_forecast f JOIN entry e ON e.id = f.entry_id LEFT JOIN sealed_content c ON c.forecast_id = f.id
       LEFT JOIN outcome o ON o.entry_id = e.id`,
    );
    expect(new Map(stored.map(({ id, sequence }) => [String(id), Number(sequence)]))).toEqual(told);
    const wholes = stored.map(({ state, version, hasContent, hasOutcome, notes }) =>
      [state, version, hasContent, hasOutcome, notes].map(String),
    );
    expect(wholes).toEqual(wholes.map(() => ['sealed', '2', '1', '1', '1']));
  });
});
