import { useGlobalSearchParams } from 'expo-router';
import { type ReactNode } from 'react';
import { EntryScreen } from '@/components/entry/entry-screen';
import { ListDetail } from '@/components/frame/list-detail';
import { JournalList } from '@/components/journal/journal-list';
import { useLayout } from '@/components/ui/use-layout';
import { useEntries } from '@/hooks/entries/use-entries';

/** The journal: its list beside the chosen entry on a wide screen, one after the other on a phone. */
export function JournalLayout({ children }: { children: ReactNode }) {
  const { entryId } = useGlobalSearchParams<{ entryId?: string }>();
  const isWide = useLayout().kind === 'wide';
  const newestId = useNewestSealedId();
  const shownId = entryId ?? (isWide ? newestId : null);
  const shown = shownId === null ? null : <EntryScreen entryId={shownId} />;
  return (
    <ListDetail
      title="Journal"
      list={<JournalList chosenId={shownId} />}
      detail={entryId === undefined ? shown : children}
      placeholder="The entry you choose opens here."
    />
  );
}

/** What a wide screen shows beside the list before anything is chosen; null while nothing is sealed. */
function useNewestSealedId(): string | null {
  const { data } = useEntries({});
  return data?.pages[0]?.entries.find(({ state }) => state !== 'draft')?.id ?? null;
}
