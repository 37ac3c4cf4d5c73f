import { type DataSource } from 'typeorm';
import { DeskEntity } from '@/server/desk/desk-entity';
import { PersonEntity } from '@/server/people/person-entity';
import { MembershipEntity } from '@/server/people/membership-entity';
import { type Role } from '@/shared/contract/roles';

export interface Member {
  readonly personId: string;
  readonly displayName: string;
  readonly role: Role;
}

/** The desk's own row, and its members by name. */
export class DeskStore {
  constructor(private readonly dataSource: DataSource) {}

  find(deskId: string): Promise<DeskEntity | null> {
    return this.dataSource.getRepository(DeskEntity).findOneBy({ id: deskId });
  }

  async members(deskId: string): Promise<Member[]> {
    return this.dataSource
      .getRepository(MembershipEntity)
      .createQueryBuilder('membership')
      .innerJoin(PersonEntity, 'person', 'person.id = membership.personId')
      .where('membership.deskId = :deskId', { deskId })
      .select(['membership.user_id AS personId', 'person.display_name AS displayName', 'membership.role AS role'])
      .orderBy('person.display_name')
      .getRawMany<Member>();
  }

  /** Writes the settings if the version is still the one they were read at; gives whether it was. */
  async replaceSettings(
    deskId: string,
    version: number,
    settings: Pick<DeskEntity, 'name' | 'currency' | 'ratePerYear' | 'overnightShare' | 'feePerContract'>,
  ): Promise<boolean> {
    const result = await this.dataSource
      .getRepository(DeskEntity)
      .update({ id: deskId, version }, { ...settings, version: version + 1 });
    return result.affected === 1;
  }
}
