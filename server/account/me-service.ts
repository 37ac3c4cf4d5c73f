import { type DeskScope, type DeskScopes } from '@/server/database/desk-scope';
import { type PeopleStore, type PlaceOnDesk } from '@/server/people/people-store';
import { type PersonEntity } from '@/server/people/person-entity';
import { type DeskService } from '@/server/desk/desk-service';
import { type Clock } from '@/server/runtime/clock';
import { type Me } from '@/shared/account/account-endpoints';

/** Who someone is on which desk, read from the database on each request so that a change bites at once. */
export class MeService {
  constructor(
    private readonly scopes: DeskScopes,
    private readonly people: PeopleStore,
    private readonly desks: DeskService,
    private readonly clock: Clock,
  ) {}

  /** The place on the chosen desk, else on the first one; null for a person who is on none. */
  async placeOf(personId: string, chosenDeskId: string | undefined): Promise<PlaceOnDesk | null> {
    const places = await this.people.placesOf(personId);
    return places.find((place) => place.deskId === chosenDeskId) ?? places[0] ?? null;
  }

  scopeFor(person: PersonEntity, place: PlaceOnDesk): DeskScope {
    return this.scopes.of({
      personId: person.id,
      displayName: person.displayName,
      deskId: place.deskId,
      role: place.role,
    });
  }

  async describe(person: PersonEntity, place: PlaceOnDesk): Promise<Me> {
    const places = await this.people.placesOf(person.id);
    return {
      person: { id: person.id, email: person.email, displayName: person.displayName, timeZone: person.timeZone },
      desk: { id: place.deskId, role: place.role, settings: await this.desks.settings(this.scopeFor(person, place)) },
      desks: places.map(({ deskId, deskName, role }) => ({ id: deskId, name: deskName, role })),
      serverTime: this.clock.now().toISOString(),
    };
  }
}
