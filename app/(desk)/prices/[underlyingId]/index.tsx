import { useLocalSearchParams } from 'expo-router';
import { UnderlyingScreen } from '@/components/prices/underlying-screen';

export default function UnderlyingRoute() {
  const { underlyingId, session } = useLocalSearchParams<'/prices/[underlyingId]', { session?: string }>();
  return <UnderlyingScreen key={underlyingId} underlyingId={underlyingId} session={session} />;
}
