import supertest, { type Response, type Test } from 'supertest';
import { allEndpoints } from '@/shared/contract/all-endpoints';
import { type Endpoint } from '@/shared/contract/define-endpoint';
import { apiRoot } from '@/shared/contract/request-headers';
import { type FaultPlan, FaultyDriver } from '@/tests/server/support/faulty-driver';
import { sampleCall, type SampleRows, sampleRows } from '@/tests/server/support/sample-calls';
import { callsOf, startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

jest.setTimeout(60_000);

const faults = new FaultyDriver();
let app: TestApp;
let overTls: TestApp;
let lead: TestPerson;
let rows: SampleRows;
beforeAll(async () => {
  app = await startTestApp({}, { driver: faults.driver });
  overTls = await startTestApp({ PUBLIC_ORIGIN: 'https://brierbook.example' });
  lead = await app.person({ role: 'lead' });
  rows = await sampleRows(lead);
});
afterAll(async () => {
  await app.stop();
  await overTls.stop();
});

const read = (path: string) => (): Test => supertest(app.app).get(path);
const seal = (version: string | null): Test => {
  const call = lead.post(`/entries/${rows.entryId}/seal`);
  return version === null ? call : call.set('If-Match', version);
};
const sealFailing = async (plan: Omit<FaultPlan, 'at' | 'isLasting'>): Promise<Response> => {
  faults.watch({ ...plan, at: 1, isLasting: true });
  const answer = await seal('1');
  faults.watch(null);
  return answer;
};
async function signInTooOften(): Promise<Response> {
  const attempt = () =>
    app.anonymous.post('/account/sign-in').send({ email: lead.email, password: 'a wrong password here' });
  for (let failures = 0; failures < 6; failures += 1) await attempt().expect(401);
  return attempt();
}

/** One answer of every kind: page, document, health, and each way to be refused. */
const answers: readonly (readonly [string, number, () => PromiseLike<Response>])[] = [
  ['a page', 200, read('/')],
  ['an address of the client', 200, read('/journal')],
  ['a file that is not there', 404, read('/assets/missing.js')],
  ['health', 200, read('/healthz')],
  ['readiness', 200, read('/readyz')],
  ['the contract', 200, read(`${apiRoot}/openapi.json`)],
  ['broken escapes', 400, read(`${apiRoot}/entries/%E0%A4%A`)],
  ['nobody signed in', 401, read(`${apiRoot}/today`)],
  ['a forged request', 403, () => supertest(app.app).post(`${apiRoot}/entries`).set('Sec-Fetch-Site', 'cross-site')],
  ['no such endpoint', 404, () => lead.get('/nothing')],
  ['another version', 409, () => seal('7')],
  ['a body too large', 413, () => lead.post('/entries').send({ id: 'x'.repeat(3_000_000) })],
  ['a body of another kind', 415, () => lead.post('/entries').type('text/plain').send('x')],
  ['no version', 428, () => seal(null)],
  ['too many requests', 429, signInTooOften],
  ['an error of our own', 500, () => sealFailing({ fault: 1062 })],
  ['a database that is gone', 503, () => sealFailing({ fault: 'lost' })],
];

function expectGuarded({ headers }: Response): void {
  const policy = String(headers['content-security-policy']).split(';');
  expect(policy).toEqual(
    expect.arrayContaining([
      "default-src 'self'",
      "script-src 'self'",
      "connect-src 'self'",
      "object-src 'none'",
      "base-uri 'none'",
      "frame-ancestors 'none'",
      "form-action 'self'",
    ]),
  );
  expect(headers).toMatchObject({
    'x-content-type-options': 'nosniff',
    'referrer-policy': 'no-referrer',
    'cross-origin-opener-policy': 'same-origin',
    'cross-origin-resource-policy': 'same-origin',
  });
  expect(headers).not.toHaveProperty('x-powered-by');
  expect(headers).not.toHaveProperty('access-control-allow-origin');
}
const isOfApi = ({ request }: Response): boolean => String(request.url).includes(apiRoot);

describe.each(answers)('the answer to %s', (_, status, ask) => {
  it(`is ${status}, lets nothing from elsewhere run, frame it or learn of it, and of the API stays in no cache`, async () => {
    const answer = await ask();
    expect(answer.status).toBe(status);
    expectGuarded(answer);
    expect(answer.headers['content-type']).toMatch(/charset=utf-8/i);
    if (isOfApi(answer)) expect(answer.headers['cache-control']).toBe('no-store');
  });
});

describe('every endpoint', () => {
  it.each(Object.values<Endpoint>(allEndpoints).map((endpoint) => [endpoint.name, endpoint] as const))(
    '%s answers a person, and nobody, in a way that no cache keeps and no other page can use',
    async (_, endpoint) => {
      const own = await app.person({ role: 'lead' });
      const ownRows = await sampleRows(own);
      for (const caller of [own, app.anonymous]) {
        const answer = await sampleCall(caller, endpoint, ownRows);
        expectGuarded(answer);
        expect(answer.headers['cache-control']).toBe('no-store');
        if (answer.status !== 204) expect(answer.headers['content-type']).toMatch(/charset=utf-8|spreadsheet|zip/i);
      }
    },
  );
});

it('a server behind TLS asks for TLS for a year, whatever it answers', async () => {
  const { get } = callsOf(overTls.app, null);
  for (const answer of [await get('/today'), await get('/nothing'), await supertest(overTls.app).get('/')])
    expect(answer.headers['strict-transport-security']).toBe('max-age=31536000; includeSubDomains');
});
