import { mountEndpoints } from '@/server/http/mount-endpoints';
import { allEndpoints } from '@/shared/contract/all-endpoints';
import { apiRoot } from '@/shared/contract/request-headers';
import { type Endpoint } from '@/shared/contract/define-endpoint';
import { samplePath } from '@/tests/server/support/sample-calls';
import { startTestApp, type TestApp } from '@/tests/server/support/test-app';

const endpoints: readonly Endpoint[] = Object.values(allEndpoints);
const routeOf = ({ method, path }: Endpoint) => `${method} ${apiRoot}${path}`;

jest.setTimeout(60_000);

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

describe('the route table', () => {
  it('is keyed by the endpoints’ own names, each method and path once', () => {
    expect(Object.entries(allEndpoints).filter(([key, { name }]) => key !== name)).toEqual([]);
    expect(new Set(endpoints.map(routeOf)).size).toBe(endpoints.length);
  });

  it('is what openapi.json tells, and nothing else', async () => {
    const { body } = await app.anonymous.get('/openapi.json').expect(200);
    const paths: Record<string, Record<string, { operationId: string }>> = body.paths;
    const told = Object.entries(paths).flatMap(([path, operations]) =>
      Object.entries(operations).map(
        ([method, { operationId }]) => `${operationId} ${method.toUpperCase()} ${path.replace(/\{(\w+)\}/g, ':$1')}`,
      ),
    );
    expect(told.sort()).toEqual(endpoints.map((endpoint) => `${endpoint.name} ${routeOf(endpoint)}`).sort());
  });

  it('refuses to start with an endpoint without handler or a handler without endpoint', () => {
    const mount = (handlers: Record<string, () => Promise<unknown>>) => () =>
      mountEndpoints({
        endpoints: { readMe: allEndpoints.readMe },
        handlers,
        me: null as never, // never reached
        signedInPerson: () => Promise.resolve(null),
      });
    const handler = () => Promise.resolve(undefined);
    expect(mount({})).toThrow('Endpoints without handler: readMe');
    expect(mount({ readMe: handler, forgotten: handler })).toThrow('handlers without endpoint: forgotten');
    expect(mount({ readMe: handler })).not.toThrow();
  });

  it('answers 405 with the methods an address takes, and 404 elsewhere', async () => {
    const rows = { deskId: 'a', underlyingId: 'b', entryId: 'c', uploadId: 'd', reviewId: 'd' };
    const methods = ['get', 'post', 'put', 'patch', 'delete'] as const;
    for (const endpoint of endpoints) {
      const taken = endpoints.filter(({ path }) => path === endpoint.path).map(({ method }) => method.toLowerCase());
      const path = samplePath(endpoint, rows);
      for (const method of methods.filter((name) => !taken.includes(name))) {
        const answer = await app.anonymous[method](path);
        expect([path, method, answer.status]).toEqual([path, method, 405]);
      }
    }
    await app.anonymous.get('/nothing').expect(404);
  });
});
