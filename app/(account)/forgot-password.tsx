import { ForgotPasswordScreen } from '../../components/account/PasswordScreens';

export default function ForgotPasswordRoute() {
  return <ForgotPasswordScreen />;
}
