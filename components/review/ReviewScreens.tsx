import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { useBreakpoint } from '../layout/useBreakpoint';
import { errorInWords } from '../queries/errorInWords';
import { useReview } from '../queries/review';
import type { Href } from 'expo-router';
import { BackLink } from '../ui/TextLink';
import { QueryView } from '../ui/QueryView';
import { Text } from '../ui/Text';
import { ReviewDetail } from './ReviewDetail';
import { ReviewList } from './ReviewList';

const who = ['reviewer', 'curator'];

/** The queue; beside it, on wide screens, room for the view. */
export function ReviewQueueScreen() {
  const { sideBySide } = useBreakpoint();
  return (
    <RoleGate title="Review" roles={who}>
      <Screen title="Review" sub="What waits for a decision, answered first, then oldest." list={sideBySide ? <ReviewList asPanel /> : undefined} onSheet={sideBySide}>
        {sideBySide ? <Text tone="inkSoft">Choose a submission from the list.</Text> : <ReviewList />}
      </Screen>
    </RoleGate>
  );
}

export function ReviewScreen({ id }: { id: string }) {
  return (
    <RoleGate title="Review" roles={who}>
      <OneReview key={id} id={id} />
    </RoleGate>
  );
}

function OneReview({ id }: { id: string }) {
  const review = useReview(id);
  const { sideBySide } = useBreakpoint();
  if (review.data) return <ReviewDetail view={review.data} />;
  return (
    <Screen title="Review" back={<BackLink href={'/review' as Href} label="Review" />} list={sideBySide ? <ReviewList currentId={id} asPanel /> : undefined} onSheet>
      <QueryView pending={review.isPending} error={review.error ? errorInWords(review.error) : null} data={review.data} onRetry={() => void review.refetch()}>
        {() => null}
      </QueryView>
    </Screen>
  );
}
