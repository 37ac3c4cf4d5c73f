import { randomUUID } from 'node:crypto';
import { Agent, request } from 'node:http';
import { createConnection, type Connection, type RowDataPacket } from 'mysql2/promise';
import { apiRoot, requestHeader } from '@/shared/contract/request-headers';
import { addUnderlying, completePlan, shareFields } from '@/tests/server/support/journal';
import { type ServerProcess, serverProcesses, type ServerProcesses } from '@/tests/server/support/server-process';
import { signUpAt } from '@/tests/server/support/sign-up-at';
import { callsOf, type TestPerson } from '@/tests/server/support/test-app';
import { createTestDatabase, type TestDatabase } from '@/tests/server/support/test-database';

jest.setTimeout(180_000);

const STOPS = 20;
const LANES = 8;
/** Tuesdays to Thursdays, none of them a holiday. */
const datesOfFile = Array.from({ length: 80 }, (_, day) => new Date(Date.UTC(2026, 2, 2 + day)))
  .filter((date) => date.getUTCDay() >= 2 && date.getUTCDay() <= 4)
  .map((date) => date.toISOString().slice(0, 10));

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

interface Sent {
  readonly id: string;
  /** All of it was handed to the operating system before the signal was sent. */
  readonly isBegun: boolean;
  /** 0 when the connection ended without an answer. */
  readonly status: number;
}

/** Adds a draft over a connection that is kept open, as browsers do. */
function sendDraft(
  { origin }: ServerProcess,
  { agent, cookie, underlyingId, isSignalled }: Load & { agent: Agent; isSignalled: () => boolean },
): Promise<Sent> {
  const id = randomUUID();
  const body = JSON.stringify({ id, plan: completePlan(underlyingId) });
  return new Promise((resolve) => {
    let isBegun = false;
    const end = (status: number) => resolve({ id, isBegun, status });
    const call = request(`${origin}${apiRoot}/entries`, {
      method: 'POST',
      agent,
      headers: {
        Cookie: cookie,
        Origin: origin,
        'Content-Type': 'application/json',
        'Content-Length': Buffer.byteLength(body),
        [requestHeader.name]: requestHeader.value,
      },
    });
    call.on('finish', () => (isBegun = !isSignalled()));
    call.on('error', () => end(0));
    call.on('response', (answer) => {
      answer.on('error', () => end(0));
      answer.on('close', () => end(answer.complete ? (answer.statusCode ?? 0) : 0));
      answer.resume();
    });
    call.end(body);
  });
}

interface Load {
  readonly cookie: string;
  readonly underlyingId: string;
}

/** Keeps eight requests under way; sends the signal after some answers, and goes on until nobody answers any more. */
async function stopUnderLoad(server: ServerProcess, load: Load, answersBefore: number): Promise<Sent[]> {
  const agent = new Agent({ keepAlive: true, maxSockets: LANES });
  const sent: Sent[] = [];
  let isSignalled = false;
  const lane = async (): Promise<void> => {
    const one = await sendDraft(server, { ...load, agent, isSignalled: () => isSignalled });
    sent.push(one);
    if (!isSignalled && sent.length >= answersBefore) {
      isSignalled = true;
      server.child.kill('SIGTERM');
    }
    if (one.status !== 0) await lane();
  };
  await Promise.all(Array.from({ length: LANES }, lane));
  agent.destroy();
  return sent;
}

/** A file that is shown and only waits to be stored. */
async function previewFile({ post }: Pick<TestPerson, 'post'>): Promise<{ uploadId: string; underlyingId: string }> {
  const underlyingId = randomUUID();
  const symbol = `X${underlyingId.replace(/[^a-f]/g, '').toUpperCase()}QYBDWUVZ`.slice(0, 8);
  await post('/underlyings')
    .send({ id: underlyingId, ...shareFields, symbol })
    .expect(201);
  const content = ['Date,Close', ...datesOfFile.map((date) => `${date},97.10`)].join('\n');
  const upload = await post(`/underlyings/${underlyingId}/price-uploads`)
    .attach('file', Buffer.from(content), 'closes.csv')
    .expect(201);
  return { uploadId: String(upload.body.id), underlyingId };
}

describe('a server stopped while eight clients write', () => {
  it('twenty times over loses nothing it acknowledged, cuts nothing it had begun, and stores no half file', async () => {
    let server = await launch();
    const trader = await signUpAt(server.origin);
    const underlyingId = await addUnderlying(trader);
    const sent: Sent[] = [];
    const files: { uploadId: string; underlyingId: string; status: number }[] = [];
    for (let stop = 0; stop < STOPS; stop += 1) {
      const { post } = callsOf(server.origin, trader.cookie);
      const file = await previewFile({ post });
      const committed = post(`/price-uploads/${file.uploadId}/commit`).then(
        ({ status }) => status,
        () => 0,
      );
      sent.push(...(await stopUnderLoad(server, { cookie: trader.cookie, underlyingId }, 2 + stop * 2)));
      files.push({ ...file, status: await committed });
      expect(await server.ended).toBe(0);
      if (stop + 1 < STOPS) server = await launch();
    }

    const [rows] = await owner.query<RowDataPacket[]>('SELECT id FROM entry');
    const stored = new Set(rows.map(({ id }) => String(id)));
    const acknowledged = sent.filter(({ status }) => status === 201);
    expect(acknowledged.filter(({ id }) => !stored.has(id))).toEqual([]);
    expect(sent.filter(({ isBegun, status }) => isBegun && status !== 201)).toEqual([]);
    // What got no answer was not taken up either.
    expect(stored.size).toBe(acknowledged.length);
    expect(acknowledged.length).toBeGreaterThan(STOPS * LANES);

    const [uploads] = await owner.query<RowDataPacket[]>(
      `SELECT id, state, (SELECT COUNT(*) FROM bar WHERE bar.underlying_id = price_upload.underlying_id) AS bars FROM price_upload`,
    );
    const storedFiles = new Map(uploads.map(({ id, state, bars }) => [String(id), `${state} ${bars}`]));
    const none = 'preview 0';
    const all = `committed ${datesOfFile.length}`;
    for (const { uploadId, status } of files)
      expect([all, ...(status === 0 ? [none] : [])]).toContain(storedFiles.get(uploadId));
  });
});
