import { SignUpScreen } from '../../components/layout/lazy/LazyScreens';

export default function SignUpRoute() {
  return <SignUpScreen />;
}
