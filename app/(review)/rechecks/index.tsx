import { RecheckListScreen } from '../../../components/rechecks/RecheckListScreen';

export default function RechecksRoute() {
  return <RecheckListScreen />;
}
