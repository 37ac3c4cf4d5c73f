import { Redirect, usePathname } from 'expo-router';
import { type ReactNode } from 'react';
import { AppFrame } from '@/components/frame/app-frame';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { OfflineBanner } from '@/components/ui/states';
import { useMe } from '@/hooks/account/use-me';

/** What is behind sign-in: without a session it leads to the sign-in page and back again afterwards. */
export function SignedIn({ children }: { children: ReactNode }) {
  const pathname = usePathname();
  const { data: me, error, isPending, refetch } = useMe();
  if (isPending || error)
    return <UnreadyScreen title="Opening your desk" loading="Opening your desk" error={error} onRetry={refetch} />;
  if (me === null)
    return <Redirect href={{ pathname: '/sign-in', params: pathname === '/' ? {} : { next: pathname } }} />;
  return (
    <AppFrame person={{ displayName: me.person.displayName, deskName: me.desk.settings.name }}>
      <OfflineBanner />
      {children}
    </AppFrame>
  );
}
