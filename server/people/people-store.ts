import { type DataSource, type EntityManager } from 'typeorm';
import { inTransaction } from '@/server/database/transaction';
import { DeskEntity } from '@/server/desk/desk-entity';
import { MembershipEntity } from '@/server/people/membership-entity';
import { PersonEntity } from '@/server/people/person-entity';
import { type Role } from '@/shared/contract/roles';

export interface PlaceOnDesk {
  readonly deskId: string;
  readonly deskName: string;
  readonly role: Role;
}

/** E-mail addresses are compared without regard to case and composition. */
export const emailKeyOf = (email: string): string => email.trim().normalize('NFKC').toLowerCase();

/** People and their places on desks: what must be known before there is a desk to scope by. */
export class PeopleStore {
  constructor(
    private readonly dataSource: DataSource,
    private readonly manager: EntityManager = dataSource.manager,
  ) {}

  inTransaction<T>(work: (store: PeopleStore, manager: EntityManager) => Promise<T>): Promise<T> {
    return inTransaction(this.dataSource, (manager) => work(new PeopleStore(this.dataSource, manager), manager));
  }

  findByEmail(email: string): Promise<PersonEntity | null> {
    return this.manager.findOneBy(PersonEntity, { emailKey: emailKeyOf(email) });
  }

  findById(id: string): Promise<PersonEntity | null> {
    return this.manager.findOneBy(PersonEntity, { id });
  }

  count(): Promise<number> {
    return this.manager.count(PersonEntity);
  }

  /** The desks a person is on, oldest place first. */
  async placesOf(personId: string): Promise<PlaceOnDesk[]> {
    const memberships = await this.manager.find(MembershipEntity, {
      where: { personId },
      order: { createdAt: 'ASC', id: 'ASC' },
    });
    const places = await Promise.all(
      memberships.map(async ({ deskId, role }) => {
        const desk = await this.manager.findOneBy(DeskEntity, { id: deskId });
        return desk === null ? [] : [{ deskId, deskName: desk.name, role }];
      }),
    );
    return places.flat();
  }

  async addPerson(person: PersonEntity): Promise<void> {
    await this.manager.insert(PersonEntity, person);
  }

  async addDesk(desk: DeskEntity, lead: MembershipEntity): Promise<void> {
    await this.manager.insert(DeskEntity, desk);
    await this.manager.insert(MembershipEntity, lead);
  }

  async changeProfile(id: string, { displayName, timeZone }: { displayName: string; timeZone: string }): Promise<void> {
    await this.manager.update(PersonEntity, { id }, { displayName, timeZone });
  }

  async replacePasswordHash(id: string, passwordHash: string): Promise<void> {
    await this.manager.update(PersonEntity, { id }, { passwordHash });
  }
}
