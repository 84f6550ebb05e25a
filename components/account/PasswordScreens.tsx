import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Screen } from '../layout/Screen';
import { errorInWords } from '../queries/errorInWords';
import { useRequestPasswordReset, useResetPassword, type AuthOutcome } from '../queries/signIn';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';
import { forgottenSchema, newPasswordSchema } from './accountSchemas';
import { AuthForm } from './AuthForm';
import { FormTextField } from './FormTextField';

/** Runs a call and keeps what it answered: done, or why not. */
function useOutcome() {
  const [done, setDone] = useState(false);
  const [failure, setFailure] = useState<string | null>(null);
  async function run(call: () => Promise<AuthOutcome>): Promise<void> {
    setFailure(null);
    try {
      const outcome = await call();
      if (outcome.ok) setDone(true);
      else setFailure(outcome.message);
    } catch (error) {
      setFailure(errorInWords(error).text);
    }
  }
  return { done, failure, run };
}

/** Asks for the mail with the link. The answer never says whether an address is known. */
export function ForgotPasswordScreen() {
  const { control, handleSubmit } = useForm({ resolver: zodResolver(forgottenSchema), defaultValues: { email: '' } });
  const request = useRequestPasswordReset();
  const { done, failure, run } = useOutcome();
  const submit = handleSubmit((values) => run(() => request.mutateAsync(values)));
  if (done) {
    return (
      <Screen title="Look into your mailbox">
        <Text role="status">If this address has an account, a mail with a link is on its way. The link holds for one hour.</Text>
        <TextLink href="/sign-in">Sign in</TextLink>
      </Screen>
    );
  }
  return (
    <AuthForm title="Choose a new password" sub="A link comes by mail." submitLabel="Send the link" working={request.isPending} failure={failure} onSubmit={() => void submit()} others={<TextLink href="/sign-in">Sign in</TextLink>}>
      <FormTextField control={control} name="email" label="Mail address" inputMode="email" autoComplete="email" onSubmit={() => void submit()} required />
    </AuthForm>
  );
}

/** The page the link leads to. */
export function ResetPasswordScreen({ token }: { token: string | undefined }) {
  const { control, handleSubmit } = useForm({ resolver: zodResolver(newPasswordSchema), defaultValues: { password: '', again: '' } });
  const reset = useResetPassword();
  const { done, failure, run } = useOutcome();
  const submit = handleSubmit(({ password }) => run(() => reset.mutateAsync({ token: token ?? '', newPassword: password })));
  if (token === undefined || token === '') {
    return (
      <Screen title="This link is incomplete">
        <Text>Open the whole address from the mail, or ask for a new link.</Text>
        <TextLink href="/forgot-password">Ask for a new link</TextLink>
      </Screen>
    );
  }
  if (done) {
    return (
      <Screen title="The new password holds">
        <Text role="status">All sessions with the old one are ended.</Text>
        <TextLink href="/sign-in">Sign in</TextLink>
      </Screen>
    );
  }
  return (
    <AuthForm title="Choose a new password" submitLabel="Keep this password" working={reset.isPending} failure={failure} onSubmit={() => void submit()} others={<TextLink href="/forgot-password">Ask for a new link</TextLink>}>
      <FormTextField control={control} name="password" label="New password" secret autoComplete="new-password" hint="At least 10 characters." required />
      <FormTextField control={control} name="again" label="New password once more" secret autoComplete="new-password" onSubmit={() => void submit()} required />
    </AuthForm>
  );
}
