import { type AccountService } from '@/server/account/account-service';
import { type MeService } from '@/server/account/me-service';
import { type SignInFlow } from '@/server/account/sign-in-flow';
import { ForbiddenError } from '@/server/errors/forbidden-error';
import { NotFoundError } from '@/server/errors/not-found-error';
import { type HandlersOf } from '@/server/http/handler';
import { type PeopleStore } from '@/server/people/people-store';
import { type PersonEntity } from '@/server/people/person-entity';
import { type accountEndpoints, type Me } from '@/shared/account/account-endpoints';

interface Dependencies {
  readonly accounts: AccountService;
  readonly flow: SignInFlow;
  readonly me: MeService;
  readonly people: PeopleStore;
}

export function accountHandlers({ accounts, flow, me, people }: Dependencies): HandlersOf<typeof accountEndpoints> {
  const describe = async (person: PersonEntity, deskId: string | undefined): Promise<Me> => {
    const place = await me.placeOf(person.id, deskId);
    if (place === null) throw new ForbiddenError('You are on no desk.');
    return me.describe(person, place);
  };
  return {
    signUp: async ({ body, request }) => describe(await flow.signInAs(request, await accounts.signUp(body)), undefined),
    acceptInvitation: async ({ body, request }) =>
      describe(await flow.signInAs(request, await accounts.acceptInvitation(body)), undefined),
    signIn: async ({ request }) => describe(await flow.signIn(request), undefined),
    signOut: async ({ request }) => flow.signOut(request).then(() => undefined),
    readMe: async ({ person, request }) => describe(person, request.session.deskId),
    switchDesk: async ({ person, body, request }) => {
      const place = await me.placeOf(person.id, body.deskId);
      if (place?.deskId !== body.deskId) throw new NotFoundError();
      request.session.deskId = body.deskId;
      return me.describe(person, place);
    },
    editProfile: async ({ person, body, request }) => {
      await people.changeProfile(person.id, body);
      return describe({ ...person, ...body }, request.session.deskId);
    },
  };
}
