import { useState } from 'react';
import { uuidv7 } from 'uuidv7';
import { useMe } from '@/hooks/account/use-me';
import { useCreateEntry } from '@/hooks/entries/use-entries';
import { newDraftPlan } from '@/shared/entries/new-draft-plan';

/** Starts a draft on an underlying with the desk's presets and hands its id on. */
export function useStartPlan(onStarted: (entryId: string) => void) {
  const { data: me } = useMe();
  const create = useCreateEntry();
  // One id for this visit: pressing twice or trying again after a lost answer makes one draft.
  const [entryId] = useState(uuidv7);
  const start = (underlyingId: string) => {
    if (me === undefined || me === null || create.isPending) return;
    create.mutate(
      { body: { id: entryId, plan: newDraftPlan(underlyingId, me.desk.settings) } },
      { onSuccess: () => onStarted(entryId) },
    );
  };
  return { start, isPending: create.isPending, error: create.error, reset: create.reset };
}
