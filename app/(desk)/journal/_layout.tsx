import { Slot } from 'expo-router';
import { JournalLayout } from '@/components/journal/journal-layout';

export default function JournalRouteLayout() {
  return (
    <JournalLayout>
      <Slot />
    </JournalLayout>
  );
}
