import type { Href } from 'expo-router';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { useBreakpoint } from '../layout/useBreakpoint';
import { errorInWords } from '../queries/errorInWords';
import { useReview } from '../queries/review';
import { BackLink } from '../ui/TextLink';
import { QueryView } from '../ui/QueryView';
import { ReviewDetail } from './ReviewDetail';
import { ReviewList } from './ReviewList';
import { reviewRoles } from './reviewRoles';

/** One submission as its reviewer sees it. */
export function ReviewScreen({ id }: { id: string }) {
  return (
    <RoleGate title="Review" roles={reviewRoles}>
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
