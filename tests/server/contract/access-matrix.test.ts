import { type Endpoint } from '@/shared/contract/define-endpoint';
import { allEndpoints } from '@/shared/contract/all-endpoints';
import { type Role } from '@/shared/contract/roles';
import { hasSample, sampleCall, sampleRows } from '@/tests/server/support/sample-calls';
import { startTestApp, type TestApp } from '@/tests/server/support/test-app';

const endpoints: readonly Endpoint[] = Object.values(allEndpoints);
const callers = ['anonymous', 'owner', 'trader', 'mentor', 'lead', 'stranger'] as const;
type Caller = (typeof callers)[number];
const roleOf: Readonly<Record<Exclude<Caller, 'anonymous'>, Role>> = {
  owner: 'trader',
  trader: 'trader',
  mentor: 'mentor',
  lead: 'lead',
  stranger: 'lead',
};

/** What may be said no to although the caller is let in. */
const refusedForOtherReasons = new Set([404, 409, 410, 422, 428]);

jest.setTimeout(60_000);

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(async () => {
  await app.stop();
});

/** The code an endpoint must refuse a caller with, or null when it must let them in. */
function refusal({ access, path, name }: Endpoint, caller: Caller): string | null {
  if (access.kind === 'public') return null;
  if (caller === 'anonymous') return 'not-signed-in';
  if (access.kind === 'signedIn') return name === 'switchDesk' && caller === 'stranger' ? 'not-found' : null;
  if (!access.roles.includes(roleOf[caller])) return 'not-allowed';
  const namesRow = path.includes(':');
  const isTheirs = caller === 'owner' || (caller !== 'stranger' && access.rows === 'desk');
  // A price upload begins under an underlying of the whole desk; the row it makes is the caller's own.
  const isOnDesk = caller !== 'stranger' && path.startsWith('/underlyings/:underlyingId');
  return namesRow && !isTheirs && !isOnDesk ? 'not-found' : null;
}

describe('every endpoint', () => {
  let cells = 0;
  afterAll(() => {
    process.stderr.write(`access matrix: ${cells} cells\n`);
    expect(cells).toBe(endpoints.length * callers.length);
  });

  it('has a sample body here', () => {
    expect(endpoints.filter((endpoint) => !hasSample(endpoint)).map(({ name }) => name)).toEqual([]);
  });

  it.each(endpoints.map((endpoint) => [endpoint.name, endpoint] as const))(
    '%s lets in whom its access names and nobody else',
    async (_, endpoint) => {
      const owner = await app.person({ role: 'trader' });
      const rows = await sampleRows(owner);
      const seen: Record<string, string | number> = {};
      const wanted: Record<string, string | number> = {};
      for (const caller of callers) {
        const person =
          caller === 'anonymous'
            ? app.anonymous
            : caller === 'owner'
              ? owner
              : await app.person({ role: roleOf[caller], ...(caller === 'stranger' ? {} : { deskOf: owner }) });
        const answer = await sampleCall(person, endpoint, rows);
        const code = refusal(endpoint, caller);
        wanted[caller] = code ?? 'let in';
        const isLetIn =
          answer.status === endpoint.status ||
          refusedForOtherReasons.has(answer.status) ||
          answer.body.error.code === 'credentials-wrong';
        seen[caller] = code === null && isLetIn ? 'let in' : String(answer.body.error?.code ?? answer.status);
        cells += 1;
      }
      expect(seen).toEqual(wanted);
    },
  );
});
