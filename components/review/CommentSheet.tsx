import { useState } from 'react';
import type { SubmissionDetail } from '../../shared/contracts/submissions';
import { fieldName } from '../../shared/domain/fieldNames';
import { errorInWords } from '../queries/errorInWords';
import { useComment } from '../queries/submissions';
import { Button } from '../ui/Button';
import { Sheet } from '../ui/Dialog';
import { TextField } from '../ui/TextField';

/** A new comment anchored at a field. What is typed stays until it is sent or the sheet is closed. */
export function CommentSheet({ detail, path, onClose }: { detail: Pick<SubmissionDetail, 'id' | 'revision' | 'content'>; path: string; onClose: () => void }) {
  const [text, setText] = useState('');
  const send = useComment(detail.id);
  const save = () => send.mutate({ revision: detail.revision, fieldPath: path, text }, { onSuccess: onClose });
  return (
    <Sheet open title={`Comment at ${fieldName(path, detail.content)}`} closeLabel="Close" onClose={onClose} foot={<Button kind="primary" label="Add the comment" disabled={text.trim() === ''} working={send.isPending} onPress={save} />}>
      <TextField label="Comment" value={text} onChangeText={setText} rows={4} maxLength={4000} autoFocus hint={`It names revision ${detail.revision} and this field; the contributor reads it.`} error={send.error ? errorInWords(send.error).text : undefined} />
    </Sheet>
  );
}
