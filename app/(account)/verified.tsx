import { useLocalSearchParams } from 'expo-router';
import { VerifiedScreen } from '../../components/account/VerifiedScreen';

export default function VerifiedRoute() {
  const { error } = useLocalSearchParams<{ error?: string }>();
  return <VerifiedScreen error={error} />;
}
