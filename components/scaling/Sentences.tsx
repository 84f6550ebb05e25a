import { View } from 'react-native';
import type { ScalingAnswer } from '../../shared/contracts/fits';
import type { CladeMarkSpec } from '../theme/cladeMarks';
import { CladeMark } from '../marks/CladeMark';
import { Sign } from '../ui/Sign';
import { Row } from '../ui/Row';
import { Text } from '../ui/Text';
import { constructionWarning } from './variables';

interface SentencesProps {
  answer: ScalingAnswer;
  marks: ReadonlyMap<string, CladeMarkSpec>;
}

/** What the exponents mean, in a sentence a clade. */
export function Sentences({ answer, marks }: SentencesProps) {
  const warning = constructionWarning(answer.question);
  return (
    <View style={{ gap: 8 }}>
      {warning ? <Warning text={warning} /> : null}
      {answer.sentences.map(({ clade, text }) => (
        <Row key={`${clade} ${text}`} gap={8} align="flex-start">
          <View style={{ paddingTop: 6 }}>
            <CladeMark clade={clade} spec={marks.get(clade)} />
          </View>
          <Text style={{ flexShrink: 1 }}>{text}</Text>
        </Row>
      ))}
      {answer.question.method === 'ols' ? null : (
        <Text size="secondary" tone="inkSoft">
          A standardised major axis is for symmetric relations, its slope only; it raises the exponent by 1/|r| and predicts nothing. Flags come from the least-squares fit.
        </Text>
      )}
    </View>
  );
}

/** What is mixed, left out or hangs on one species. */
export function Remarks({ answer }: { answer: ScalingAnswer }) {
  return (
    <View role="list" style={{ gap: 6 }}>
      {answer.remarks.map((remark) => (
        <View key={remark} role="listitem">
          <Text size="secondary" tone="inkSoft">
            {remark}
          </Text>
        </View>
      ))}
    </View>
  );
}

export function Warning({ text }: { text: string }) {
  return (
    <Row gap={8} align="flex-start">
      <View style={{ paddingTop: 4 }}>
        <Sign name="ring" tone="flagged" />
      </View>
      <Text tone="flagged" style={{ flexShrink: 1 }}>
        {text}
      </Text>
    </Row>
  );
}
