import { type DeskStore } from '@/server/desk/desk-store';

/** Display names of a desk's members by id. */
export class PeopleNames {
  constructor(private readonly desks: DeskStore) {}

  async of(deskId: string): Promise<Map<string, string>> {
    return new Map((await this.desks.members(deskId)).map(({ personId, displayName }) => [personId, displayName]));
  }
}
