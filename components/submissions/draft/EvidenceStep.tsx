import type { DocumentPickerAsset } from 'expo-document-picker';
import { useState } from 'react';
import { View } from 'react-native';
import type { AttachmentView } from '../../../shared/contracts/submissions';
import { attachmentTypes } from '../../../shared/contracts/vocabulary';
import { errorInWords } from '../../queries/errorInWords';
import { useAttach, useDetach } from '../../queries/submissions';
import { Evidence } from '../../review/Evidence';
import { Button } from '../../ui/Button';
import { FileField, sizeInWords } from '../../ui/FileField';
import { Hint } from '../../ui/Hint';
import { Section } from '../../ui/Section';
import { Text } from '../../ui/Text';
import { TextField } from '../../ui/TextField';

const MOST_BYTES = 25_000_000;

/** Files behind the counts: attach with a caption, look at them, take one away again. */
export function EvidenceStep({ submissionId, attachments }: { submissionId: string; attachments: readonly AttachmentView[] }) {
  const [file, setFile] = useState<File | null>(null);
  const [caption, setCaption] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const attach = useAttach(submissionId);
  const detach = useDetach(submissionId);
  const pick = (asset: DocumentPickerAsset) => {
    attach.reset();
    const picked = asset.file ?? null;
    if (picked === null) return setProblem('This device hands over no file.');
    if (picked.size > MOST_BYTES) {
      setFile(null);
      return setProblem(`${picked.name} has ${sizeInWords(picked.size)}; up to 25 MB are accepted.`);
    }
    setProblem(null);
    setFile(picked);
  };
  const send = () => {
    if (file === null) return setProblem('Choose a file first.');
    attach.mutate({ file, fieldPath: '', caption: caption.trim() }, { onSuccess: () => (setFile(null), setCaption('')) });
  };
  return (
    <View style={{ gap: 24 }}>
      <Section title="Attach a file" style={{ gap: 12 }}>
        <View style={{ gap: 12, maxWidth: 640 }}>
          <FileField
            label="Evidence file"
            file={file ? { name: file.name, size: file.size } : null}
            onPick={pick}
            onClear={() => setFile(null)}
            accept={[...attachmentTypes]}
            hint="PDF, PNG, JPEG, TIFF or CSV, up to 25 MB. The kind is judged by the content, not by the name."
            error={problem ?? (attach.error ? errorInWords(attach.error).text : undefined)}
          />
          <TextField label="Caption" value={caption} onChangeText={setCaption} maxLength={200} hint="What it shows: chamber, aliquot 2; weighing of the right cortex." />
          <Button label="Attach the file" working={attach.isPending} workingLabel="Sending the file" disabled={file === null} onPress={send} style={{ alignSelf: 'flex-start' }} />
        </View>
        <Hint>Look at scanned sheets before you send them: names of people, of patients or donors, and of hospitals must not be on them. Location data are removed from images; the checksum is that of the file as kept.</Hint>
      </Section>
      <Evidence submissionId={submissionId} attachments={attachments} />
      {attachments.length > 0 ? (
        <Section title="Take a file away" look="small">
          <View style={{ alignItems: 'flex-start' }}>
            {attachments.map((kept) => (
              <Button key={kept.id} kind="quiet" label={`Remove ${kept.caption || kept.name}`} working={detach.isPending && detach.variables === kept.id} onPress={() => detach.mutate(kept.id)} style={{ marginLeft: -8 }} />
            ))}
          </View>
          {detach.error ? (
            <Text role="alert" size="secondary" tone="flagged">
              {errorInWords(detach.error).text}
            </Text>
          ) : null}
        </Section>
      ) : null}
    </View>
  );
}
