import { Slot } from 'expo-router';
import { PricesLayout } from '@/components/prices/prices-layout';

export default function PricesRouteLayout() {
  return (
    <PricesLayout>
      <Slot />
    </PricesLayout>
  );
}
