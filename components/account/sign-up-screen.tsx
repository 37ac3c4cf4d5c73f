import { Link, useRouter } from 'expo-router';
import { AccountPage } from '@/components/account/account-page';
import { NewAccountForm } from '@/components/account/new-account-form';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';
import { useSignUp } from '@/hooks/account/use-account';
import { localTimeZone } from '@/hooks/client/local-time-zone';

export function SignUpScreen() {
  const router = useRouter();
  const colours = useColours();
  const signUp = useSignUp();
  return (
    <AccountPage
      title="Make an account"
      foot={
        <Txt size="row">
          {'You have one? '}
          <Link href="/sign-in" style={{ color: colours.bramble, fontWeight: '600' }}>
            Sign in
          </Link>
        </Txt>
      }
    >
      <NewAccountForm
        asksDeskName={false}
        submitLabel="Make account"
        isBusy={signUp.isPending}
        error={signUp.error}
        onSubmit={({ displayName, email, password }) =>
          signUp.mutate(
            { body: { displayName, email, password, timeZone: localTimeZone() } },
            { onSuccess: () => router.replace('/') },
          )
        }
      />
    </AccountPage>
  );
}
