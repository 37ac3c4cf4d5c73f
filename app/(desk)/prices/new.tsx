import { NewUnderlyingScreen } from '@/components/prices/new-underlying-screen';

export default function NewUnderlyingRoute() {
  return <NewUnderlyingScreen />;
}
