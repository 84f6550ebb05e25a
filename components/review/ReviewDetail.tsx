import { router, type Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { ReviewView } from '../../shared/contracts/submissions';
import type { DecisionKind } from '../../shared/contracts/vocabulary';
import { Screen } from '../layout/Screen';
import { timeText } from '../layout/timeText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { CheckList } from '../marks/CheckList';
import { RecordTrail } from '../marks/RecordTrail';
import { StateSign } from '../marks/StateSign';
import { BackLink } from '../ui/TextLink';
import { Button } from '../ui/Button';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { checkRows } from '../marks/checkRows';
import { CommentSheet } from './CommentSheet';
import { DecisionSheet } from './DecisionSheet';
import { Evidence } from './Evidence';
import { HeldRecords } from './HeldRecords';
import { LiteratureReview } from './LiteratureReview';
import { PlacesOfSubmission } from './PlacesOfSubmission';
import { ProvenanceFacts } from './ProvenanceFacts';
import { ReviewList } from './ReviewList';
import { StructureReview } from './StructureReview';
import { Threads } from './Threads';

/** One submission under review: raw counts, what follows, checks, evidence, place on the line, threads, trail, decision. */
export function ReviewDetail({ view }: { view: ReviewView }) {
  const { wide, sideBySide } = useBreakpoint();
  const [commentAt, setCommentAt] = useState<string | null>(null);
  const [decision, setDecision] = useState<DecisionKind | null>(null);
  const { content } = view;
  const onComment = view.may.comment ? setCommentAt : undefined;
  const structures = view.structures.map((key) => key.replaceAll('_', ' ')).join(', ');
  const submitted = view.submittedAt ? `submitted ${timeText(view.submittedAt)} by ${view.by.name}${view.lab ? `, ${view.lab}` : ''}` : 'not submitted';
  return (
    <Screen
      title={`Review of ${view.title}`}
      heading={view.species || view.title}
      headingLook={view.kind === 'specimen' ? 'species' : 'page'}
      headingEnd={view.code || undefined}
      sub={`${structures} · revision ${view.revision}, ${submitted}`}
      back={wide ? undefined : <BackLink href={'/review' as Href} label="Review" />}
      actions={<StateSign state={view.status} />}
      list={sideBySide ? <ReviewList currentId={view.id} asPanel /> : undefined}
      onSheet
      demonstration={view.demonstration}
      foot={<DecisionFoot view={view} onDecide={setDecision} />}
    >
      <View style={{ flexDirection: sideBySide ? 'row' : 'column', gap: 32 }}>
        <View style={{ flex: sideBySide ? 1.6 : undefined, minWidth: 0, gap: 24 }}>
          {content.kind === 'specimen'
            ? content.structures.map((entry, index) => <StructureReview key={entry.id} content={content} index={index} derived={view.preview.structures.find((derived) => derived.entryId === entry.id)} onComment={onComment} />)
            : <LiteratureReview content={content} />}
          {content.kind === 'specimen' ? <PlacesOfSubmission structures={view.preview.structures} /> : null}
          <Evidence submissionId={view.id} attachments={view.attachments} />
          <HeldRecords held={view.held} />
        </View>
        <View style={{ flex: sideBySide ? 1 : undefined, minWidth: 0, gap: 24 }}>
          <Section title="Checks" look="small">
            <CheckList checks={checkRows(view.preview.checks, content.explanations, content)} />
          </Section>
          <Threads detail={view} />
          <ProvenanceFacts content={content} onComment={onComment} />
          <Section title="Trail" look="small">
            <RecordTrail events={view.events.map((event, index) => ({ key: String(index), what: event.kind.replaceAll('-', ' '), detail: `revision ${event.revision}, ${event.by.name}`, when: timeText(event.at), why: event.reason || undefined }))} />
          </Section>
        </View>
      </View>
      {commentAt === null ? null : <CommentSheet detail={view} path={commentAt} onClose={() => setCommentAt(null)} />}
      {decision === null ? null : <DecisionSheet view={view} decision={decision} onClose={() => setDecision(null)} onDecided={() => (setDecision(null), router.push('/review' as Href))} />}
    </Screen>
  );
}

function DecisionFoot({ view, onDecide }: { view: ReviewView; onDecide: (decision: DecisionKind) => void }) {
  const { wide } = useBreakpoint();
  if (view.status !== 'submitted') {
    const last = view.decisions.at(-1);
    return <Text size="secondary">{last ? `Decided ${timeText(last.at)} by ${last.by.name}: ${last.comment}` : `This revision is ${view.status.replaceAll('-', ' ')}.`}</Text>;
  }
  if (!view.may.decide) return <Text size="secondary" tone="inkSoft">{view.may.whyNotDecide ?? 'A reviewer of another laboratory decides.'}</Text>;
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10, flex: 1, justifyContent: 'flex-end', alignItems: 'center' }}>
      {wide ? (
        <Text size="secondary" tone="inkSoft" style={{ flex: 1 }}>
          The decision is on the whole of revision {view.revision}.
        </Text>
      ) : null}
      <Button kind="danger" label="Decline" onPress={() => onDecide('decline')} />
      <Button label="Ask for changes" onPress={() => onDecide('request-changes')} grow={!wide} />
      <Button kind="primary" label="Approve" onPress={() => onDecide('approve')} grow={!wide} />
    </View>
  );
}
