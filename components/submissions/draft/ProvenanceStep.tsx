import { View } from 'react-native';
import type { SubmissionContent } from '../../../shared/contracts/content';
import { approvalKinds, overlapKinds } from '../../../shared/contracts/vocabulary';
import { useAccount } from '../../queries/account';
import { readingWidth } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Checkbox } from '../../ui/Checkbox';
import { Hint } from '../../ui/Hint';
import { Row } from '../../ui/Row';
import { Section } from '../../ui/Section';
import { SegmentedChoice } from '../../ui/SegmentedChoice';
import { useFieldChecks } from './DraftContext';
import { DraftChoice, DraftText, FieldGrid, FieldPlace } from './fields';
import { optionsOf } from './words';

type Provenance = SubmissionContent['provenance'];
type Shared = Provenance['sharesAnimalsWith'];

interface ProvenanceStepProps {
  kind: SubmissionContent['kind'];
  provenance: Provenance;
  onChange: (patch: Partial<Provenance>) => void;
}

/** Published or not, approval and permits, who shares animals, embargo, licence. */
export function ProvenanceStep({ kind, provenance, onChange }: ProvenanceStepProps) {
  const approvalText = { exempt: 'Reason of the exemption', permit: 'Number of the permit', number: 'Number of the approval', 'see-source': 'Where the source states it' } as const;
  return (
    <View style={{ gap: 24 }}>
      {kind === 'specimen' ? (
        <>
          <Section title="Publication" style={{ gap: 12 }}>
            <FieldPlace path="provenance.published">
              <View style={{ maxWidth: 400 }}>
                <SegmentedChoice label="Are these counts published?" value={provenance.published ? 'yes' : 'no'} options={[{ value: 'no', label: 'not published' }, { value: 'yes', label: 'published' }]} onChange={(answer) => onChange({ published: answer === 'yes' })} />
              </View>
            </FieldPlace>
            <FieldGrid least={260}>
              <DraftText path="provenance.doi" label="DOI of the publication" hint="It begins with 10." value={provenance.doi} maxLength={200} onChange={(doi) => onChange({ doi })} />
              <DraftText path="provenance.protocolDoi" label="Protocol DOI" value={provenance.protocolDoi} maxLength={200} onChange={(protocolDoi) => onChange({ protocolDoi })} />
            </FieldGrid>
            <View style={{ maxWidth: readingWidth }}>
              <DraftText path="provenance.citation" label="Citation" rows={2} value={provenance.citation} maxLength={4000} hint="Where there is no DOI." onChange={(citation) => onChange({ citation })} />
            </View>
          </Section>
          <Section title="Approval" style={{ gap: 12 }}>
            <FieldGrid least={260}>
              <DraftChoice path="provenance.approvalKind" label="Approval" value={provenance.approvalKind} options={optionsOf(approvalKinds)} onChange={(approvalKind) => onChange({ approvalKind })} />
              <DraftText path="provenance.approvalText" label={approvalText[provenance.approvalKind ?? 'number']} value={provenance.approvalText} maxLength={200} onChange={(text) => onChange({ approvalText: text })} />
              <DraftText path="provenance.permits" label="Permits, CITES and Nagoya" hint="Where they apply to the species or its country." value={provenance.permits} maxLength={200} onChange={(permits) => onChange({ permits })} />
            </FieldGrid>
          </Section>
          <SharedAnimals path="provenance.sharesAnimalsWith" shared={provenance.sharesAnimalsWith} onChange={(sharesAnimalsWith) => onChange({ sharesAnimalsWith })} />
        </>
      ) : null}
      <Section title="When it may be shown" style={{ gap: 12 }}>
        <FieldGrid least={260}>
          <DraftText path="provenance.embargoUntil" label="Embargo until" placeholder="YYYY-MM-DD" maxLength={10} hint="A day, or empty. Reviewed and approved as usual; in no version and no public answer before that day." value={provenance.embargoUntil} onChange={(embargoUntil) => onChange({ embargoUntil })} />
        </FieldGrid>
      </Section>
      <Licence kind={kind} accepted={provenance.licenceAccepted} onChange={(licenceAccepted) => onChange({ licenceAccepted })} />
    </View>
  );
}

function Licence({ kind, accepted, onChange }: { kind: SubmissionContent['kind']; accepted: boolean; onChange: (accepted: boolean) => void }) {
  const { name, orcid } = useAccount();
  const { error } = useFieldChecks('provenance.licenceAccepted');
  return (
    <Section title="Licence" style={{ gap: 10 }}>
      <FieldPlace path="provenance.licenceAccepted">
        <Checkbox label="I agree to the licence CC BY 4.0, and to what freezing means" checked={accepted} onChange={onChange} error={error} />
      </FieldPlace>
      <Hint>
        {`Freezing is for ever. Each version that carries these values names you${name ? ` as ${name}` : ''}${orcid ? `, ORCID iD ${orcid}` : ', without an ORCID iD (you can add yours at your account)'}, and states the licence; name, ORCID iD and licence stay in that version and cannot be taken back.`}
        {kind === 'literature' ? ' Printed facts carry their source and no claim; the licence covers your own words.' : ''}
      </Hint>
    </Section>
  );
}

/** Other sources that hold some of the same animals: only one of them enters a mean. */
export function SharedAnimals({ path, shared, onChange }: { path: string; shared: Shared; onChange: (shared: Shared) => void }) {
  const patch = (index: number, part: Partial<Shared[number]>) => onChange(shared.map((entry, at) => (at === index ? { ...entry, ...part } : entry)));
  return (
    <Section title="Same animals elsewhere" style={{ gap: 12 }}>
      <Hint>Name every source that holds some of these animals. Of sources that share animals only one enters a species mean.</Hint>
      {shared.map((entry, index) => (
        <View key={index} role="group" aria-label={`Shared source ${index + 1}`} style={{ gap: 8 }}>
          <FieldGrid least={260}>
            <DraftText path={`${path}.${index}.source`} label={`Source ${index + 1}, DOI or citation`} value={entry.source} maxLength={200} onChange={(source) => patch(index, { source })} />
            <DraftChoice path={`${path}.${index}.overlap`} label={`Overlap with source ${index + 1}`} value={entry.overlap} options={optionsOf(overlapKinds)} onChange={(overlap) => patch(index, { overlap })} />
          </FieldGrid>
          <Button kind="quiet" label={`Remove source ${index + 1}`} onPress={() => onChange(shared.filter((_, at) => at !== index))} style={{ alignSelf: 'flex-start', marginLeft: -8 }} />
        </View>
      ))}
      <Row>
        <Button label="Add a source that shares animals" onPress={() => onChange([...shared, { source: '', overlap: 'unknown' }])} />
      </Row>
    </Section>
  );
}
