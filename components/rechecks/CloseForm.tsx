import { useState } from 'react';
import { View } from 'react-native';
import type { Recheck } from '../../shared/contracts/rechecks';
import { errorInWords } from '../queries/errorInWords';
import { useCloseRecheck } from '../queries/rechecks';
import { Button } from '../ui/Button';
import { useNotices } from '../ui/NoticeProvider';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { TextField } from '../ui/TextField';
import { useKeptText } from './useKeptText';

/** Closes an answered re-check, or opens it again, with the reason. */
export function CloseForm({ recheck }: { recheck: Recheck }) {
  const [text, setText, forget] = useKeptText(`close.${recheck.id}`);
  const [tried, setTried] = useState(false);
  const close = useCloseRecheck(recheck.id);
  const { show } = useNotices();
  const send = async (outcome: 'close' | 'reopen') => {
    setTried(true);
    if (text.trim() === '') return;
    try {
      // Awaited, since the new state takes this form away, and with it what mutate would call back.
      await close.mutateAsync({ outcome, text: text.trim() });
    } catch {
      // What failed stands at the field.
      return;
    }
    forget();
    show({ tone: 'settled', title: `The re-check of ${recheck.record} is ${outcome === 'close' ? 'closed' : 'open again'}.`, text: 'Its laboratory was told.' });
  };
  const working = (outcome: 'close' | 'reopen') => close.isPending && close.variables.outcome === outcome;
  const error = close.error ? errorInWords(close.error).text : tried && text.trim() === '' ? 'Give the reason in a sentence.' : undefined;
  return (
    <Section title="Does the answer settle it?" style={{ gap: 12 }}>
      <View style={{ maxWidth: 640, gap: 12, paddingTop: 8 }}>
        <TextField label="Reason" value={text} onChangeText={setText} rows={3} maxLength={4000} error={error} />
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
          <Button kind="primary" label="Close the re-check" working={working('close')} onPress={() => void send('close')} />
          <Button label="Open it again" working={working('reopen')} onPress={() => void send('reopen')} />
        </View>
        <Text size="secondary" tone="inkSoft">
          Closing changes no number; the question and the answer stay on the record’s trail.
        </Text>
      </View>
    </Section>
  );
}
