import { type DeskScope } from '@/server/database/desk-scope';
import { type EntryDescriber } from '@/server/entries/describe-entry';
import { type EntryEntity } from '@/server/entries/entry-entity';
import { EntryStore } from '@/server/entries/entry-store';
import { type EntryRow } from '@/shared/entries/entry';
import { type ExportQuery } from '@/shared/exports/export-endpoints';

export interface ExportedEntry {
  readonly row: EntryRow;
  readonly entity: EntryEntity;
}

const PAGE = 200;

/** The entries a reader may see and asked for, newest first, a page at a time. */
export async function* entryPages(
  scope: DeskScope,
  describer: EntryDescriber,
  { state, underlyingId, tag, search }: ExportQuery,
): AsyncGenerator<readonly ExportedEntry[]> {
  const store = new EntryStore(scope);
  let after: string | undefined;
  for (;;) {
    const entities = await store.list({ state, underlyingId, tag, search, after, limit: PAGE });
    if (entities.length === 0) return;
    const rows = await describer.rows(scope, entities);
    yield entities.flatMap((entity, index) => {
      const row = rows[index];
      return row === undefined ? [] : [{ row, entity }];
    });
    if (entities.length < PAGE) return;
    after = entities.at(-1)?.id;
  }
}
