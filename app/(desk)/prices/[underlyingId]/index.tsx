import { useLocalSearchParams } from 'expo-router';
import { UnderlyingScreen } from '@/components/prices/underlying-screen';

export default function UnderlyingRoute() {
  const { underlyingId } = useLocalSearchParams<'/prices/[underlyingId]'>();
  return <UnderlyingScreen underlyingId={underlyingId} />;
}
