import { useGlobalSearchParams, usePathname } from 'expo-router';
import { type ReactNode } from 'react';
import { ListDetail } from '@/components/frame/list-detail';
import { PricesList } from '@/components/prices/prices-list';

/** The underlyings: their list beside the chosen one on a wide screen, one after the other on a phone. */
export function PricesLayout({ children }: { children: ReactNode }) {
  const { underlyingId } = useGlobalSearchParams<{ underlyingId?: string }>();
  const isList = usePathname() === '/prices';
  return (
    <ListDetail
      title="Prices"
      list={<PricesList chosenId={underlyingId ?? null} />}
      detail={isList ? null : children}
      placeholder="The underlying you choose opens here."
    />
  );
}
