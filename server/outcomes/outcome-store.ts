import { Brackets } from 'typeorm';
import { type DeskScope } from '@/server/database/desk-scope';
import { OutcomeEntity } from '@/server/outcomes/outcome-entity';

/** The outcomes of a desk's entries. */
export class OutcomeStore {
  constructor(private readonly scope: DeskScope) {}

  /** Those of some entries that are not complete yet, and those of others whatever they are. */
  async listIncompleteOf(
    entryIds: readonly string[],
    { orAnyOf }: { orAnyOf: readonly string[] },
  ): Promise<OutcomeEntity[]> {
    if (entryIds.length === 0) return [];
    return this.scope
      .repository(OutcomeEntity)
      .query('outcome')
      .andWhere('outcome.entryId IN (:...entryIds)', { entryIds })
      .andWhere(
        new Brackets((either) => {
          either.where('outcome.isComplete = 0');
          if (orAnyOf.length > 0) either.orWhere('outcome.entryId IN (:...orAnyOf)', { orAnyOf });
        }),
      )
      .getMany();
  }

  async listOf(entryIds: readonly string[]): Promise<OutcomeEntity[]> {
    if (entryIds.length === 0) return [];
    return this.scope
      .repository(OutcomeEntity)
      .query('outcome')
      .andWhere('outcome.entryId IN (:...entryIds)', { entryIds })
      .getMany();
  }
}
