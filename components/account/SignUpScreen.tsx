import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Screen } from '../layout/Screen';
import { errorInWords } from '../queries/errorInWords';
import { useSignUp } from '../queries/signIn';
import { Hint } from '../ui/Hint';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';
import { signUpSchema } from './accountSchemas';
import { AuthForm } from './AuthForm';
import { FormTextField } from './FormTextField';

/** Sign up. It gives no role: an administrator gives roles and a laboratory. */
export function SignUpScreen() {
  const { control, handleSubmit } = useForm({ resolver: zodResolver(signUpSchema), defaultValues: { name: '', email: '', password: '' } });
  const signUp = useSignUp();
  const [failure, setFailure] = useState<string | null>(null);
  const [sentTo, setSentTo] = useState<string | null>(null);
  const submit = handleSubmit(async (values) => {
    setFailure(null);
    try {
      const outcome = await signUp.mutateAsync(values);
      if (outcome.ok) setSentTo(values.email);
      else setFailure(outcome.message);
    } catch (error) {
      setFailure(errorInWords(error).text);
    }
  });
  if (sentTo !== null) {
    return (
      <Screen title="Confirm your address" sub={`A mail is on its way to ${sentTo}.`}>
        <Text role="status">Open the link in it; then an administrator of the register gives you your roles and your laboratory.</Text>
        <TextLink href="/">To the register</TextLink>
      </Screen>
    );
  }
  return (
    <AuthForm
      title="Sign up"
      sub="To enter or review records. Reading, fitting and citing need no account."
      submitLabel="Sign up"
      working={signUp.isPending}
      failure={failure}
      onSubmit={() => void submit()}
      others={<TextLink href="/sign-in">Sign in instead</TextLink>}
    >
      <FormTextField control={control} name="name" label="Name" autoComplete="name" hint="As it should stand in citations." required />
      <FormTextField control={control} name="email" label="Mail address" inputMode="email" autoComplete="email" required />
      <FormTextField control={control} name="password" label="Password" secret autoComplete="new-password" hint="At least 10 characters." onSubmit={() => void submit()} required />
      <Hint>Your name is shown with what you submit or decide, and frozen with every version that carries it. Your mail address is shown to administrators only.</Hint>
    </AuthForm>
  );
}
