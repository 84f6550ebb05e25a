import { useLocalSearchParams } from 'expo-router';
import { ReviewScreen } from '../../../components/layout/lazy/LazyScreens';

export default function ReviewRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return <ReviewScreen id={id} />;
}
