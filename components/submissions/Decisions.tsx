import { View } from 'react-native';
import type { SubmissionDetail } from '../../shared/contracts/submissions';
import { timeText } from '../layout/timeText';
import { StateSign } from '../marks/StateSign';
import { useTheme } from '../theme/ThemeProvider';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';

const states = { approve: 'approved', 'request-changes': 'changes requested', decline: 'declined' } as const;

/** What was decided on each revision, newest first, with the reason. */
export function Decisions({ decisions }: { decisions: SubmissionDetail['decisions'] }) {
  const { colour } = useTheme();
  if (decisions.length === 0) return null;
  return (
    <Section title="Decisions" look="small">
      {[...decisions].reverse().map((decision) => (
        <View key={`${decision.revision}@${decision.at}`} style={{ gap: 2, paddingVertical: 8, borderBottomWidth: 1, borderBottomColor: colour.hairline }}>
          <StateSign state={states[decision.decision]} words={`revision ${decision.revision} ${states[decision.decision]}`} />
          <Text size="table">{decision.comment}</Text>
          <Text size="least" tone="inkSoft">{`${decision.by.name}${decision.by.lab ? `, ${decision.by.lab}` : ''} · ${timeText(decision.at)}`}</Text>
        </View>
      ))}
    </Section>
  );
}
