import { useState } from 'react';
import { View } from 'react-native';
import type { ReviewView } from '../../shared/contracts/submissions';
import type { DecisionKind } from '../../shared/contracts/vocabulary';
import { errorInWords } from '../queries/errorInWords';
import { useDecide, type DecisionInput } from '../queries/review';
import { Button } from '../ui/Button';
import { Checkbox } from '../ui/Checkbox';
import { ConfirmDialog, Sheet } from '../ui/Dialog';
import { useNotices } from '../ui/NoticeProvider';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { TextField } from '../ui/TextField';

type Checklist = DecisionInput['checklist'];

const points: Record<keyof Checklist, string> = {
  rawCounts: 'Raw counts: aliquots, volumes, dilution',
  derivedValues: 'Derived values and their errors',
  checks: 'Check list, and the words on what is doubtful',
  evidence: 'Evidence',
  provenance: 'Provenance, approval and licence',
};
const pointKeys = Object.keys(points) as (keyof Checklist)[];

export const decisionWords: Record<DecisionKind, { act: string; done: string; consequence: string }> = {
  approve: { act: 'Approve', done: 'approved', consequence: 'Its values enter the working set now and the next version when it is frozen. The contributor is told.' },
  'request-changes': { act: 'Ask for changes in', done: 'sent back', consequence: 'The contributor is told and answers with a new revision.' },
  decline: { act: 'Decline', done: 'declined', consequence: 'The contributor is told, and the record enters no version. It stays listed as declined.' },
};

interface DecisionSheetProps {
  view: ReviewView;
  decision: DecisionKind;
  onClose: () => void;
  /** After the decision stands. */
  onDecided: () => void;
}

/** What was read, the reason, and the decision itself; declining asks once more. */
export function DecisionSheet({ view, decision, onClose, onDecided }: DecisionSheetProps) {
  const [checklist, setChecklist] = useState<Checklist>({ rawCounts: false, derivedValues: false, checks: false, evidence: false, provenance: false });
  const [comment, setComment] = useState('');
  const [tried, setTried] = useState(false);
  const [asking, setAsking] = useState(false);
  const decide = useDecide(view.id);
  const { show } = useNotices();
  const words = decisionWords[decision];
  const label = `${words.act} revision ${view.revision}`;
  const unread = pointKeys.filter((key) => !checklist[key]);
  const commentError = tried && comment.trim() === '' ? 'Give the reason in a sentence.' : undefined;
  const listError = tried && decision === 'approve' && unread.length > 0 ? 'To approve, each point is looked at.' : undefined;

  const send = () =>
    decide.mutate(
      { revision: view.revision, decision, comment, checklist },
      {
        onSuccess: () => {
          show({ tone: 'settled', title: `Revision ${view.revision} of ${view.title} is ${words.done}.`, text: 'The contributor was told.' });
          onDecided();
        },
        onSettled: () => setAsking(false),
      },
    );
  const submit = () => {
    setTried(true);
    if (comment.trim() === '' || (decision === 'approve' && unread.length > 0)) return;
    if (decision === 'decline') setAsking(true);
    else send();
  };

  return (
    <Sheet open title={`${label} of ${view.title}`} closeLabel="Keep reviewing" onClose={onClose} foot={<Button kind={decision === 'decline' ? 'danger' : 'primary'} label={label} working={decide.isPending} onPress={submit} />}>
      <Text size="table">{words.consequence}</Text>
      <Section title="Looked at" look="small">
        {pointKeys.map((key) => (
          <Checkbox key={key} label={points[key]} checked={checklist[key]} onChange={(on) => setChecklist({ ...checklist, [key]: on })} />
        ))}
        {listError ? (
          <Text role="alert" size="secondary" tone="flagged">
            {listError}
          </Text>
        ) : null}
      </Section>
      <TextField label="Reason" value={comment} onChangeText={setComment} rows={3} maxLength={4000} required error={commentError} hint="The contributor reads it; it stays in the record's trail." />
      {decide.error ? (
        <View role="alert">
          <Text tone="flagged" weight="semibold">
            {errorInWords(decide.error).title}
          </Text>
          <Text size="table">{errorInWords(decide.error).text}</Text>
        </View>
      ) : null}
      <ConfirmDialog open={asking} question={`Decline revision ${view.revision} of ${view.title}?`} consequence={words.consequence} confirmLabel={label} cancelLabel="Keep reviewing" working={decide.isPending} onConfirm={send} onCancel={() => setAsking(false)} />
    </Sheet>
  );
}
