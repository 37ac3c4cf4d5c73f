import { useGlobalSearchParams } from 'expo-router';
import { type ReactNode } from 'react';
import { ListDetail } from '@/components/frame/list-detail';
import { JournalList } from '@/components/journal/journal-list';

/** The journal: its list beside the chosen entry on a wide screen, one after the other on a phone. */
export function JournalLayout({ children }: { children: ReactNode }) {
  const { entryId } = useGlobalSearchParams<{ entryId?: string }>();
  return (
    <ListDetail
      title="Journal"
      list={<JournalList chosenId={entryId ?? null} />}
      detail={entryId === undefined ? null : children}
      placeholder="The entry you choose opens here."
    />
  );
}
