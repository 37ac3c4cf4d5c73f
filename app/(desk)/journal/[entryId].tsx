import { useLocalSearchParams } from 'expo-router';
import { EntryScreen } from '@/components/entry/entry-screen';

export default function EntryRoute() {
  const { entryId } = useLocalSearchParams<'/journal/[entryId]'>();
  return <EntryScreen entryId={entryId} />;
}
