import { ReviewQueueScreen } from '../../../components/review/ReviewScreens';

export default function ReviewQueueRoute() {
  return <ReviewQueueScreen />;
}
