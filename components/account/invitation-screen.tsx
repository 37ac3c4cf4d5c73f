import { useRouter } from 'expo-router';
import { useState } from 'react';
import { AccountPage } from '@/components/account/account-page';
import { NewAccountForm } from '@/components/account/new-account-form';
import { Txt } from '@/components/ui/text';
import { useAcceptInvitation } from '@/hooks/account/use-account';
import { localTimeZone } from '@/hooks/client/local-time-zone';

/** The token stands in the fragment of the address, which a browser never sends to a server. */
const tokenInAddress = () => window.location.hash.replace(/^#/, '');

/** The first lead of a fresh installation, invited once from the command line. */
export function InvitationScreen() {
  const router = useRouter();
  const accept = useAcceptInvitation();
  const [token] = useState(tokenInAddress);
  return (
    <AccountPage
      title="Start your desk"
      foot={<Txt size="row">The invitation works once and ends after 24 hours.</Txt>}
    >
      <NewAccountForm
        asksDeskName
        submitLabel="Start desk"
        isBusy={accept.isPending}
        error={accept.error}
        onSubmit={(account) =>
          accept.mutate(
            { body: { ...account, token, timeZone: localTimeZone() } },
            { onSuccess: () => router.replace('/') },
          )
        }
      />
    </AccountPage>
  );
}
