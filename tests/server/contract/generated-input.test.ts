import { once } from 'node:events';
import { type Server } from 'node:http';
import { type AddressInfo } from 'node:net';
import { seededRandom, type SeededRandom } from '@/journal/random/seeded-random';
import { allEndpoints } from '@/shared/contract/all-endpoints';
import { type Endpoint } from '@/shared/contract/define-endpoint';
import { apiErrorSchema, apiErrors } from '@/shared/contract/error-codes';
import { apiRoot, requestHeader } from '@/shared/contract/request-headers';
import { sampleBody, samplePath, type SampleRows, sampleRows } from '@/tests/server/support/sample-calls';
import { startTestApp, testOrigin, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

jest.setTimeout(180_000);

type Json = null | boolean | number | string | Json[] | { [key: string]: Json };

const endpoints: readonly Endpoint[] = Object.values(allEndpoints);
const statuses = new Set<number>(Object.values(apiErrors).map(({ status }) => status));
const INPUTS_EACH = 300;

let app: TestApp;
let server: Server;
let address: string;
let owner: TestPerson;
let rows: SampleRows;
beforeAll(async () => {
  app = await startTestApp();
  owner = await app.person({ role: 'lead' });
  rows = await sampleRows(owner);
  server = app.app.listen(0, '127.0.0.1');
  await once(server, 'listening');
  address = `http://127.0.0.1:${(server.address() as AddressInfo).port}${apiRoot}`;
});
afterAll(async () => {
  server.closeAllConnections();
  server.close();
  await app.stop();
});

const oddTexts = [
  '',
  ' ',
  '0',
  '-1',
  '1e999',
  'NaN',
  '\u0000',
  '\uD800',
  '٣',
  "' OR 1=1 --",
  '{"$gt":""}',
  '../..',
  'x'.repeat(5000),
  '2026-02-30',
  '2026-12-09T25:00:00Z',
  '__proto__',
  '<script>',
  '\u202Eabc',
  '1,5',
  '１',
];
const oddKeys = ['__proto__', 'constructor', 'deskId', 'isAdmin', 'id', 'x'.repeat(300), ''];

function oddValue(random: SeededRandom, depth: number): Json {
  const kinds: (() => Json)[] = [
    () => null,
    () => random.uniform() < 0.5,
    () => (random.uniform() - 0.5) * 10 ** (random.index(40) - 10),
    () => random.index(1000) - 500,
    () => oddTexts[random.index(oddTexts.length)] ?? '',
    () => [],
    () => ({}),
    () => (depth > 3 ? 0 : Array.from({ length: random.index(4) }, () => oddValue(random, depth + 1))),
    () => (depth > 3 ? 0 : { [oddKeys[random.index(oddKeys.length)] ?? 'a']: oddValue(random, depth + 1) }),
  ];
  return kinds[random.index(kinds.length)]?.() ?? null;
}

/** The value with one or a few parts changed, added or taken away. */
function mutated(value: Json, random: SeededRandom): Json {
  if (random.uniform() < 0.15) return oddValue(random, 0);
  if (Array.isArray(value)) {
    const list = [...value];
    const at = random.index(list.length + 1);
    if (at === list.length || random.uniform() < 0.2) list.push(oddValue(random, 0));
    else list[at] = mutated(list[at] ?? null, random);
    return list;
  }
  if (value === null || typeof value !== 'object') return oddValue(random, 0);
  const keys = Object.keys(value);
  const copy: { [key: string]: Json } = { ...value };
  const key = keys[random.index(Math.max(1, keys.length))];
  const chance = random.uniform();
  if (key === undefined || chance < 0.15) copy[oddKeys[random.index(oddKeys.length)] ?? 'a'] = oddValue(random, 0);
  else if (chance < 0.3) delete copy[key];
  else copy[key] = mutated(copy[key] ?? null, random);
  return copy;
}

async function rowCounts(): Promise<string> {
  const tables = [
    'entry',
    'fill',
    'underlying',
    'bar',
    'sealed_forecast',
    'desk',
    'membership',
    'outcome',
    'scored_odds',
  ];
  const counts: unknown = await app.dataSource.query(
    `SELECT ${tables.map((table) => `(SELECT COUNT(*) FROM \`${table}\`) AS \`${table}\``).join(', ')}`,
  );
  return JSON.stringify(counts);
}

describe('every endpoint, given what nobody should send', () => {
  it.each(endpoints.map((endpoint) => [endpoint.name, endpoint] as const))(
    '%s answers with its success or the one form of refusal, and a refusal stores nothing',
    async (name, endpoint) => {
      const random = seededRandom(20261201 + name.length * 1000 + name.charCodeAt(0));
      let refused = 0;
      for (let input = 0; input < INPUTS_EACH; input += 1) {
        const hasBody = endpoint.body !== null && endpoint.body !== 'file';
        const sample: Json = hasBody ? JSON.parse(JSON.stringify(sampleBody(endpoint, rows))) : null;
        const body = hasBody ? mutated(mutated(sample, random), random) : null;
        const isPathChanged = !hasBody || random.uniform() < 0.2;
        const path = samplePath(endpoint, rows);
        const oddText = oddTexts[random.index(oddTexts.length)] ?? '';
        const query = isPathChanged ? `?${encodeURIComponent(oddText.toWellFormed?.() ?? 'a')}=${input}` : '';
        const before = await rowCounts();
        const answer = await fetch(`${address}${path}${query}`, {
          method: endpoint.method,
          headers: {
            cookie: owner.cookie,
            origin: testOrigin,
            [requestHeader.name]: requestHeader.value,
            ...(hasBody ? { 'content-type': 'application/json' } : {}),
            ...(endpoint.needsVersion ? { 'if-match': String(1 + random.index(3)) } : {}),
          },
          body: hasBody ? JSON.stringify(body) : undefined,
        });
        const text = await answer.text();
        if (answer.ok) continue;
        refused += 1;
        const seen = `${name} ${JSON.stringify(body).slice(0, 400)} ${query}: ${answer.status} ${text.slice(0, 300)}`;
        if (answer.status >= 500 || !statuses.has(answer.status) || !apiErrorSchema.safeParse(JSON.parse(text)).success)
          throw new Error(seen);
        if ((await rowCounts()) !== before) throw new Error(`${seen}, and rows changed`);
      }
      expect(refused).toBeGreaterThan(INPUTS_EACH / 4);
    },
  );
});
