import { router, type Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { LiteratureContent, SpecimenContent } from '../../../shared/contracts/content';
import type { SubmissionDetail } from '../../../shared/contracts/submissions';
import { hasBlocks, unexplainedWarnings } from '../../../shared/domain/checks/outcome';
import { Screen } from '../../layout/Screen';
import { useBreakpoint } from '../../layout/useBreakpoint';
import { errorInWords, fieldErrorsOf, problemCode } from '../../queries/errorInWords';
import { useSubmit } from '../../queries/submissions';
import { Threads } from '../../review/Threads';
import { Button } from '../../ui/Button';
import { Disclosure } from '../../ui/Disclosure';
import { Notice } from '../../ui/Notice';
import { useNotices } from '../../ui/NoticeProvider';
import { Hint } from '../../ui/Hint';
import { Text } from '../../ui/Text';
import { BackLink } from '../../ui/TextLink';
import { WithdrawAct } from '../WithdrawAct';
import { CheckStep } from './CheckStep';
import { DraftContext } from './DraftContext';
import { EvidenceStep } from './EvidenceStep';
import { ProvenanceStep } from './ProvenanceStep';
import { reachField } from './reachField';
import { SaveSign, SaveTrouble } from './SaveSign';
import { SourceStep } from './SourceStep';
import { SpecimenStep } from './SpecimenStep';
import { stepsOf } from './steps';
import { StepsNav } from './StepsNav';
import { StructuresStep } from './StructuresStep';
import { TissueStep } from './TissueStep';
import { useDraft } from './useDraft';
import { useDraftPlace } from './useDraftPlace';
import { useLiveChecks } from './useLiveChecks';
import { ValuesStep } from './ValuesStep';

/** The form of a draft: steps that can be left and come back to, kept as one types, checked as one types. */
export function DraftScreen({ detail }: { detail: SubmissionDetail }) {
  const { wide } = useBreakpoint();
  const { content, state, saver } = useDraft(detail);
  const place = useDraftPlace(content.kind);
  const live = useLiveChecks(content, detail.id);
  const [tried, setTried] = useState(false);
  const [submitting, setSubmitting] = useState(false);
  const submit = useSubmit(detail.id);
  const { show } = useNotices();
  const steps = stepsOf(content.kind);
  const next = steps[steps.findIndex((step) => step.key === place.step.key) + 1];

  const changeSpecimen = (make: (now: SpecimenContent) => SpecimenContent) => saver.change((now) => (now.kind === 'specimen' ? make(now) : now));
  const changeLiterature = (make: (now: LiteratureContent) => LiteratureContent) => saver.change((now) => (now.kind === 'literature' ? make(now) : now));

  const send = async () => {
    setTried(true);
    submit.reset();
    if (hasBlocks(live.checks) || unexplainedWarnings(live.checks, content.explanations).length > 0) {
      setTimeout(() => reachField('blocks'), 60);
      return;
    }
    setSubmitting(true);
    try {
      if (!(await saver.flush())) return;
      const sent = await submit.mutateAsync();
      show({ tone: 'settled', title: `Revision ${sent.revision} of ${sent.title} is submitted.`, text: 'Reviewers of other laboratories were told; you hear of their decision.' });
      router.replace(`/submissions/${sent.id}` as Href);
    } catch (error) {
      if (problemCode(error) === 'checks-block') setTimeout(() => reachField('blocks'), 60);
    } finally {
      setSubmitting(false);
    }
  };

  const named = detail.title !== '' ? detail.title : 'New submission';
  const species = content.kind === 'specimen' && detail.species !== '';
  return (
    <DraftContext.Provider value={{ submissionId: detail.id, content, checks: live.checks, refused: fieldErrorsOf(submit.error), tried, comments: detail.comments }}>
      <Screen
        title={`Draft of ${named}`}
        heading={species ? detail.species : named}
        headingLook={species ? 'species' : 'page'}
        headingEnd={species && detail.code ? <Text size="body">{detail.code}</Text> : undefined}
        sub={`${content.kind === 'specimen' ? 'Specimen' : 'Literature values'} · draft of revision ${detail.revision} · ${place.step.about}`}
        back={<BackLink href={'/submissions' as Href} label="Submissions" />}
        topEnd={<SaveSign state={state} />}
        demonstration={detail.demonstration}
        foot={
          <View style={{ flex: 1, minWidth: 0, gap: 10 }}>
            <SaveTrouble state={state} saver={saver} />
            <View style={{ flexDirection: 'row', gap: 10, justifyContent: 'flex-end' }}>
              <Button label="Keep draft" onPress={() => void saver.flush().then(() => router.push('/submissions' as Href))} grow={!wide} />
              {next ? <Button kind="primary" label={`Next: ${next.label.toLowerCase()}`} onPress={() => place.go({ step: next.key })} grow={!wide} /> : null}
              {next ? null : <Button kind="primary" label="Submit for review" working={submitting} workingLabel="Submitting" disabled={!detail.may.submit} onPress={() => void send()} grow={!wide} />}
            </View>
          </View>
        }
      >
        <StepsNav steps={steps} current={place.step.key} checks={live.checks} onGo={(step) => place.go({ step })} />
        {submit.error ? <Notice tone="flagged" {...errorInWords(submit.error)} /> : null}
        <Asked detail={detail} />
        <View key={place.step.key} role="region" aria-label={place.step.label} style={{ gap: 16 }}>
          {place.step.key === 'specimen' && content.kind === 'specimen' ? <SpecimenStep content={content} change={changeSpecimen} /> : null}
          {place.step.key === 'structures' && content.kind === 'specimen' ? <StructuresStep content={content} change={changeSpecimen} place={place} preview={live.preview} pending={live.pending} /> : null}
          {place.step.key === 'tissue' && content.kind === 'specimen' ? <TissueStep content={content} change={changeSpecimen} /> : null}
          {place.step.key === 'source' && content.kind === 'literature' ? <SourceStep content={content} change={changeLiterature} /> : null}
          {place.step.key === 'values' && content.kind === 'literature' ? <ValuesStep content={content} change={changeLiterature} /> : null}
          {place.step.key === 'provenance' ? <ProvenanceStep kind={content.kind} provenance={content.provenance} onChange={(patch) => saver.change((now) => ({ ...now, provenance: { ...now.provenance, ...patch } }))} /> : null}
          {place.step.key === 'evidence' ? <EvidenceStep submissionId={detail.id} attachments={detail.attachments} /> : null}
          {place.step.key === 'check' ? (
            <>
              <CheckStep content={content} preview={live.preview} pending={live.pending} failed={live.failed} onExplain={(key, text) => saver.change((now) => ({ ...now, explanations: { ...now.explanations, [key]: text } }))} onReach={place.reach} />
              <Hint>A submitted revision never changes; a reviewer of another laboratory decides on it as a whole.</Hint>
              {detail.may.withdraw ? <WithdrawAct detail={detail} /> : null}
            </>
          ) : null}
        </View>
      </Screen>
    </DraftContext.Provider>
  );
}

/** What the review asked for, at the top of every step of the answering revision. */
function Asked({ detail }: { detail: SubmissionDetail }) {
  const last = detail.decisions.at(-1);
  const asked = last?.decision === 'request-changes' ? last : null;
  // A draft takes no comments itself: an answer stands at the revision that was submitted last.
  const submitted = detail.revisions.findLast((one) => one.submittedAt !== null)?.revision ?? detail.revision;
  if (asked === null && detail.comments.length === 0 && detail.recheck === null) return null;
  return (
    <View style={{ gap: 8 }}>
      {asked ? <Notice tone="waiting" sign="ring" title={`${asked.by.name} asks for changes in revision ${asked.revision}`} text={asked.comment} /> : null}
      {detail.recheck && detail.recheck.status !== 'closed' ? <Notice tone="waiting" sign="clock" title="Re-check" text={detail.recheck.question} action={{ label: 'Open the re-check', href: `/rechecks/${detail.recheck.id}` as Href }} /> : null}
      {detail.comments.length > 0 ? (
        <Disclosure label={`Comments at fields, ${detail.comments.length}`}>
          <Threads detail={{ ...detail, revision: submitted, changes: [] }} />
        </Disclosure>
      ) : null}
    </View>
  );
}
