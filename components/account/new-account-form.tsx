import { zodResolver } from '@hookform/resolvers/zod';
import { View } from 'react-native';
import { useController, useForm, type Control } from 'react-hook-form';
import { z } from 'zod';
import { AccountRefusal } from '@/components/account/account-refusal';
import { Button } from '@/components/ui/button';
import { TextField, type TextFieldProps } from '@/components/ui/field';
import { type ApiError } from '@/hooks/client/api-error';
import { emailSchema, newPasswordSchema } from '@/shared/account/credentials';
import { shortTextSchema } from '@/shared/contract/fields';

const formSchema = z.strictObject({
  displayName: shortTextSchema,
  email: emailSchema,
  password: newPasswordSchema,
  deskName: z.string().trim().max(120),
});
export type NewAccount = z.infer<typeof formSchema>;

interface Props {
  /** The invited first lead also names the desk. */
  readonly asksDeskName: boolean;
  readonly submitLabel: string;
  readonly isBusy: boolean;
  readonly error: ApiError | null;
  readonly onSubmit: (account: NewAccount) => void;
}

/** Name, e-mail and password of a new account; what is typed stays when the server refuses. */
export function NewAccountForm({ asksDeskName, submitLabel, isBusy, error, onSubmit }: Props) {
  const { control, handleSubmit } = useForm<NewAccount>({
    resolver: zodResolver(formSchema),
    defaultValues: { displayName: '', email: '', password: '', deskName: '' },
  });
  const submit = handleSubmit(onSubmit);
  const field = { control, error, onSubmitEditing: submit };
  return (
    <View style={{ gap: 16 }}>
      <AccountRefusal error={error} />
      <AccountField
        {...field}
        name="displayName"
        label="Name"
        autoComplete="name"
        hint="As mentors and your desk see it."
      />
      {asksDeskName ? (
        <AccountField {...field} name="deskName" label="Name of the desk" autoComplete="organization" />
      ) : null}
      <AccountField {...field} name="email" label="E-mail" autoComplete="username" inputMode="email" />
      <AccountField
        {...field}
        name="password"
        label="Password"
        autoComplete="new-password"
        secureTextEntry
        hint="At least 15 characters. A few words in a row are easy to remember."
      />
      <Button
        kind="primary"
        size="main"
        label={submitLabel}
        busy={isBusy}
        busyLabel="One moment …"
        onPress={submit}
        fullWidth
      />
    </View>
  );
}

type FieldProps = { control: Control<NewAccount>; name: keyof NewAccount; error: ApiError | null } & Omit<
  TextFieldProps,
  'value' | 'onChangeText' | 'error'
>;

function AccountField({ control, name, error, ...props }: FieldProps) {
  const { field, fieldState } = useController({ control, name });
  return (
    <TextField
      {...props}
      value={field.value}
      onChangeText={field.onChange}
      onBlur={field.onBlur}
      error={fieldState.error?.message ?? error?.problemOf(name)}
    />
  );
}
