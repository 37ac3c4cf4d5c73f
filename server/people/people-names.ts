import { type DeskScope } from '@/server/database/desk-scope';
import { MembershipEntity } from '@/server/people/membership-entity';
import { PersonEntity } from '@/server/people/person-entity';

/** Display names of a desk's members by id, read over the scope's own connection so that a transaction needs only one. */
export async function namesOnDesk(scope: DeskScope): Promise<Map<string, string>> {
  const members = await scope
    .repository(MembershipEntity)
    .query('membership')
    .innerJoin(PersonEntity, 'person', 'person.id = membership.personId')
    .select(['membership.user_id AS personId', 'person.display_name AS displayName'])
    .getRawMany<{ personId: string; displayName: string }>();
  return new Map(members.map(({ personId, displayName }) => [personId, displayName]));
}
