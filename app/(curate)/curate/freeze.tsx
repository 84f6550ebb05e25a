import { FreezeScreen } from '../../../components/curate/FreezeScreen';

export default function FreezeRoute() {
  return <FreezeScreen />;
}
