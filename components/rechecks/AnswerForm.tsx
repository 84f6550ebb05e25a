import { router, type Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { Recheck } from '../../shared/contracts/rechecks';
import type { RecheckAnswerKind } from '../../shared/contracts/vocabulary';
import { errorInWords } from '../queries/errorInWords';
import { useAnswerRecheck } from '../queries/rechecks';
import { useRevise, useSubmission } from '../queries/submissions';
import { Button } from '../ui/Button';
import { ConfirmDialog } from '../ui/Dialog';
import { useNotices } from '../ui/NoticeProvider';
import { RadioList } from '../ui/RadioList';
import { Section } from '../ui/Section';
import { Select } from '../ui/Select';
import { Text } from '../ui/Text';
import { TextField } from '../ui/TextField';
import { useKeptText } from './useKeptText';

const options: { value: RecheckAnswerKind; label: string; note: string }[] = [
  { value: 'confirmed', label: 'Confirmed with evidence', note: 'The counts stand; say what was looked at again, and name a file that shows it.' },
  { value: 'corrected', label: 'Corrected by a new revision', note: 'Opens a draft with the present values; what you submit is reviewed again and answers the question.' },
  { value: 'withdrawn', label: 'Withdrawn', note: 'The record is taken back: it comes into no further version.' },
];

/** The answer of the record's laboratory. */
export function AnswerForm({ recheck }: { recheck: Recheck }) {
  const [kind, setKind] = useState<RecheckAnswerKind | null>(null);
  const [text, setText, forget] = useKeptText(`answer.${recheck.id}`);
  const [attachmentId, setAttachmentId] = useState('');
  const [tried, setTried] = useState(false);
  const [asking, setAsking] = useState(false);
  const submission = useSubmission(recheck.submissionId);
  const answer = useAnswerRecheck(recheck.id);
  const revise = useRevise(recheck.submissionId);
  const { show } = useNotices();
  const files = (submission.data?.attachments ?? []).map((file) => ({ value: file.id, label: file.caption || file.name }));

  const openRevision = () => {
    const draft = submission.data?.status === 'draft';
    const go = () => router.push(`/submissions/${recheck.submissionId}` as Href);
    if (draft) go();
    else revise.mutate({ recheckId: recheck.id }, { onSuccess: go });
  };
  const send = async () => {
    setTried(true);
    if (kind === null || text.trim() === '') return;
    try {
      // Awaited, since the new state takes this form away, and with it what mutate would call back.
      await answer.mutateAsync({ answer: kind, text: text.trim(), attachmentId: kind === 'confirmed' && attachmentId !== '' ? attachmentId : null });
    } catch {
      // What failed stands below the form.
      return;
    } finally {
      setAsking(false);
    }
    forget();
    show({ tone: 'settled', title: `The re-check of ${recheck.record} is answered.`, text: 'A reviewer of another laboratory closes it.' });
  };
  const failure = answer.error ?? revise.error;
  const missing = tried && text.trim() === '' ? 'Say what was found.' : undefined;
  return (
    <Section title="Answer" style={{ gap: 14 }}>
      <View style={{ maxWidth: 640, gap: 14, paddingTop: 8 }}>
        <RadioList label="What was found" value={kind} options={options} onChange={setKind} />
        {tried && kind === null ? (
          <Text size="secondary" tone="flagged" role="alert">
            Choose one of the three.
          </Text>
        ) : null}
        {kind === 'corrected' ? (
          <Button kind="primary" label="Open the new revision" working={revise.isPending} onPress={openRevision} style={{ alignSelf: 'flex-start' }} />
        ) : (
          <>
            <TextField label="Your answer" value={text} onChangeText={setText} rows={4} maxLength={4000} error={missing} />
            {kind === 'confirmed' && files.length > 0 ? <Select label="Evidence" value={attachmentId} options={files} placeholder="No file" onChange={setAttachmentId} hint="A file of the submission." /> : null}
            <Button kind={kind === 'withdrawn' ? 'danger' : 'primary'} label="Send the answer" working={answer.isPending} onPress={() => (kind === 'withdrawn' && text.trim() !== '' ? setAsking(true) : void send())} style={{ alignSelf: 'flex-start' }} />
          </>
        )}
        {failure ? (
          <Text role="alert" size="secondary" tone="flagged">
            {errorInWords(failure).text}
          </Text>
        ) : null}
      </View>
      <ConfirmDialog
        open={asking}
        question={`Withdraw ${recheck.record} in answer to this re-check?`}
        consequence="The record comes into no further version; versions frozen before keep it. The question and your answer stay on its trail."
        confirmLabel={`Withdraw ${recheck.record}`}
        cancelLabel="Keep it"
        working={answer.isPending}
        onConfirm={() => void send()}
        onCancel={() => setAsking(false)}
      />
    </Section>
  );
}
