import type { Href } from 'expo-router';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { errorInWords } from '../queries/errorInWords';
import { useSubmission } from '../queries/submissions';
import { QueryView } from '../ui/QueryView';
import { BackLink } from '../ui/TextLink';
import { DraftScreen } from './draft/DraftScreen';
import { SubmissionDetailScreen } from './SubmissionDetailScreen';

/** One submission: the form while it is a draft that one may edit, its page otherwise. */
export function SubmissionScreen({ id }: { id: string }) {
  return (
    <RoleGate title="Submission">
      <OneSubmission key={id} id={id} />
    </RoleGate>
  );
}

function OneSubmission({ id }: { id: string }) {
  const submission = useSubmission(id);
  if (submission.data) {
    const { data } = submission;
    return data.may.edit ? <DraftScreen key={data.revision} detail={data} /> : <SubmissionDetailScreen detail={data} />;
  }
  return (
    <Screen title="Submission" back={<BackLink href={'/submissions' as Href} label="Submissions" />}>
      <QueryView pending={submission.isPending} error={submission.error ? errorInWords(submission.error) : null} data={submission.data} onRetry={() => void submission.refetch()}>
        {() => null}
      </QueryView>
    </Screen>
  );
}
