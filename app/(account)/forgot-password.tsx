import { ForgotPasswordScreen } from '../../components/layout/lazy/LazyScreens';

export default function ForgotPasswordRoute() {
  return <ForgotPasswordScreen />;
}
