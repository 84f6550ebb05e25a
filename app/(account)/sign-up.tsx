import { SignUpScreen } from '../../components/account/SignUpScreen';

export default function SignUpRoute() {
  return <SignUpScreen />;
}
