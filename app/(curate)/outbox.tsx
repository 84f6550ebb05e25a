import { OutboxScreen } from '../../components/people/OutboxScreen';

export default function OutboxRoute() {
  return <OutboxScreen />;
}
