import { Screen } from '../layout/Screen';
import { useAccount } from '../queries/account';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

/** Where the link of the confirmation mail ends. `error` is set where the link was used or out of date. */
export function VerifiedScreen({ error }: { error: string | undefined }) {
  const { status, roles } = useAccount();
  if (error !== undefined) {
    return (
      <Screen title="This link no longer works">
        <Text>It was used already, or its time is over. Sign in: a new mail with a fresh link is sent.</Text>
        <TextLink href="/sign-in">Sign in</TextLink>
      </Screen>
    );
  }
  return (
    <Screen title="Your address is confirmed">
      <Text role="status">{roles.length > 0 ? 'Everything is ready.' : 'An administrator of the register now gives you your roles and your laboratory; a notice tells you.'}</Text>
      {status === 'in' ? <TextLink href="/">To the register</TextLink> : <TextLink href="/sign-in">Sign in</TextLink>}
    </Screen>
  );
}
