import { useLocalSearchParams } from 'expo-router';
import { FirstAccountScreen } from '../../components/layout/lazy/LazyScreens';

export default function FirstAccountRoute() {
  const { token } = useLocalSearchParams<{ token?: string }>();
  return <FirstAccountScreen token={token} />;
}
