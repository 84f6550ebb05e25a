import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { useBreakpoint } from '../layout/useBreakpoint';
import { Text } from '../ui/Text';
import { ReviewList } from './ReviewList';
import { reviewRoles } from './reviewRoles';

/** The queue; beside it, on wide screens, room for the view. */
export function ReviewQueueScreen() {
  const { sideBySide } = useBreakpoint();
  return (
    <RoleGate title="Review" roles={reviewRoles}>
      <Screen
        title="Review"
        heading={sideBySide ? 'Choose a submission' : undefined}
        sub={sideBySide ? undefined : 'What waits for a decision, answered first, then oldest.'}
        list={sideBySide ? <ReviewList asPanel /> : undefined}
        onSheet={sideBySide}
      >
        {sideBySide ? <Text tone="inkSoft">The list at the left holds what waits for a decision.</Text> : <ReviewList />}
      </Screen>
    </RoleGate>
  );
}
