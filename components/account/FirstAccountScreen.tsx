import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Screen } from '../layout/Screen';
import { errorInWords } from '../queries/errorInWords';
import { useFirstAccount } from '../queries/signIn';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';
import { firstAdministratorSchema } from './accountSchemas';
import { AuthForm } from './AuthForm';
import { FormTextField } from './FormTextField';

/** Makes the first administrator from the one-time link that the start printed. */
export function FirstAccountScreen({ token }: { token: string | undefined }) {
  const { control, handleSubmit } = useForm({ resolver: zodResolver(firstAdministratorSchema), defaultValues: { name: '', email: '', password: '' } });
  const first = useFirstAccount();
  const [done, setDone] = useState(false);
  const submit = handleSubmit((values) => first.mutateAsync({ token: token ?? '', ...values }).then(() => setDone(true), () => undefined));
  if (token === undefined || token === '') {
    return (
      <Screen title="This link is incomplete">
        <Text>Open the whole address that the start printed.</Text>
      </Screen>
    );
  }
  if (done) {
    return (
      <Screen title="The first administrator is made">
        <Text role="status">The link is used up. Sign in, make laboratories and give people their roles.</Text>
        <TextLink href="/sign-in?next=/people">Sign in</TextLink>
      </Screen>
    );
  }
  return (
    <AuthForm
      title="First administrator"
      sub="This link works once."
      submitLabel="Make the account"
      working={first.isPending}
      failure={first.error ? errorInWords(first.error).text : null}
      onSubmit={() => void submit()}
    >
      <FormTextField control={control} name="name" label="Name" autoComplete="name" required />
      <FormTextField control={control} name="email" label="Mail address" inputMode="email" autoComplete="email" required />
      <FormTextField control={control} name="password" label="Password" secret autoComplete="new-password" hint="At least 12 characters." onSubmit={() => void submit()} required />
    </AuthForm>
  );
}
