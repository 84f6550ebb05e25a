import { useState } from 'react';
import type { FlagView } from '../../shared/contracts/fits';
import { errorInWords } from '../queries/errorInWords';
import { useAskRecheck } from '../queries/rechecks';
import { Button } from '../ui/Button';
import { Sheet } from '../ui/Dialog';
import { useNotices } from '../ui/NoticeProvider';
import { Select } from '../ui/Select';
import { TextField } from '../ui/TextField';

/** A question to the laboratory of a record, from one of its flags or by hand. */
export function AskRecheckSheet({ record, flags, onClose }: { record: string; flags: readonly FlagView[]; onClose: () => void }) {
  const ask = useAskRecheck(record);
  const { show } = useNotices();
  const [flagId, setFlagId] = useState(flags[0]?.id ?? 'none');
  const [question, setQuestion] = useState(flags[0]?.reasons[0] ? `${flags[0].reasons[0]} Please look at the counts, the unit and the side again.` : '');
  const send = () =>
    ask.mutate(
      { question, flagId: flagId === 'none' ? null : flagId },
      {
        onSuccess: () => {
          show({ tone: 'waiting', title: `A re-check of ${record} is open.`, text: 'Its laboratory was told.' });
          onClose();
        },
      },
    );
  return (
    <Sheet open title={`Ask for a re-check of ${record}`} closeLabel="Close" onClose={onClose} foot={<Button kind="primary" label="Ask for the re-check" disabled={question.trim() === ''} working={ask.isPending} onPress={send} />}>
      {flags.length > 0 ? (
        <Select label="From" value={flagId} options={[...flags.map((flag) => ({ value: flag.id, label: `${flag.kind}: ${flag.fitTitle}` })), { value: 'none', label: 'by hand, from no flag' }]} onChange={setFlagId} />
      ) : null}
      <TextField label="What is to be checked" value={question} onChangeText={setQuestion} rows={4} maxLength={4000} hint="The laboratory answers: confirmed with evidence, corrected by a new revision, or withdrawn." error={ask.error ? errorInWords(ask.error).text : undefined} />
    </Sheet>
  );
}
