import { useLocalSearchParams } from 'expo-router';
import { SubmissionScreen } from '../../../components/layout/lazy/LazyScreens';

export default function SubmissionRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return <SubmissionScreen id={id} />;
}
