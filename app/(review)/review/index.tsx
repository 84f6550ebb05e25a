import { ReviewQueueScreen } from '../../../components/review/ReviewQueueScreen';

export default function ReviewQueueRoute() {
  return <ReviewQueueScreen />;
}
