import type { SubmissionContent } from '../../shared/contracts/content';
import { PropertyList, type Property } from '../marks/PropertyList';
import { Button } from '../ui/Button';
import { Section } from '../ui/Section';

type Fact = readonly [label: string, value: string | null | undefined];

const entered = ({ text, unit }: { text: string; unit: string }): string => (text === '' ? '' : `${text} ${unit}`);
const approvalWords = { number: 'approval number', permit: 'permit', exempt: 'exempt', 'see-source': 'see source' } as const;

function facts(content: SubmissionContent): Fact[] {
  const { provenance } = content;
  const common: Fact[] = [
    ['approval', provenance.approvalKind ? `${approvalWords[provenance.approvalKind]}${provenance.approvalText ? `: ${provenance.approvalText}` : ''}` : null],
    ['permits', provenance.permits],
    ['published', provenance.published ? provenance.doi || provenance.citation || 'yes' : content.kind === 'specimen' ? 'unpublished' : null],
    ['protocol', provenance.protocolDoi],
    ['embargo until', provenance.embargoUntil],
    ['shares animals with', provenance.sharesAnimalsWith.map((shared) => `${shared.source} (${shared.overlap})`).join('; ')],
    ['licence', provenance.licenceAccepted ? 'CC BY 4.0, accepted' : 'not accepted'],
    ['note', content.note],
  ];
  if (content.kind === 'literature') return [['source', content.source.citation], ['DOI', content.source.doi], ['year', content.source.year], ...common];
  const { specimen } = content;
  return [
    ['name as entered', `${specimen.nameAsEntered}${specimen.qualifier === 'none' ? '' : ` (${specimen.qualifier})`}`],
    ['origin', specimen.origin],
    ['sex', specimen.sex],
    ['age', [specimen.ageClass, specimen.ageDays ? `${specimen.ageDays} days` : ''].filter(Boolean).join(', ')],
    ['body mass', `${entered(specimen.bodyMass)}${specimen.bodyMassKind ? `, ${specimen.bodyMassKind}` : ''}`],
    ['mass state', content.massState],
    ['fixation', content.fixation],
    ['post-mortem interval', content.postMortemIntervalH ? `${content.postMortemIntervalH} h` : ''],
    ['method of counting', content.method],
    ['died', specimen.diedOn],
    ['locality', specimen.locality],
    ['voucher', specimen.voucher],
    ...common,
  ];
}

/** Where a submission's values come from: animal, tissue, approval, licence. What was not entered is left out. */
export function ProvenanceFacts({ content, onComment }: { content: SubmissionContent; onComment?: (path: string) => void }) {
  const properties: Property[] = facts(content)
    .filter(([, value]) => value !== null && value !== undefined && value.trim() !== '')
    .map(([label, value]) => ({ key: label, label, value: value ?? '' }));
  return (
    <Section title="Provenance" look="small" end={onComment ? <Button kind="quiet" label="Comment" spokenLabel="Comment on the provenance" onPress={() => onComment('provenance')} /> : null} style={{ gap: 10 }}>
      <PropertyList properties={properties} />
    </Section>
  );
}
