import supertest from 'supertest';
import { type Endpoint } from '@/shared/contract/define-endpoint';
import { allEndpoints } from '@/shared/contract/all-endpoints';
import { apiRoot, requestHeader } from '@/shared/contract/request-headers';
import {
  methodOf,
  type SampleRows,
  sampleBody,
  sampleCall,
  samplePath,
  sampleRows,
} from '@/tests/server/support/sample-calls';
import { startTestApp, testOrigin, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

const endpoints: readonly Endpoint[] = Object.values(allEndpoints);
const writes = endpoints.filter(({ method }) => method !== 'GET');
const reads = endpoints.filter(({ method }) => method === 'GET');
const our = { [requestHeader.name]: requestHeader.value };

const forged: Readonly<Record<string, Readonly<Record<string, string>>>> = {
  'another site': { ...our, 'Sec-Fetch-Site': 'cross-site' },
  'a neighbouring site': { ...our, 'Sec-Fetch-Site': 'same-site' },
  'the address bar': { ...our, 'Sec-Fetch-Site': 'none' },
  'a foreign origin': { ...our, Origin: 'https://elsewhere.example' },
  'an origin that begins like ours': { ...our, Origin: `${testOrigin}.elsewhere.example` },
  'a sandboxed page': { ...our, Origin: 'null' },
  'no page at all': our,
  'our page, without the header': { 'Sec-Fetch-Site': 'same-origin' },
};

jest.setTimeout(60_000);

let app: TestApp;
let owner: TestPerson;
let rows: SampleRows;
beforeAll(async () => {
  app = await startTestApp();
  owner = await app.person({ role: 'lead' });
  rows = await sampleRows(owner);
});
afterAll(() => app.stop());

/** A fingerprint of every row of every table but `session`, whose end moves on while its person is active. */
async function checksums(): Promise<string> {
  const tables: { name: string }[] = await app.dataSource.query(
    "SELECT TABLE_NAME AS name FROM information_schema.TABLES WHERE TABLE_SCHEMA = DATABASE() AND TABLE_NAME <> 'session'",
  );
  const sums = await app.dataSource.query(`CHECKSUM TABLE ${tables.map(({ name }) => `\`${name}\``).join(', ')}`);
  return JSON.stringify(sums);
}

const bare = (endpoint: Endpoint, headers: Readonly<Record<string, string>>) =>
  supertest(app.app)
    [methodOf(endpoint)](`${apiRoot}${samplePath(endpoint, rows)}`)
    .set('Cookie', owner.cookie)
    .set('If-Match', '1')
    .set(headers);

describe('a request that changes something', () => {
  it.each(Object.entries(forged))('is refused from %s, by every endpoint, and changes no row', async (_, headers) => {
    const before = await checksums();
    for (const endpoint of writes) {
      const answer = await bare(endpoint, headers).send(sampleBody(endpoint, rows));
      expect([endpoint.name, answer.status, answer.body.error.code]).toEqual([endpoint.name, 403, 'request-forged']);
    }
    expect(await checksums()).toBe(before);
  });

  it.each(['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x', 'application/xml'])(
    'is refused as %s by every endpoint that takes JSON, and changes no row',
    async (type) => {
      const before = await checksums();
      for (const endpoint of writes.filter(({ body }) => body !== null && body !== 'file')) {
        const answer = await bare(endpoint, { ...our, Origin: testOrigin, 'Content-Type': type }).send(
          JSON.stringify(sampleBody(endpoint, rows)),
        );
        expect([endpoint.name, answer.status]).toEqual([endpoint.name, 415]);
      }
      expect(await checksums()).toBe(before);
    },
  );

  it('is taken from our own origin where a browser sends no Sec-Fetch-Site', async () => {
    await supertest(app.app)
      .patch(`${apiRoot}/account/profile`)
      .set({ Cookie: owner.cookie, Origin: testOrigin, ...our })
      .send({ displayName: 'Ada Quill', timeZone: 'UTC' })
      .expect(200);
  });
});

describe('a reading request', () => {
  it('changes no row, sent twice to every endpoint', async () => {
    const before = await checksums();
    for (const endpoint of [...reads, ...reads]) await sampleCall(owner, endpoint, rows).expect(200);
    expect(await checksums()).toBe(before);
  });

  it('is never opened to other origins', async () => {
    const answer = await supertest(app.app)
      .get(`${apiRoot}/account/me`)
      .set({ Cookie: owner.cookie, Origin: 'https://elsewhere.example' });
    expect(Object.keys(answer.headers).filter((name) => name.startsWith('access-control'))).toEqual([]);
  });
});
