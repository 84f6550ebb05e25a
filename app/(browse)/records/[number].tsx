import { useLocalSearchParams } from 'expo-router';
import { RecordScreen } from '../../../components/records/RecordScreen';

export default function RecordRoute() {
  const { number } = useLocalSearchParams<{ number: string }>();
  return <RecordScreen number={number} />;
}
