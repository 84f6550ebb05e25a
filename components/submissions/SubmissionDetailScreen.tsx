import type { Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { SubmissionDetail } from '../../shared/contracts/submissions';
import { Screen } from '../layout/Screen';
import { timeText } from '../layout/timeText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { CheckList } from '../marks/CheckList';
import { RecordTrail } from '../marks/RecordTrail';
import { StateSign } from '../marks/StateSign';
import { errorInWords } from '../queries/errorInWords';
import { useRevise } from '../queries/submissions';
import { checkRows } from '../marks/checkRows';
import { CommentSheet } from '../review/CommentSheet';
import { Evidence } from '../review/Evidence';
import { LiteratureReview } from '../review/LiteratureReview';
import { PlacesOfSubmission } from '../review/PlacesOfSubmission';
import { ProvenanceFacts } from '../review/ProvenanceFacts';
import { StructureReview } from '../review/StructureReview';
import { Threads } from '../review/Threads';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { BackLink, TextLink } from '../ui/TextLink';
import { Decisions } from './Decisions';
import { WithdrawAct } from './WithdrawAct';

/** A submission that is not being written: state, values, checks, threads, evidence, decisions, trail, and what one may do. */
export function SubmissionDetailScreen({ detail }: { detail: SubmissionDetail }) {
  const { sideBySide } = useBreakpoint();
  const [commentAt, setCommentAt] = useState<string | null>(null);
  const { content } = detail;
  const onComment = detail.may.comment ? setCommentAt : undefined;
  const isSpecies = detail.kind === 'specimen' && detail.species !== '';
  const structures = detail.structures.map((key) => key.replaceAll('_', ' ')).join(', ');
  const when = detail.submittedAt ? `submitted ${timeText(detail.submittedAt)} by ${detail.by.name}` : `entered by ${detail.by.name}`;
  return (
    <Screen
      title={detail.title}
      heading={isSpecies ? detail.species : detail.title}
      headingLook={isSpecies ? 'species' : 'page'}
      headingEnd={isSpecies && detail.code ? <Text size="body">{detail.code}</Text> : undefined}
      sub={[structures, `revision ${detail.revision}`, when].filter(Boolean).join(' · ')}
      back={<BackLink href={'/submissions' as Href} label="Submissions" />}
      topEnd={<StateSign state={detail.status} />}
      demonstration={detail.demonstration}
    >
      <NextActs detail={detail} />
      <View style={{ flexDirection: sideBySide ? 'row' : 'column', gap: sideBySide ? 32 : 24 }}>
        <View style={{ flex: sideBySide ? 1.6 : undefined, minWidth: 0, gap: 24 }}>
          {content.kind === 'specimen'
            ? content.structures.map((entry, index) => <StructureReview key={entry.id} content={content} index={index} derived={detail.preview.structures.find((derived) => derived.entryId === entry.id)} onComment={onComment} />)
            : <LiteratureReview content={content} />}
          {content.kind === 'specimen' && detail.preview.structures.length > 0 ? <PlacesOfSubmission structures={detail.preview.structures} /> : null}
          <Evidence submissionId={detail.id} attachments={detail.attachments} />
        </View>
        <View style={{ flex: sideBySide ? 1 : undefined, minWidth: 0, gap: 24 }}>
          <Records detail={detail} />
          <Decisions decisions={detail.decisions} />
          <Section title="Checks" look="small">
            <CheckList checks={checkRows(detail.preview.checks, content.explanations, content)} />
          </Section>
          <Threads detail={detail} />
          <ProvenanceFacts content={content} onComment={onComment} />
          <Section title="Trail" look="small">
            <RecordTrail events={detail.events.map((event, index) => ({ key: String(index), what: event.kind.replaceAll('-', ' '), detail: `revision ${event.revision}, ${event.by.name}`, when: timeText(event.at), why: event.reason || undefined }))} />
          </Section>
        </View>
      </View>
      {commentAt === null ? null : <CommentSheet detail={detail} path={commentAt} onClose={() => setCommentAt(null)} />}
    </Screen>
  );
}

const standing: Readonly<Record<SubmissionDetail['status'], string>> = {
  draft: 'A draft: only the person who entered it changes it; colleagues of the laboratory read it.',
  submitted: 'It waits for a reviewer of another laboratory. You are told of the decision.',
  'changes-requested': 'The reviewer asks for changes. Write the next revision: it begins with these values.',
  approved: 'Approved: its values enter the next version when it is frozen. It changes only by a new revision that is reviewed again.',
  declined: 'Declined: it enters no version and stays listed.',
  withdrawn: 'Withdrawn: it stays listed.',
};

/** What its state means, and the acts that it allows. */
function NextActs({ detail }: { detail: SubmissionDetail }) {
  const revise = useRevise(detail.id);
  const { recheck } = detail;
  const answers = recheck !== null && recheck.status === 'open';
  return (
    <View style={{ gap: 12 }}>
      <Text style={{ maxWidth: 640 }}>{standing[detail.status]}</Text>
      {recheck && recheck.status !== 'closed' ? (
        <Notice tone="waiting" sign="clock" title={`Re-check ${recheck.status}`} text={recheck.question} action={{ label: answers ? 'Answer the re-check' : 'Open the re-check', href: `/rechecks/${recheck.id}` as Href }} />
      ) : null}
      {revise.error ? <Notice tone="flagged" {...errorInWords(revise.error)} /> : null}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        {detail.may.revise ? <Button kind={detail.status === 'changes-requested' ? 'primary' : 'secondary'} label={`Write revision ${Math.max(...detail.revisions.map((one) => one.revision)) + 1}`} working={revise.isPending} onPress={() => revise.mutate(answers ? { recheckId: recheck.id } : {})} /> : null}
        {detail.may.withdraw ? <WithdrawAct detail={detail} /> : null}
      </View>
    </View>
  );
}

function Records({ detail }: { detail: SubmissionDetail }) {
  if (detail.records.length === 0) return null;
  return (
    <Section title="Records made of it" look="small">
      {detail.records.map(({ number, structure }) => (
        <View key={number} style={{ flexDirection: 'row', justifyContent: 'space-between', gap: 12, minHeight: 40, alignItems: 'center' }}>
          <TextLink href={`/records/${number}` as Href}>{number}</TextLink>
          <Text size="table">{structure.replaceAll('_', ' ')}</Text>
        </View>
      ))}
    </Section>
  );
}
