import { useLocalSearchParams } from 'expo-router';
import { ResetPasswordScreen } from '../../components/layout/lazy/LazyScreens';

export default function ResetPasswordRoute() {
  const { token } = useLocalSearchParams<{ token?: string }>();
  return <ResetPasswordScreen token={token} />;
}
