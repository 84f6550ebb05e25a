import { RegisterScreen } from '../../components/register/RegisterScreen';

export default function RegisterRoute() {
  return <RegisterScreen />;
}
