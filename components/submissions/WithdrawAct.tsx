import { useState } from 'react';
import { View } from 'react-native';
import type { SubmissionDetail } from '../../shared/contracts/submissions';
import { errorInWords } from '../queries/errorInWords';
import { useWithdraw } from '../queries/submissions';
import { Button } from '../ui/Button';
import { ConfirmDialog } from '../ui/Dialog';
import { useNotices } from '../ui/NoticeProvider';
import { TextField } from '../ui/TextField';

const consequences: Readonly<Partial<Record<SubmissionDetail['status'], string>>> = {
  draft: 'The draft ends here. It stays listed as withdrawn; nothing of it is published.',
  submitted: 'It leaves the reviewers’ queue and stays listed as withdrawn.',
  'changes-requested': 'The review ends here. It stays listed as withdrawn.',
  approved: 'Its records come into no further version; versions frozen before keep them. It stays listed as withdrawn.',
};

/** Takes a submission back, with a reason, after asking once. */
export function WithdrawAct({ detail }: { detail: SubmissionDetail }) {
  const [asking, setAsking] = useState(false);
  const [reason, setReason] = useState('');
  const [tried, setTried] = useState(false);
  const withdraw = useWithdraw(detail.id);
  const { show } = useNotices();
  const confirm = async () => {
    setTried(true);
    if (reason.trim() === '') return;
    try {
      // Awaited, since the withdrawn state takes this act away, and with it what mutate would call back.
      await withdraw.mutateAsync(reason.trim());
    } catch {
      // What failed stands at the field.
      return;
    }
    setAsking(false);
    show({ tone: 'settled', title: `Revision ${detail.revision} of ${detail.title} is withdrawn.` });
  };
  const error = withdraw.error ? errorInWords(withdraw.error).text : tried && reason.trim() === '' ? 'Give the reason in a sentence.' : undefined;
  return (
    <View style={{ alignItems: 'flex-start' }}>
      <Button kind="danger" label="Withdraw" spokenLabel={`Withdraw revision ${detail.revision}`} onPress={() => setAsking(true)} />
      <ConfirmDialog
        open={asking}
        question={`Withdraw revision ${detail.revision} of ${detail.title}?`}
        consequence={consequences[detail.status] ?? 'It stays listed as withdrawn.'}
        confirmLabel={`Withdraw revision ${detail.revision}`}
        cancelLabel="Keep it"
        working={withdraw.isPending}
        onConfirm={() => void confirm()}
        onCancel={() => setAsking(false)}
      >
        <TextField label="Reason" value={reason} onChangeText={setReason} rows={2} maxLength={2000} error={error} />
      </ConfirmDialog>
    </View>
  );
}
