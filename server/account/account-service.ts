import { defaultOvernightShare } from '@/journal/volatility/overnight-share';
import { emailKeyOf, type PeopleStore } from '@/server/people/people-store';
import { passwordWeakness } from '@/server/account/common-passwords';
import { InvitationEntity } from '@/server/account/invitation-entity';
import { type LoginThrottle } from '@/server/account/login-throttle';
import { type PasswordHasher } from '@/server/account/password-hasher';
import { isDuplicate } from '@/server/database/transaction';
import { ApiFailure } from '@/server/errors/api-failure';
import { ConflictError } from '@/server/errors/conflict-error';
import { ForbiddenError } from '@/server/errors/forbidden-error';
import { GoneError } from '@/server/errors/gone-error';
import { type PersonEntity } from '@/server/people/person-entity';
import { type Clock } from '@/server/runtime/clock';
import { type Ids } from '@/server/runtime/ids';
import { secretDigest } from '@/server/runtime/secrets';

export interface NewPerson {
  readonly email: string;
  readonly password: string;
  readonly displayName: string;
  readonly timeZone: string;
}

interface Dependencies {
  readonly people: PeopleStore;
  readonly hasher: PasswordHasher;
  readonly throttle: LoginThrottle;
  readonly clock: Clock;
  readonly ids: Ids;
  readonly isSignUpOpen: boolean;
}

/** Making accounts and proving who one is. */
export class AccountService {
  constructor(private readonly dependencies: Dependencies) {}

  /** An account with a desk of one, of which its person is the lead. */
  async signUp(person: NewPerson): Promise<PersonEntity> {
    if (!this.dependencies.isSignUpOpen) throw new ForbiddenError('Accounts are made by invitation here.');
    return this.makePerson(person, deskNameFor(person.displayName));
  }

  /** The first lead of a fresh installation; the token works once and for 24 hours. */
  async acceptInvitation({
    token,
    deskName,
    ...person
  }: NewPerson & { token: string; deskName: string }): Promise<PersonEntity> {
    return this.makePerson(person, deskName, secretDigest(token));
  }

  /** @throws {ApiFailure} `credentials-wrong`, the same for an unknown account and a wrong password; `too-many-requests`. */
  async signIn({
    email,
    password,
    address,
  }: {
    email: string;
    password: string;
    address: string;
  }): Promise<PersonEntity> {
    const { people, hasher, throttle } = this.dependencies;
    const attempt = { emailKey: emailKeyOf(email), address };
    await throttle.check(attempt);
    const person = await people.findByEmail(email);
    const isUsable = person !== null && person.disabledAt === null;
    const isMatch = await hasher.matches(password, isUsable ? person.passwordHash : null);
    if (!isUsable || !isMatch) {
      await throttle.failed(attempt);
      throw new ApiFailure('credentials-wrong', 'This e-mail and password do not belong together.');
    }
    await throttle.succeeded(attempt);
    if (hasher.isOutdated(person.passwordHash))
      await people.replacePasswordHash(person.id, await hasher.hash(password));
    return person;
  }

  private async makePerson(person: NewPerson, deskName: string, invitationDigest?: string): Promise<PersonEntity> {
    const { people, hasher, clock, ids } = this.dependencies;
    const weakness = passwordWeakness(person.password, [person.displayName, person.email]);
    if (weakness !== null) throw new ApiFailure('input-invalid', weakness, [{ field: 'password', message: weakness }]);
    const passwordHash = await hasher.hash(person.password);
    const now = clock.now();
    const row: PersonEntity = {
      id: ids.next(),
      email: person.email,
      emailKey: emailKeyOf(person.email),
      displayName: person.displayName,
      timeZone: person.timeZone,
      passwordHash,
      sessionEpoch: 0,
      disabledAt: null,
      createdAt: now,
    };
    const deskId = ids.next();
    try {
      await people.inTransaction(async (store, manager) => {
        if (invitationDigest !== undefined) {
          const used = await manager
            .createQueryBuilder()
            .update(InvitationEntity)
            .set({ usedAt: now })
            .where('token_digest = :digest AND used_at IS NULL AND expires_at > :now', {
              digest: invitationDigest,
              now,
            })
            .execute();
          if (used.affected !== 1)
            throw new GoneError('invitation-invalid', 'This invitation was used, has ended, or never was.');
        }
        await store.addPerson(row);
        await store.addDesk(
          {
            id: deskId,
            version: 1,
            name: deskName,
            currency: 'USD',
            ratePerYear: 0.04,
            overnightShare: defaultOvernightShare,
            feePerContract: '0.65',
            createdAt: now,
          },
          { id: ids.next(), deskId, personId: row.id, role: 'lead', createdAt: now },
        );
      });
    } catch (error) {
      if (!isDuplicate(error)) throw error;
      const message = 'An account with this e-mail exists already.';
      throw new ConflictError('email-taken', message, [{ field: 'email', message }]);
    }
    return row;
  }
}

const LONGEST_DESK_NAME = 120;

/** Named after its person, as far as their name fits. */
function deskNameFor(displayName: string): string {
  return [...`Desk of ${displayName}`].slice(0, LONGEST_DESK_NAME).join('');
}
