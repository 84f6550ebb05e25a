import { useState } from 'react';
import type { SetAsideScope } from '../../shared/contracts/records';
import { useSetAside } from '../queries/curate';
import { errorInWords } from '../queries/errorInWords';
import { Button } from '../ui/Button';
import { ConfirmDialog, Sheet } from '../ui/Dialog';
import { useNotices } from '../ui/NoticeProvider';
import { RadioList } from '../ui/RadioList';
import { TextField } from '../ui/TextField';

type Choice = 'massNeurons' | 'massBody' | 'all';

function scopeOf(choice: Choice, structure: string): SetAsideScope {
  if (choice === 'all') return 'all';
  const mass = { variable: 'structureMassG', structure } as const;
  return choice === 'massNeurons' ? { a: mass, b: { variable: 'neurons', structure } } : { a: mass, b: { variable: 'bodyMassG', structure: null } };
}

/** Leaves a record out of fits from the next version on; it stays listed, with the reason for all to read. */
export function SetAsideSheet({ record, structure, onClose }: { record: string; structure: string; onClose: () => void }) {
  const setAside = useSetAside(record);
  const { show } = useNotices();
  const [choice, setChoice] = useState<Choice>('massNeurons');
  const [reason, setReason] = useState('');
  const [asking, setAsking] = useState(false);
  const name = structure.replaceAll('_', ' ');
  const send = () =>
    setAside.mutate(
      { scope: scopeOf(choice, structure), reason },
      {
        onSuccess: () => {
          show({ tone: 'waiting', title: `${record} is set aside.`, text: 'It counts from the next version on; older versions stay as they are.' });
          onClose();
        },
        onSettled: () => setAsking(false),
      },
    );
  return (
    <Sheet open title={`Set ${record} aside`} closeLabel="Close" onClose={onClose} foot={<Button kind="primary" label="Set aside" disabled={reason.trim() === ''} onPress={() => setAsking(true)} />}>
      <RadioList<Choice>
        label="From which fits"
        value={choice}
        options={[
          { value: 'massNeurons', label: `mass and neurons of the ${name}, either one on x` },
          { value: 'massBody', label: `mass of the ${name} and body mass` },
          { value: 'all', label: 'every fit' },
        ]}
        onChange={setChoice}
      />
      <TextField label="Reason, for everyone to read" value={reason} onChangeText={setReason} rows={3} maxLength={2000} required error={setAside.error ? errorInWords(setAside.error).text : undefined} />
      <ConfirmDialog open={asking} kind="primary" question={`Set ${record} aside?`} consequence="It stays listed with your reason and your name, and is left out of these fits from the next version on." confirmLabel="Set aside" cancelLabel="Keep it in" working={setAside.isPending} onConfirm={send} onCancel={() => setAsking(false)} />
    </Sheet>
  );
}
