import { randomUUID } from 'node:crypto';
import { once } from 'node:events';
import { request as httpRequest } from 'node:http';
import { type AddressInfo } from 'node:net';
import { brotliCompressSync, deflateSync, gzipSync } from 'node:zlib';
import { type z } from 'zod';
import { allEndpoints } from '@/shared/contract/all-endpoints';
import { type Endpoint } from '@/shared/contract/define-endpoint';
import { apiErrorSchema } from '@/shared/contract/error-codes';
import { apiRoot, requestHeader } from '@/shared/contract/request-headers';
import { methodOf, type SampleRows, sampleBody, samplePath, sampleRows } from '@/tests/server/support/sample-calls';
import { startTestApp, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

type Json = null | boolean | number | string | readonly Json[] | { readonly [key: string]: Json };
interface Leaf {
  readonly path: readonly (string | number)[];
  readonly value: Json;
}

const endpoints: readonly Endpoint[] = Object.values(allEndpoints);
const withBody = endpoints.flatMap((endpoint) =>
  endpoint.body === null || endpoint.body === 'file' ? [] : [{ endpoint, schema: endpoint.body }],
);

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

const send = (endpoint: Endpoint, body: object | string, query = '') => {
  const call = owner[methodOf(endpoint)](`${samplePath(endpoint, rows)}${query}`);
  if (endpoint.needsVersion) call.set('If-Match', '1');
  return call.set('Content-Type', 'application/json').send(typeof body === 'string' ? body : JSON.stringify(body));
};
const plainSample = (endpoint: Endpoint): Json => JSON.parse(JSON.stringify(sampleBody(endpoint, rows)));

function leavesOf(value: Json, path: Leaf['path'] = []): Leaf[] {
  if (Array.isArray(value)) return value.flatMap((item: Json, index) => leavesOf(item, [...path, index]));
  if (value !== null && typeof value === 'object')
    return Object.entries(value).flatMap(([key, item]) => leavesOf(item, [...path, key]));
  return [{ path, value }];
}

function withValue(value: Json, [step, ...rest]: Leaf['path'], other: Json): Json {
  if (step === undefined) return other;
  if (Array.isArray(value))
    return value.map((item: Json, index) => (index === step ? withValue(item, rest, other) : item));
  if (value === null || typeof value !== 'object') throw new Error('The path leads nowhere.');
  return Object.fromEntries(
    Object.entries(value).map(([key, item]) => [key, key === step ? withValue(item, rest, other) : item]),
  );
}

const wrongTypes = (value: Json): Json[] => [0, 1, true, null, [], {}, [value], { $ne: '' }];
const isTaken = (schema: z.ZodType, body: Json) => schema.safeParse(body).success;

describe('every endpoint that takes JSON', () => {
  it.each(withBody.map((one) => [one.endpoint.name, one] as const))(
    '%s refuses each text field as a number, truth value, null, list or object',
    async (_, { endpoint, schema }) => {
      const sample = plainSample(endpoint);
      const texts = leavesOf(sample).filter(({ value }) => typeof value === 'string');
      const taken: unknown[] = [];
      for (const { path, value } of texts) {
        for (const other of wrongTypes(value)) {
          const body = withValue(sample, path, other);
          if (other === null && isTaken(schema, body)) continue; // a field that may be empty
          const answer = await send(endpoint, JSON.stringify(body));
          if (answer.status !== 400) taken.push([path.join('.'), other, answer.status]);
        }
      }
      expect(taken).toEqual([]);
    },
  );

  it.each(withBody.map((one) => [one.endpoint.name, one] as const))(
    '%s names an unknown key of the body and takes no other kind of body',
    async (_, { endpoint }) => {
      const answer = await send(endpoint, { ...sampleBody(endpoint, rows), isAdmin: true }).expect(400);
      expect(answer.body.error.problems).toContainEqual({ field: '', message: 'Unknown: isAdmin.' });
      for (const body of ['[]', 'null', '"text"', '7', '{', ''])
        expect([body, (await send(endpoint, body)).status]).toEqual([body, 400]);
    },
  );
});

describe('every endpoint', () => {
  it.each(endpoints.map((endpoint) => [endpoint.name, endpoint] as const))(
    '%s refuses unknown and repeated query keys',
    async (_, endpoint) => {
      const fields = Object.keys('shape' in endpoint.query ? (endpoint.query.shape as object) : {}); // zod objects only
      const queries = ['?colour=red', '?__proto__=1', '?a=1&a=2', ...fields.map((name) => `?${name}=5&${name}=6`)];
      for (const query of queries) {
        const call = owner[methodOf(endpoint)](`${samplePath(endpoint, rows)}${query}`).set('If-Match', '1');
        if (endpoint.body === 'file') call.attach('file', Buffer.from('Date,Close\n2026-12-07,97\n'), 'a.csv');
        else if (endpoint.body !== null) call.send(sampleBody(endpoint, rows));
        expect([query, (await call).status]).toEqual([query, 400]);
      }
    },
  );

  it.each(endpoints.filter(({ path }) => path.includes('/:')).map((endpoint) => [endpoint.name, endpoint] as const))(
    '%s refuses an id that is none',
    async (_, endpoint) => {
      for (const id of ['1', 'null', "' OR 1=1 -- ", 'ü', '0'.repeat(3_000)]) {
        const path = endpoint.path.replace(/:(\w+)/g, encodeURIComponent(id));
        const call = owner[methodOf(endpoint)](path).set('If-Match', '1');
        if (endpoint.body === 'file') call.attach('file', Buffer.from('Date,Close\n2026-12-07,97\n'), 'a.csv');
        else if (endpoint.body !== null) call.send(sampleBody(endpoint, rows));
        expect([id.slice(0, 20), (await call).status]).toEqual([id.slice(0, 20), 400]);
      }
    },
  );

  it.each(endpoints.filter(({ needsVersion }) => needsVersion).map((endpoint) => [endpoint.name, endpoint] as const))(
    '%s asks for the version it changes, and for a whole number',
    async (_, endpoint) => {
      const call = () => {
        const made = owner[methodOf(endpoint)](samplePath(endpoint, rows));
        return endpoint.body === null ? made : made.send(sampleBody(endpoint, rows));
      };
      expect((await call().expect(428)).body.error.code).toBe('version-missing');
      for (const version of ['0', '-1', '1.5', '"1"', '*', '9'.repeat(40), '1, 2'])
        expect([version, (await call().set('If-Match', version)).status]).toEqual([version, 400]);
    },
  );
});

describe('money', () => {
  const numbers: readonly (readonly [keyof typeof allEndpoints, string])[] = [
    ['editDeskSettings', 'feePerContract'],
    ['createUnderlying', 'multiplier'],
    ['editUnderlying', 'multiplier'],
    ['putBar', 'close'],
    ['putBar', 'open'],
    ['putBar', 'high'],
    ['putBar', 'low'],
    ['putBar', 'settlement'],
    ['addFill', 'price'],
    ['addFill', 'quantity'],
    ['addFill', 'fees'],
  ];
  it.each(numbers)('is text in %s: %s as a JSON number is refused and named', async (name, field) => {
    const endpoint = allEndpoints[name];
    const answer = await send(endpoint, { ...sampleBody(endpoint, rows), [field]: 1.25 }).expect(400);
    expect(answer.body.error.problems.map((problem: { field: string }) => problem.field)).toEqual([field]);
  });

  it.each(['1e3', '1,5', ' 1', '0x10', 'NaN', 'Infinity', '1.', '.5', '1'.repeat(60), '-1', '0'])(
    'is refused as %s where a price above 0 is due',
    async (close) => {
      await send(allEndpoints.putBar, { ...sampleBody(allEndpoints.putBar, rows), close }).expect(400);
    },
  );
});

describe('text that databases and formats stumble over', () => {
  it.each(['ü', '\u0000', '\ufffd', '%_\\', "' OR ''='", '🜁', 'a'.repeat(119)])(
    'is searched for, filtered by and paged after without failure: %j',
    async (text) => {
      for (const key of ['search', 'tag', 'after']) {
        const value = encodeURIComponent(text).slice(0, 119);
        const answer = await owner.get(`/entries?${key}=${value}`);
        expect([key, answer.status >= 500]).toEqual([key, false]);
      }
    },
  );

  it('is kept as typed in a profile, or refused, never a failure', async () => {
    for (const displayName of ['🜁 Ωmega', 'a\u0000b', 'x\u202Ey', '\ud800']) {
      const answer = await owner.patch('/account/profile').send({ displayName, timeZone: 'UTC' });
      expect([displayName, answer.status >= 500]).toEqual([displayName, false]);
    }
  });

  it('is not taken as an id that someone else has', async () => {
    const other = await app.person({ role: 'trader' });
    const otherRows = await sampleRows(other);
    const entry = { ...sampleBody(allEndpoints.createEntry, rows), id: otherRows.entryId };
    expect((await send(allEndpoints.createEntry, entry)).status).toBe(409);
    const underlying = { ...sampleBody(allEndpoints.createUnderlying, rows), id: otherRows.underlyingId };
    expect((await send(allEndpoints.createUnderlying, underlying)).status).toBe(409);
  });
});

describe('a malformed request', () => {
  interface Malformed {
    readonly method?: string;
    readonly path?: string;
    readonly headers?: Readonly<Record<string, string>>;
    readonly body?: string | Buffer;
  }
  const profile = '/account/profile';
  const json = { 'Content-Type': 'application/json' };
  const body = '{"displayName":"Ada","timeZone":"UTC"}';
  const bomb = Buffer.alloc(5_000_000, 32);
  const corpus: Readonly<Record<string, Malformed>> = {
    'broken JSON': { headers: json, body: '{"displayName":' },
    'a lone bracket': { headers: json, body: '[' },
    'JSON with a comma too many': { headers: json, body: '{"a":1,}' },
    'single quotes': { headers: json, body: "{'a':1}" },
    'a bare word': { headers: json, body: 'undefined' },
    'JSON followed by more': { headers: json, body: `${body}{}` },
    'lists 20,000 deep': { headers: json, body: '['.repeat(20_000) + ']'.repeat(20_000) },
    'objects 15,000 deep': { headers: json, body: '{"a":'.repeat(15_000) + '1' + '}'.repeat(15_000) },
    'a polluted prototype': { headers: json, body: '{"__proto__":{"isAdmin":true}}' },
    'a polluted constructor': { headers: json, body: '{"constructor":{"prototype":{"isAdmin":true}}}' },
    'NUL in JSON': { headers: json, body: '{"displayName":"a\u0000b"}' },
    'bytes that are no UTF-8': { headers: json, body: Buffer.from([0x7b, 0xff, 0xfe, 0x7d]) },
    'an unknown charset': { headers: { 'Content-Type': 'application/json; charset=klingon' }, body },
    'a charset of 16 bits': { headers: { 'Content-Type': 'application/json; charset=utf-16' }, body },
    gzip: { headers: { ...json, 'Content-Encoding': 'gzip' }, body: gzipSync(bomb) },
    deflate: { headers: { ...json, 'Content-Encoding': 'deflate' }, body: deflateSync(bomb) },
    brotli: { headers: { ...json, 'Content-Encoding': 'br' }, body: brotliCompressSync(bomb) },
    'an unknown encoding': { headers: { ...json, 'Content-Encoding': 'rot13' }, body },
    'plain text': { headers: { 'Content-Type': 'text/plain' }, body },
    'a form': { headers: { 'Content-Type': 'application/x-www-form-urlencoded' }, body: 'displayName=a' },
    XML: { headers: { 'Content-Type': 'application/xml' }, body: '<a/>' },
    'no content type': { body },
    'an empty content type': { headers: { 'Content-Type': '' }, body },
    'a body of 200 kB': { headers: json, body: JSON.stringify({ displayName: 'a'.repeat(200_000) }) },
    'a broken percent sign in the path': { method: 'GET', path: '/underlyings/%E0%A4%A' },
    'a lone percent sign in the path': { method: 'GET', path: '/underlyings/%' },
    'NUL in the path': { method: 'GET', path: '/underlyings/%00' },
    'dots in the path': { method: 'GET', path: '/underlyings/..%2f..%2fetc%2fpasswd' },
    'a broken percent sign in the query': { method: 'GET', path: '/entries?search=%E0%A4%A&state=%' },
    'brackets in the query': { method: 'GET', path: '/entries?search[$ne]=1' },
    'a method nobody knows': { method: 'PROPFIND' },
    'multipart without an end': {
      method: 'POST',
      path: `/underlyings/${randomUUID()}/price-uploads`,
      headers: { 'Content-Type': 'multipart/form-data; boundary=x' },
      body: '--x\r\nContent-Disposition: form-data; name="file"; filename="a"\r\n\r\nabc',
    },
    'multipart without a boundary': {
      method: 'POST',
      path: `/underlyings/${randomUUID()}/price-uploads`,
      headers: { 'Content-Type': 'multipart/form-data' },
      body: '--x--',
    },
  };

  it('is answered with 4xx and a number, without a word about our inside, and the server goes on', async () => {
    const server = app.app.listen(0, '127.0.0.1');
    await once(server, 'listening');
    const { port } = server.address() as AddressInfo; // a TCP server has one
    const ask = ({ method = 'PATCH', path = profile, headers = {}, body: sent }: Malformed) =>
      new Promise<{ status: number; text: string }>((resolve, reject) => {
        const made = httpRequest(
          {
            port,
            host: '127.0.0.1',
            method,
            path: `${apiRoot}${path}`,
            headers: {
              Cookie: owner.cookie,
              'Sec-Fetch-Site': 'same-origin',
              [requestHeader.name]: requestHeader.value,
              ...headers,
              ...(sent === undefined ? {} : { 'Content-Length': String(Buffer.byteLength(sent)) }),
            },
          },
          (answer) => {
            let text = '';
            answer.on('data', (part: Buffer) => (text += part.toString()));
            answer.on('end', () => resolve({ status: answer.statusCode ?? 0, text }));
          },
        );
        made.on('error', reject);
        made.end(sent);
      });
    try {
      expect(Object.keys(corpus).length).toBeGreaterThanOrEqual(30);
      for (const [name, malformed] of Object.entries(corpus)) {
        const { status, text } = await ask(malformed);
        expect([name, status >= 400 && status < 500 ? '4xx' : status]).toEqual([name, '4xx']);
        const { error } = apiErrorSchema.parse(JSON.parse(text));
        expect(error.requestId).toMatch(/^[0-9a-f-]{36}$/);
        expect(text).not.toMatch(/at \/|SELECT|node_modules|Error:|\.ts\b/);
      }
      await owner.get('/account/me').expect(200);
    } finally {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
    }
  });
});
