import { type EntryService } from '@/server/entries/entry-service';
import { type FillService } from '@/server/fills/fill-service';
import { type HandlersOf } from '@/server/http/handler';
import { type SealService } from '@/server/seals/seal-service';
import { type entryEndpoints } from '@/shared/entries/entry-endpoints';

interface Services {
  readonly entries: EntryService;
  readonly seals: SealService;
  readonly fills: FillService;
}

export function entryHandlers({ entries, seals, fills }: Services): HandlersOf<typeof entryEndpoints> {
  return {
    listEntries: ({ scope, query }) => entries.list(scope, query),
    createEntry: ({ scope, body }) => entries.create(scope, body),
    readEntry: ({ scope, params }) => entries.read(scope, params.entryId),
    saveDraft: ({ scope, params, version, body }) =>
      entries.saveDraft(scope, { entryId: params.entryId, version, plan: body }),
    discardDraft: ({ scope, params, version, requestId }) =>
      entries.discard(scope, { entryId: params.entryId, version, requestId }).then(() => undefined),
    sealEntry: async ({ scope, params, version, requestId }) =>
      entries.describe(scope, await seals.seal(scope, { entryId: params.entryId, version, requestId })),
    abandonEntry: ({ scope, params, version, requestId }) =>
      entries.abandon(scope, { entryId: params.entryId, version, requestId }),
    addFill: async ({ scope, params, body, requestId }) =>
      entries.describe(scope, await fills.add(scope, { entryId: params.entryId, fill: body, requestId })),
    removeFill: async ({ scope, params, requestId }) =>
      entries.describe(scope, await fills.remove(scope, { ...params, requestId })),
    saveLesson: ({ scope, params, version, body }) =>
      entries.saveLesson(scope, { entryId: params.entryId, version, lesson: body.lesson }),
  };
}
