import { type Entry } from '@/shared/entries/entry';
import { callsOf, cookieOf, type TestApp, type TestPerson } from '@/tests/server/support/test-app';

/** The person signed in again at a later instant, since sessions end while the days pass. */
export async function comeBack(app: TestApp, person: TestPerson, instant: string): Promise<TestPerson> {
  app.clock.set(instant);
  const { email, password } = person;
  const answer = await app.anonymous.post('/account/sign-in').send({ email, password }).expect(200);
  const cookie = cookieOf(answer.get('Set-Cookie'));
  return { ...person, cookie, ...callsOf(app.app, cookie) };
}

export const entryOf = async (person: TestPerson, id: string): Promise<Entry> =>
  (await person.get(`/entries/${id}`).expect(200)).body;
