import { SubmissionsScreen } from '../../../components/submissions/SubmissionsScreen';

export default function SubmissionsRoute() {
  return <SubmissionsScreen />;
}
