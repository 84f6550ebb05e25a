import { NewSubmissionScreen } from '../../../components/submissions/NewSubmissionScreen';

export default function NewSubmissionRoute() {
  return <NewSubmissionScreen />;
}
