import { randomUUID } from 'node:crypto';
import { callsOf, cookieOf, type TestPerson } from '@/tests/server/support/test-app';

const password = 'ten thousand grey pebbles';

/** Makes an account on a server in another process; `callsOf` with the cookie goes on after that process has ended. */
export async function signUpAt(origin: string): Promise<TestPerson> {
  const email = `${randomUUID()}@example.org`;
  const answer = await callsOf(origin, null)
    .post('/account/sign-up')
    .send({ email, password, displayName: 'Ada', timeZone: 'UTC' })
    .expect(201);
  const cookie = cookieOf(answer.get('Set-Cookie'));
  return {
    id: String(answer.body.person.id),
    deskId: String(answer.body.desk.id),
    email,
    password,
    cookie,
    ...callsOf(origin, cookie),
  };
}
