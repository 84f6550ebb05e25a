import { CurateScreen } from '../../../components/curate/CurateScreen';

export default function CurateRoute() {
  return <CurateScreen />;
}
