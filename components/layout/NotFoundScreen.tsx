import { EmptyState } from '../ui/Message';
import { Screen } from './Screen';

/** An address that leads nowhere. */
export function NotFoundScreen() {
  return (
    <Screen title="Nothing at this address">
      <EmptyState
        title="There is no page here."
        text="It may have moved, or belong to somebody else. Species, records and versions keep their addresses for ever, so a typing slip is likely."
        action={{ label: 'To the register', href: '/' }}
      />
    </Screen>
  );
}
