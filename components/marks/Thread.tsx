import { View } from 'react-native';
import { useTheme } from '../theme/ThemeProvider';
import { radius } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Sign } from '../ui/Sign';
import { Span, Text } from '../ui/Text';
import { TextField } from '../ui/TextField';

export interface ThreadComment {
  key: string;
  who: string;
  /** ISO date and time with zone, as text. */
  when: string;
  text: string;
}

interface ThreadProps {
  /** The field it stands at, in the form's words. */
  field: string;
  /** "revision 1 → 2". */
  revisions?: string;
  /** What the value was and became. */
  change?: { from: string; to: string } | null;
  comments: readonly ThreadComment[];
  /** Where one may answer. */
  answer?: { value: string; onChange: (text: string) => void; onSend: () => void; working?: boolean; label?: string; error?: string };
}

/** Words about one field: its reticle, the value before and after, who said what, and the answer. */
export function Thread({ field, revisions, change, comments, answer }: ThreadProps) {
  const { colour } = useTheme();
  return (
    <View role="group" aria-label={`Thread at ${field}`} style={{ padding: 14, gap: 8, borderWidth: 1, borderColor: colour.hairline, borderRadius: radius.control, backgroundColor: colour.ground }}>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
        <Sign name="reticle" tone="cresyl" size={18} />
        <Text size="table" weight="semibold" style={{ flex: 1 }}>
          {field}
        </Text>
        {revisions ? (
          <Text size="secondary" tone="inkSoft">
            {revisions}
          </Text>
        ) : null}
      </View>
      <View style={{ paddingLeft: 26, gap: 10 }}>
        {change ? <ChangedValue {...change} /> : null}
        {comments.map(({ key, who, when, text }) => (
          <View key={key}>
            <Text size="secondary">
              <Span weight="semibold">{who}</Span>
              <Span tone="inkSoft">{`  ${when}`}</Span>
            </Text>
            <Text size="table">{text}</Text>
          </View>
        ))}
        {answer ? (
          <View style={{ gap: 8, alignItems: 'stretch' }}>
            <TextField label={answer.label ?? 'Answer at this field'} value={answer.value} onChangeText={answer.onChange} rows={2} error={answer.error} />
            <Button label="Send" working={answer.working} disabled={answer.value.trim() === ''} onPress={answer.onSend} style={{ alignSelf: 'flex-start' }} />
          </View>
        ) : null}
      </View>
    </View>
  );
}

/** The old value struck, an arrow, the new one. */
export function ChangedValue({ from, to }: { from: string; to: string }) {
  return (
    <Text size="table">
      <Span tone="inkSoft" style={{ textDecorationLine: 'line-through' }}>
        {from}
      </Span>
      <Span tone="inkSoft"> → </Span>
      <Span weight="semibold">{to}</Span>
    </Text>
  );
}
