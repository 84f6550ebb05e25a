import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { Recheck } from '../../shared/contracts/rechecks';
import { fieldName } from '../../shared/domain/fieldNames';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { timeText } from '../layout/timeText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { RecordTrail } from '../marks/RecordTrail';
import { StateSign } from '../marks/StateSign';
import { errorInWords } from '../queries/errorInWords';
import { useRecheck } from '../queries/rechecks';
import { KeyValueRows, type KeyValue } from '../ui/KeyValueRows';
import { QueryView } from '../ui/QueryView';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { BackLink, TextLink } from '../ui/TextLink';
import { AnswerForm } from './AnswerForm';
import { CloseForm } from './CloseForm';

const back = <BackLink href={'/rechecks' as Href} label="Re-checks" />;

export function RecheckScreen({ id }: { id: string }) {
  return (
    <RoleGate title="Re-check" roles={['contributor', 'reviewer', 'curator']}>
      <OneRecheck key={id} id={id} />
    </RoleGate>
  );
}

function OneRecheck({ id }: { id: string }) {
  const recheck = useRecheck(id);
  if (recheck.data) return <RecheckDetail recheck={recheck.data} />;
  return (
    <Screen title="Re-check" back={back}>
      <QueryView pending={recheck.isPending} error={recheck.error ? errorInWords(recheck.error) : null} data={recheck.data} onRetry={() => void recheck.refetch()}>
        {() => null}
      </QueryView>
    </Screen>
  );
}

const answers = { confirmed: 'confirmed with evidence', corrected: 'corrected by a revision', withdrawn: 'withdrawn' } as const;

/** The question and the flag in words, what happened since, and what one may do now. */
function RecheckDetail({ recheck }: { recheck: Recheck }) {
  const { sideBySide } = useBreakpoint();
  const { may } = recheck;
  const facts: KeyValue[] = [
    { key: 'record', label: 'record', value: <TextLink href={`/records/${recheck.record}` as Href}>{recheck.record}</TextLink> },
    { key: 'structure', label: 'structure', value: recheck.structure.replaceAll('_', ' ') },
    { key: 'lab', label: 'laboratory', value: recheck.lab ?? 'none' },
    ...(recheck.fieldPath === '' ? [] : [{ key: 'field', label: 'at', value: fieldName(recheck.fieldPath) }]),
    { key: 'asked', label: 'asked', value: `${timeText(recheck.at)}, ${recheck.askedBy.name}` },
  ];
  return (
    <Screen title={`Re-check of ${recheck.record}`} heading={recheck.species} headingLook="species" headingEnd={<Text>{recheck.record}</Text>} sub={`Re-check · ${recheck.structure.replaceAll('_', ' ')}`} back={back} topEnd={<StateSign state={recheck.status} />} demonstration={recheck.demonstration}>
      <View style={{ flexDirection: sideBySide ? 'row' : 'column', gap: sideBySide ? 40 : 24 }}>
        <View style={{ flex: sideBySide ? 1.4 : undefined, minWidth: 0, gap: 24 }}>
          <Section title="Question" style={{ gap: 8 }}>
            <Text style={{ paddingTop: 8 }}>{recheck.question}</Text>
            {recheck.flag ? (
              <View style={{ gap: 2 }}>
                <StateSign state="flagged" words="asked from a flag" size="secondary" />
                <Text size="secondary">{recheck.flag}</Text>
              </View>
            ) : null}
          </Section>
          <Section title="What happened" look="small">
            <RecordTrail
              events={recheck.events.map((event, index) => ({
                key: String(index),
                what: event.answer ? `answered: ${answers[event.answer]}` : event.kind,
                detail: [event.by.name, event.by.lab, event.submissionRevision === null ? null : `revision ${event.submissionRevision}`].filter(Boolean).join(', '),
                when: timeText(event.at),
                why: event.text,
              }))}
            />
          </Section>
          {may.answer ? <AnswerForm recheck={recheck} /> : null}
          {may.close ? <CloseForm recheck={recheck} /> : null}
          {!may.answer && !may.close && may.whyNot ? <Text tone="inkSoft">{may.whyNot}</Text> : null}
        </View>
        <View style={{ flex: sideBySide ? 1 : undefined, minWidth: 0 }}>
          <Section title="Record" look="small">
            <KeyValueRows rows={facts} />
          </Section>
        </View>
      </View>
    </Screen>
  );
}
