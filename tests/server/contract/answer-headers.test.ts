import supertest from 'supertest';
import { apiRoot } from '@/shared/contract/request-headers';
import { startTestApp, type TestApp } from '@/tests/server/support/test-app';

jest.setTimeout(60_000);

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

/** One answer of every kind: page, document, health, and each way to be refused. */
const answers = [
  ['a page', '/', 200],
  ['an address of the client', '/journal', 200],
  ['a file that is not there', '/assets/missing.js', 404],
  ['health', '/healthz', 200],
  ['readiness', '/readyz', 200],
  ['the contract', `${apiRoot}/openapi.json`, 200],
  ['nobody signed in', `${apiRoot}/today`, 401],
  ['no such endpoint', `${apiRoot}/nothing`, 404],
  ['broken escapes', `${apiRoot}/entries/%E0%A4%A`, 400],
] as const;

describe.each(answers)('the answer to %s', (_, path, status) => {
  it('lets nothing from elsewhere run, frame it or learn of it', async () => {
    const { headers } = await supertest(app.app).get(path).expect(status);
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
    expect(headers['content-type']).toMatch(/charset=utf-8/i);
  });

  it('is kept by no cache where it can carry anybody’s data', async () => {
    const { headers } = await supertest(app.app).get(path);
    if (path.startsWith(apiRoot)) expect(headers['cache-control']).toBe('no-store');
    expect(headers['access-control-allow-origin']).toBeUndefined();
  });
});
