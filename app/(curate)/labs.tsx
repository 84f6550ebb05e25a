import { LabsScreen } from '../../components/people/LabsScreen';

export default function LabsRoute() {
  return <LabsScreen />;
}
