import { useState } from 'react';
import { formatRatio } from '../../shared/domain/quantityText';
import { errorInWords } from '../queries/errorInWords';
import { useAskRecheck } from '../queries/rechecks';
import { Button } from '../ui/Button';
import { Sheet } from '../ui/Dialog';
import { useNotices } from '../ui/NoticeProvider';
import { RadioList } from '../ui/RadioList';
import { Text } from '../ui/Text';
import { TextField } from '../ui/TextField';
import type { SpeciesPoint } from './figureGroups';

interface RecheckSheetProps {
  species: SpeciesPoint;
  /** The two variables in words. */
  about: string;
  /** y ÷ line, for the first words of the question. */
  ratio: number | null;
  onClose: () => void;
}

/** Asks the laboratory of a record to look again. */
export function RecheckSheet({ species, about, ratio, onClose }: RecheckSheetProps) {
  const records = species.contributions;
  const [record, setRecord] = useState(records[0]?.record ?? '');
  const [question, setQuestion] = useState(ratio === null ? '' : `${formatRatio(ratio)} times the line of ${about}: `);
  const ask = useAskRecheck(record);
  const { show } = useNotices();
  const send = () =>
    ask.mutate(
      { question },
      {
        onSuccess: (recheck) => {
          show({ tone: 'waiting', sign: 'clock', title: 'Re-check asked', text: `${recheck.record}, ${recheck.species}: its laboratory is told.` });
          onClose();
        },
      },
    );
  return (
    <Sheet
      open
      title={`Ask for a re-check of ${species.species}`}
      closeLabel="Close"
      onClose={onClose}
      foot={<Button kind="primary" label="Ask for a re-check" disabled={question.trim() === '' || record === ''} working={ask.isPending} workingLabel="Asking" onPress={send} />}
    >
      {records.length > 1 ? <RadioList label="Record" value={record} options={records.map(({ record: number, source }) => ({ value: number, label: number, note: source }))} onChange={setRecord} /> : <Text>{`Record ${record}, ${records[0]?.source ?? ''}`}</Text>}
      <TextField label="What is to be checked" value={question} onChangeText={setQuestion} rows={4} maxLength={4000} autoFocus hint="The laboratory confirms with evidence, corrects by a new revision, or withdraws. Nothing leaves a fit by itself." error={ask.error ? errorInWords(ask.error).text : undefined} />
    </Sheet>
  );
}
