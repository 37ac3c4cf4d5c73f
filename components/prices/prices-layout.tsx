import { useGlobalSearchParams, usePathname } from 'expo-router';
import { type ReactNode } from 'react';
import { ListDetail } from '@/components/frame/list-detail';
import { PricesList } from '@/components/prices/prices-list';
import { UnderlyingScreen } from '@/components/prices/underlying-screen';
import { useLayout } from '@/components/ui/use-layout';
import { useUnderlyings } from '@/hooks/underlyings/use-underlyings';

/** The underlyings: their list beside the chosen one on a wide screen, one after the other on a phone. */
export function PricesLayout({ children }: { children: ReactNode }) {
  const { underlyingId } = useGlobalSearchParams<{ underlyingId?: string }>();
  const isList = usePathname() === '/prices';
  const isWide = useLayout().kind === 'wide';
  const firstId = useUnderlyings().data?.[0]?.underlying.id ?? null;
  const shownId = isList && isWide ? firstId : (underlyingId ?? null);
  const shown = shownId === null ? null : <UnderlyingScreen underlyingId={shownId} />;
  return (
    <ListDetail
      title="Prices"
      list={<PricesList chosenId={shownId} />}
      detail={isList ? shown : children}
      placeholder="The underlying you choose opens here."
    />
  );
}
