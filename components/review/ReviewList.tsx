import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { SubmissionItem } from '../../shared/contracts/submissions';
import { ageText } from '../layout/timeText';
import { BinomialSpan } from '../marks/Binomial';
import { CladeMark } from '../marks/CladeMark';
import { DemoMark } from '../marks/DemoMark';
import { useAccount } from '../queries/account';
import { errorInWords } from '../queries/errorInWords';
import { useReviewQueue } from '../queries/review';
import { useTheme } from '../theme/ThemeProvider';
import { Heading } from '../ui/Heading';
import { Hint } from '../ui/Hint';
import { QueryView } from '../ui/QueryView';
import { Row } from '../ui/Row';
import { Span, Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

/** What waits for a decision, answered first, then oldest. Beside the view on wide screens, a page of its own on a phone. */
export function ReviewList({ currentId, asPanel }: { currentId?: string; asPanel?: boolean }) {
  const queue = useReviewQueue();
  const { labName } = useAccount();
  const count = queue.data?.items.length ?? 0;
  return (
    <View style={{ flex: asPanel ? 1 : undefined, paddingTop: asPanel ? 24 : 0 }}>
      {asPanel ? (
        <View style={{ paddingHorizontal: 20, paddingBottom: 16 }}>
          <Heading level={2} look="page">
            Review
          </Heading>
          <Text size="secondary" tone="inkSoft">
            {queue.data ? `${count} ${count === 1 ? 'waits' : 'wait'}, answered first, then oldest` : ' '}
          </Text>
        </View>
      ) : null}
      <QueryView
        pending={queue.isPending}
        error={queue.error ? errorInWords(queue.error) : null}
        data={queue.data}
        isEmpty={(page) => page.items.length === 0}
        empty={{ title: 'Nothing waits for a decision.', text: 'Submissions of other laboratories appear here, with a notice.' }}
        onRetry={() => void queue.refetch()}
      >
        {(page) => (
          <View role="list">
            {page.items.map((item) => (
              <QueueRow key={item.id} item={item} current={item.id === currentId} ownLab={labName !== null && item.lab === labName} inset={asPanel ? 20 : 0} />
            ))}
          </View>
        )}
      </QueryView>
      <View style={{ padding: asPanel ? 20 : 0, paddingTop: 16 }}>
        <Hint>Submissions of your own laboratory are decided by others.</Hint>
        <TextLink href={'/rechecks' as Href} size="secondary" style={{ paddingVertical: 10 }}>
          Re-checks
        </TextLink>
      </View>
    </View>
  );
}

function QueueRow({ item, current, ownLab, inset }: { item: SubmissionItem; current: boolean; ownLab: boolean; inset: number }) {
  const { colour } = useTheme();
  return (
    <View role="listitem" style={{ position: 'relative', paddingHorizontal: inset, paddingVertical: 12, gap: 2, borderBottomWidth: 1, borderBottomColor: colour.hairline, backgroundColor: current ? colour.sheet : 'transparent' }}>
      <Row justify="space-between" align="baseline">
        <TextLink href={`/review/${item.id}` as Href} look="plain" coversRow spokenLabel={`${item.title}, revision ${item.revision}`} style={{ flexShrink: 1 }}>
          <Text>{item.species ? <BinomialSpan name={item.species} /> : item.title}</Text>
        </TextLink>
        <Text size="secondary" tone="inkSoft">
          {ageText(item.submittedAt ?? item.updatedAt)}
        </Text>
      </Row>
      <Row justify="space-between" align="center">
        <Row gap={6} style={{ flexShrink: 1 }}>
          {item.clade ? <CladeMark clade={item.clade} radius={4.5} /> : null}
          <Text size="secondary">
            {item.kind === 'literature' ? 'literature values' : item.code} <Span tone="inkSoft">{`· revision ${item.revision}`}</Span>
          </Text>
        </Row>
        {item.answered ? (
          <Text size="secondary" weight="semibold" tone="settled">
            answered
          </Text>
        ) : null}
      </Row>
      {ownLab ? (
        <Text size="secondary" tone="inkSoft">
          own laboratory: others decide
        </Text>
      ) : null}
      {item.demonstration ? <DemoMark /> : null}
    </View>
  );
}
