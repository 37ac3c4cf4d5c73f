import { randomUUID } from 'node:crypto';
import { type Test } from 'supertest';
import { type Endpoint } from '@/shared/contract/define-endpoint';
import { addDraft, addUnderlying, completePlan, fill, option, shareFields } from '@/tests/server/support/journal';
import { type TestPerson } from '@/tests/server/support/test-app';

/** Rows of one trader that the paths of the contract can name. */
export interface SampleRows {
  readonly deskId: string;
  readonly underlyingId: string;
  readonly entryId: string;
  readonly uploadId: string;
  readonly reviewId: string;
}

const writtenRule = { action: 'keep', rule: 'Seal first.', evidence: 'Three of three.', followedLast: null };

export async function sampleRows(owner: TestPerson): Promise<SampleRows> {
  const underlyingId = await addUnderlying(owner);
  const upload = await owner
    .post(`/underlyings/${underlyingId}/price-uploads`)
    .attach('file', Buffer.from('Date,Close\n2026-12-07,97.10\n2026-12-08,97.90\n'), 'closes.csv')
    .expect(201);
  const reviewId = randomUUID();
  await owner
    .post('/weekly-reviews')
    .send({ id: reviewId, week: '2026-11-30', ...writtenRule })
    .expect(201);
  return {
    deskId: owner.deskId,
    underlyingId,
    entryId: await addDraft(owner, completePlan(underlyingId)),
    uploadId: String(upload.body.id),
    reviewId,
  };
}

/** The address of an endpoint with its ids filled in; ids that are not there yet are new ones. */
export function samplePath({ path }: Endpoint, rows: SampleRows): string {
  const known: Record<string, string> = { ...rows, sessionDate: '2026-12-08', command: 'symbol' };
  return path.replace(/:(\w+)/g, (_, name: string) => known[name] ?? randomUUID());
}

const account = (): object => ({
  email: `${randomUUID()}@example.org`,
  password: 'ten thousand grey pebbles',
  displayName: 'Ada Quill',
  timeZone: 'UTC',
});

/** A body each endpoint takes, by its name. */
const bodies: Readonly<Record<string, (rows: SampleRows) => object>> = {
  signUp: account,
  computeCases: () => ({ cases: [7] }), // what a case may hold is told in its answer
  acceptInvitation: () => ({ ...account(), token: 'no invitation has this token', deskName: 'Desk' }),
  signIn: () => ({ email: 'nobody@example.org', password: 'not the password of anyone' }),
  switchDesk: ({ deskId }) => ({ deskId }),
  editProfile: () => ({ displayName: 'Ada Quill', timeZone: 'UTC' }),
  editDeskSettings: () => ({
    name: 'Desk',
    currency: 'USD',
    ratePerYear: 0.04,
    overnightShare: 0.3,
    feePerContract: '0.65',
  }),
  createUnderlying: () => ({ id: randomUUID(), ...shareFields, symbol: 'WUVZ' }),
  editUnderlying: () => shareFields,
  putBar: () => ({ close: '97.90', open: null, high: null, low: null, settlement: null }),
  rereadPriceUpload: () => ({
    sheet: null,
    headerRow: 1,
    columns: ['date', 'close'],
    dateOrder: 'year-month-day',
    decimalMark: 'point',
  }),
  createEntry: ({ underlyingId }) => ({ id: randomUUID(), plan: completePlan(underlyingId) }),
  saveDraft: ({ underlyingId }) => completePlan(underlyingId),
  addFill: () => fill('sell', option('put', '97'), { price: '0.78', tradedAt: '2026-12-09T20:00:00.000Z' }),
  createWeeklyReview: () => ({ id: randomUUID(), week: '2026-12-07', ...writtenRule }),
  editWeeklyReview: () => writtenRule,
  saveLesson: () => ({ lesson: 'Wait for the close.' }),
};

/** Whether there is a body to send for an endpoint that takes JSON. */
export const hasSample = ({ name, body }: Endpoint): boolean => body === null || body === 'file' || name in bodies;

export function sampleBody({ name }: Endpoint, rows: SampleRows): object {
  return bodies[name]?.(rows) ?? {};
}

export const methodOf = ({ method }: Endpoint) =>
  (({ GET: 'get', POST: 'post', PUT: 'put', PATCH: 'patch', DELETE: 'delete' }) as const)[method];

/** Calls an endpoint with everything it takes. */
export function sampleCall(
  caller: Pick<TestPerson, 'get' | 'post' | 'put' | 'patch' | 'delete'>,
  endpoint: Endpoint,
  rows: SampleRows,
): Test {
  const call = caller[methodOf(endpoint)](samplePath(endpoint, rows));
  if (endpoint.needsVersion) call.set('If-Match', '1');
  if (endpoint.body === 'file') return call.attach('file', Buffer.from('Date,Close\n2026-12-07,97.10\n'), 'closes.csv');
  return endpoint.body === null ? call : call.send(sampleBody(endpoint, rows));
}
