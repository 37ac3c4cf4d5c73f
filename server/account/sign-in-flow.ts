import { type Request } from 'express';
import { Passport, type PassportStatic } from 'passport';
import { Strategy } from 'passport-local';
import { type AccountService } from '@/server/account/account-service';
import { ApiFailure } from '@/server/errors/api-failure';
import { type PeopleStore } from '@/server/people/people-store';
import { type PersonEntity } from '@/server/people/person-entity';

/** What a session remembers of its person. */
interface SessionPerson {
  readonly personId: string;
  readonly epoch: number;
}

/** Passport with its local strategy: sign-in renews the session id, sign-out ends the session for good. */
export class SignInFlow {
  readonly passport: PassportStatic;

  constructor(
    private readonly accounts: AccountService,
    private readonly people: PeopleStore,
  ) {
    // The types name the default instance only; a new one has the same shape and shares no state.
    this.passport = new Passport() as unknown as PassportStatic;
    this.passport.use(
      new Strategy(
        { usernameField: 'email', passwordField: 'password', passReqToCallback: true },
        (request, email, password, done) => {
          this.accounts.signIn({ email, password, address: request.ip ?? 'unknown' }).then(
            (person) => done(null, sessionPersonOf(person)),
            (error: unknown) => done(error),
          );
        },
      ),
    );
    this.passport.serializeUser<SessionPerson>((person, done) => done(null, person as SessionPerson)); // what the strategy or signInAs gave
    this.passport.deserializeUser<SessionPerson>((person, done) => done(null, person));
  }

  /** Proves e-mail and password of the request's body and starts a session. */
  signIn(request: Request): Promise<PersonEntity> {
    return new Promise((resolve, reject) => {
      const verified = (error: unknown, person: SessionPerson | false | null) => {
        if (error !== null && error !== undefined) reject(asError(error));
        else if (person === false || person === null)
          reject(new ApiFailure('credentials-wrong', 'This e-mail and password do not belong together.'));
        else this.startSession(request, person).then(resolve, reject);
      };
      const authenticate: (request: Request) => void = this.passport.authenticate('local', verified);
      authenticate(request);
    });
  }

  /** Starts a session for someone who has just made an account. */
  signInAs(request: Request, person: PersonEntity): Promise<PersonEntity> {
    return this.startSession(request, sessionPersonOf(person));
  }

  signOut(request: Request): Promise<void> {
    request.res?.set('Clear-Site-Data', '"cache"'); // what was shown must not come back with the Back button
    return new Promise((resolve, reject) => {
      request.session.destroy((error: unknown) =>
        error === null || error === undefined ? resolve() : reject(asError(error)),
      );
    });
  }

  /** The person of the session as the database knows them now; null for nobody, the disabled and ended sessions. */
  async signedInPerson(request: Request): Promise<PersonEntity | null> {
    const user = request.session.passport?.user;
    if (user === undefined) return null;
    const person = await this.people.findById(user.personId);
    return person === null || person.disabledAt !== null || person.sessionEpoch !== user.epoch ? null : person;
  }

  private startSession(request: Request, user: SessionPerson): Promise<PersonEntity> {
    return new Promise((resolve, reject) => {
      request.logIn(user, (error: unknown) => {
        if (error !== null && error !== undefined) reject(asError(error));
        else
          this.people.findById(user.personId).then((person) => {
            if (person === null) reject(new ApiFailure('not-signed-in', 'This account no longer exists.'));
            else resolve(person);
          }, reject);
      });
    });
  }
}

function sessionPersonOf({ id, sessionEpoch }: PersonEntity): SessionPerson {
  return { personId: id, epoch: sessionEpoch };
}

function asError(error: unknown): Error {
  return error instanceof Error ? error : new Error(String(error));
}
