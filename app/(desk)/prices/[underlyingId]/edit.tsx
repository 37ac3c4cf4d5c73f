import { useLocalSearchParams } from 'expo-router';
import { EditUnderlyingScreen } from '@/components/prices/edit-underlying-screen';

export default function EditUnderlyingRoute() {
  const { underlyingId } = useLocalSearchParams<'/prices/[underlyingId]/edit'>();
  return <EditUnderlyingScreen underlyingId={underlyingId} />;
}
