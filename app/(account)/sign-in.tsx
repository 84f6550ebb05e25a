import { useLocalSearchParams } from 'expo-router';
import { SignInScreen } from '../../components/layout/lazy/LazyScreens';

export default function SignInRoute() {
  const { next } = useLocalSearchParams<{ next?: string }>();
  return <SignInScreen next={next} />;
}
