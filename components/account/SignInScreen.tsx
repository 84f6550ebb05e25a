import { zodResolver } from '@hookform/resolvers/zod';
import { router, type Href } from 'expo-router';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { useAccount } from '../queries/account';
import { useSignIn } from '../queries/signIn';
import { Hint } from '../ui/Hint';
import { TextLink } from '../ui/TextLink';
import { errorInWords } from '../queries/errorInWords';
import { signInSchema } from './accountSchemas';
import { AuthForm } from './AuthForm';
import { FormTextField } from './FormTextField';

/** An address of this register only: what comes from the query could lead anywhere. */
function ownAddress(next: string | undefined): Href {
  return (next !== undefined && /^\/(?![/\\])/.test(next) ? next : '/') as Href;
}

/** Sign in by mail address and password, then on to where one came from. */
export function SignInScreen({ next }: { next: string | undefined }) {
  const { control, handleSubmit } = useForm({ resolver: zodResolver(signInSchema), defaultValues: { email: '', password: '' } });
  const signIn = useSignIn();
  const { demo } = useAccount();
  const [failure, setFailure] = useState<string | null>(null);
  const submit = handleSubmit(async (values) => {
    setFailure(null);
    try {
      const outcome = await signIn.mutateAsync(values);
      if (outcome.ok) router.replace(ownAddress(next));
      else setFailure(outcome.message);
    } catch (error) {
      setFailure(errorInWords(error).text);
    }
  });
  return (
    <AuthForm
      title="Sign in"
      submitLabel="Sign in"
      working={signIn.isPending}
      failure={failure}
      onSubmit={() => void submit()}
      others={
        <>
          <TextLink href="/forgot-password">Choose a new password</TextLink>
          <TextLink href="/sign-up">Sign up</TextLink>
          {demo ? <Hint>Demonstration accounts: contributor@demo.example, reviewer@demo.example, curator@demo.example, administrator@demo.example; npm start prints their password.</Hint> : null}
        </>
      }
    >
      <FormTextField control={control} name="email" label="Mail address" inputMode="email" autoComplete="email" onSubmit={() => void submit()} required />
      <FormTextField control={control} name="password" label="Password" secret autoComplete="current-password" onSubmit={() => void submit()} required />
    </AuthForm>
  );
}
