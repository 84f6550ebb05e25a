import { useLocalSearchParams } from 'expo-router';
import { VersionScreen } from '../../../components/versions/VersionScreen';

export default function VersionRoute() {
  const { label } = useLocalSearchParams<{ label: string }>();
  return <VersionScreen key={label} label={label} />;
}
