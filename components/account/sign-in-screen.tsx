import { zodResolver } from '@hookform/resolvers/zod';
import { Link, useLocalSearchParams, useRouter, type Href } from 'expo-router';
import { View } from 'react-native';
import { Controller, useForm } from 'react-hook-form';
import { z } from 'zod';
import { AccountPage } from '@/components/account/account-page';
import { AccountRefusal } from '@/components/account/account-refusal';
import { Button } from '@/components/ui/button';
import { TextField } from '@/components/ui/field';
import { Txt } from '@/components/ui/text';
import { useColours } from '@/components/ui/theme/use-theme';
import { useSignIn } from '@/hooks/account/use-account';

const formSchema = z.strictObject({
  email: z.string().min(1, 'Type your e-mail address.'),
  password: z.string().min(1, 'Type your password.'),
});

/** Where a signed-in person goes on: a path of our own, else Today. */
function ownPath(next: string | string[] | undefined): Href {
  return typeof next === 'string' && /^\/(?!\/)/.test(next) ? (next as Href) : '/'; // checked to be a path of our own
}

export function SignInScreen() {
  const router = useRouter();
  const { next } = useLocalSearchParams();
  const colours = useColours();
  const signIn = useSignIn();
  const { control, handleSubmit, formState } = useForm({
    resolver: zodResolver(formSchema),
    defaultValues: { email: '', password: '' },
  });
  const submit = handleSubmit((body) => signIn.mutate({ body }, { onSuccess: () => router.replace(ownPath(next)) }));

  return (
    <AccountPage
      title="Sign in"
      foot={
        <Txt size="row">
          {'New here? '}
          <Link href="/sign-up" style={{ color: colours.bramble, fontWeight: '600' }}>
            Make an account
          </Link>
        </Txt>
      }
    >
      <View style={{ gap: 16 }}>
        <AccountRefusal error={signIn.error} />
        <Controller
          control={control}
          name="email"
          render={({ field }) => (
            <TextField
              label="E-mail"
              value={field.value}
              onChangeText={field.onChange}
              onBlur={field.onBlur}
              error={formState.errors.email?.message}
              autoComplete="username"
              inputMode="email"
              onSubmitEditing={submit}
            />
          )}
        />
        <Controller
          control={control}
          name="password"
          render={({ field }) => (
            <TextField
              label="Password"
              value={field.value}
              onChangeText={field.onChange}
              onBlur={field.onBlur}
              error={formState.errors.password?.message}
              secureTextEntry
              autoComplete="current-password"
              onSubmitEditing={submit}
            />
          )}
        />
        <Button
          kind="primary"
          size="main"
          label="Sign in"
          busy={signIn.isPending}
          busyLabel="Signing in …"
          onPress={submit}
          fullWidth
        />
      </View>
    </AccountPage>
  );
}
