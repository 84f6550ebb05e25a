import { useLocalSearchParams } from 'expo-router';
import { SignInScreen } from '../../components/account/SignInScreen';

export default function SignInRoute() {
  const { next } = useLocalSearchParams<{ next?: string }>();
  return <SignInScreen next={next} />;
}
