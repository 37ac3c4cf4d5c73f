import { useCallback, useEffect, useRef, useState } from 'react';
import { call } from '@/hooks/client/api-client';
import { ApiError } from '@/hooks/client/api-error';
import { type DraftPlan } from '@/shared/entries/draft-plan';
import { entrySchema, type Entry } from '@/shared/entries/entry';
import { entryEndpoints } from '@/shared/entries/entry-endpoints';

const PAUSE_BEFORE_SAVING_MS = 500;
const RETRY_AFTER_MS = 4_000;

export type DraftSaving =
  | { readonly kind: 'saved'; readonly at: string }
  | { readonly kind: 'saving' }
  | { readonly kind: 'failed'; readonly error: ApiError }
  /** Another tab or device saved in between; nothing is overwritten until the person chooses. */
  | { readonly kind: 'conflict'; readonly theirs: Entry };

interface Autosave {
  readonly saving: DraftSaving;
  /** Hands over the draft after a change; it is saved after a short pause. */
  readonly changed: (draft: DraftPlan) => void;
  /** Saves what is pending and gives the version it now has. */
  readonly flush: () => Promise<number>;
  /** Ends a conflict: the next save builds on their version. */
  readonly acceptVersion: (version: number) => void;
}

/**
 * Saves a draft as it is typed: one request at a time, the newest text last, built on the version it came from.
 * A failed save is tried again until it succeeds; the text stays in the form meanwhile.
 */
export function useDraftAutosave(entry: Entry, onSaved: (entry: Entry) => void): Autosave {
  const entryId = entry.row.id;
  const [saving, setSaving] = useState<DraftSaving>({ kind: 'saved', at: entry.planSavedAt });
  const version = useRef(entry.row.version);
  const pending = useRef<DraftPlan | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout> | null>(null);
  const running = useRef<Promise<void> | null>(null);
  const report = useRef(onSaved);
  useEffect(() => {
    report.current = onSaved;
  }, [onSaved]);

  const save = useCallback(async (): Promise<void> => {
    while (pending.current !== null) {
      const draft = pending.current;
      pending.current = null;
      setSaving({ kind: 'saving' });
      try {
        const saved = await call(entryEndpoints.saveDraft, {
          params: { entryId },
          body: draft,
          version: version.current,
        });
        version.current = saved.row.version;
        setSaving({ kind: 'saved', at: saved.planSavedAt });
        report.current(saved);
      } catch (error) {
        pending.current ??= draft;
        throw error;
      }
    }
  }, [entryId]);

  const start = useCallback((): Promise<void> => {
    if (timer.current !== null) clearTimeout(timer.current);
    timer.current = null;
    running.current ??= save()
      .catch((error: unknown) => {
        if (!(error instanceof ApiError)) throw error;
        const theirs = error.code === 'changed-elsewhere' ? entrySchema.safeParse(error.current) : null;
        setSaving(theirs?.success === true ? { kind: 'conflict', theirs: theirs.data } : { kind: 'failed', error });
        if (error.code === 'unreachable' || error.code === 'unavailable')
          timer.current = setTimeout(() => void start(), RETRY_AFTER_MS);
      })
      .finally(() => {
        running.current = null;
      });
    return running.current;
  }, [save]);

  const changed = useCallback(
    (draft: DraftPlan) => {
      pending.current = draft;
      // What is typed is not saved yet, and the page says so from the first letter on.
      setSaving((before) => (before.kind === 'saved' ? { kind: 'saving' } : before));
      if (timer.current !== null) clearTimeout(timer.current);
      timer.current = setTimeout(() => void start(), PAUSE_BEFORE_SAVING_MS);
    },
    [start],
  );

  const flush = useCallback(async () => {
    await running.current;
    if (pending.current !== null) await start();
    return version.current;
  }, [start]);

  const acceptVersion = useCallback((theirVersion: number) => {
    version.current = theirVersion;
  }, []);

  useEffect(() => {
    // Leaving the page or the screen: send what is still waiting for its pause.
    const leave = () => {
      if (pending.current !== null) void start();
    };
    document.addEventListener('visibilitychange', leave);
    window.addEventListener('pagehide', leave);
    return () => {
      document.removeEventListener('visibilitychange', leave);
      window.removeEventListener('pagehide', leave);
      leave();
    };
  }, [start]);

  return { saving, changed, flush, acceptVersion };
}
