import { useLocalSearchParams } from 'expo-router';
import { EntryScreen } from '@/components/entry/entry-screen';
import { sectionNamed } from '@/components/entry/entry-sections';

export default function EntryRoute() {
  const { entryId, section } = useLocalSearchParams<'/journal/[entryId]', { section?: string }>();
  return <EntryScreen key={entryId} entryId={entryId} section={sectionNamed(section)} />;
}
