import { Redirect, usePathname } from 'expo-router';
import { type ReactNode } from 'react';
import { AppFrame } from '@/components/frame/app-frame';
import { ErrorState, LoadingState, OfflineBanner } from '@/components/ui/states';
import { useMe } from '@/hooks/account/use-me';

/** What is behind sign-in: without a session it leads to the sign-in page and back again afterwards. */
export function SignedIn({ children }: { children: ReactNode }) {
  const pathname = usePathname();
  const { data: me, error, isPending, refetch } = useMe();
  if (isPending) return <LoadingState label="Opening your desk" />;
  if (error) return <ErrorState error={error} onRetry={refetch} />;
  if (me === null)
    return <Redirect href={{ pathname: '/sign-in', params: pathname === '/' ? {} : { next: pathname } }} />;
  return (
    <AppFrame person={{ displayName: me.person.displayName, deskName: me.desk.settings.name }}>
      <OfflineBanner />
      {children}
    </AppFrame>
  );
}
