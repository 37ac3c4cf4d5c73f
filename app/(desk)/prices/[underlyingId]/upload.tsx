import { useLocalSearchParams } from 'expo-router';
import { UploadScreen } from '@/components/prices/upload-screen';

export default function UploadRoute() {
  const { underlyingId } = useLocalSearchParams<'/prices/[underlyingId]/upload'>();
  return <UploadScreen underlyingId={underlyingId} />;
}
