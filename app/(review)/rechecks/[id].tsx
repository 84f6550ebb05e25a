import { useLocalSearchParams } from 'expo-router';
import { RecheckScreen } from '../../../components/rechecks/RecheckScreen';

export default function RecheckRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return <RecheckScreen id={id} />;
}
