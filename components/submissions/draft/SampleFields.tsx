import { View } from 'react-native';
import type { SampleEntry } from '../../../shared/contracts/content';
import { massUnits, scaleUpKinds, sides, volumeUnits } from '../../../shared/contracts/vocabulary';
import { countingChambers } from '../../../shared/domain/chambers';
import { Button } from '../../ui/Button';
import { Disclosure } from '../../ui/Disclosure';
import { Heading } from '../../ui/Heading';
import { Text } from '../../ui/Text';
import { AliquotFields } from './AliquotFields';
import { DraftChoice, DraftNumber, DraftQuantity, DraftText, FieldGrid, FieldPlace } from './fields';
import { FoundAt } from './FoundAt';
import { NeunFields } from './NeunFields';
import { SampleOutcome } from './SampleOutcome';
import { optionsOf } from './words';

interface SampleFieldsProps {
  path: string;
  sample: SampleEntry;
  structure: string;
  onChange: (patch: Partial<SampleEntry>) => void;
}

const chamberOptions = countingChambers.map(({ key, name }) => ({ value: key, label: name }));

/** One dissociated portion: mass and suspension, scale-up, chamber, aliquots, NeuN counts, who counted. */
export function SampleFields({ path, sample, structure, onChange }: SampleFieldsProps) {
  const chamber = countingChambers.find(({ key }) => key === sample.chamber.key);
  return (
    <View id={`field-${path}`} style={{ gap: 18 }}>
      <FieldGrid least={150}>
        <DraftQuantity path={`${path}.tissueMass`} label="Tissue mass" tone="mass" value={sample.tissueMass} units={massUnits} onChange={(tissueMass) => onChange({ tissueMass })} />
        <DraftQuantity path={`${path}.suspensionVolume`} label="Suspension volume" value={sample.suspensionVolume} units={volumeUnits} onChange={(suspensionVolume) => onChange({ suspensionVolume })} />
        <DraftNumber path={`${path}.dilution`} label="Dilution" hint="Final ÷ original volume: 5, not 1 : 5." value={sample.dilution} maxLength={20} onChange={(dilution) => onChange({ dilution })} />
        <DraftChoice path={`${path}.side`} label="Side counted" value={sample.side} options={optionsOf(sides)} onChange={(side) => onChange({ side })} />
        <DraftText path={`${path}.label`} label="Portion label" hint="Whole, frontal half, slab 3." value={sample.label} maxLength={200} onChange={(label) => onChange({ label })} />
      </FieldGrid>
      <ScaleUp path={path} sample={sample} onChange={onChange} />
      <FieldGrid least={280}>
        <DraftChoice path={`${path}.chamber.key`} label="Counting chamber" hint={chamber?.note} value={sample.chamber.key} options={chamberOptions} onChange={(key) => onChange({ chamber: { ...sample.chamber, key } })} />
        {chamber?.squareVolumeMl == null ? <DraftQuantity path={`${path}.chamber.squareVolume`} label="Volume of one square" value={sample.chamber.squareVolume} units={volumeUnits} onChange={(squareVolume) => onChange({ chamber: { ...sample.chamber, squareVolume } })} /> : null}
      </FieldGrid>
      <View style={{ gap: 8 }}>
        <Heading level={4} look="small" tone="cells">
          Aliquots
        </Heading>
        <AliquotFields path={`${path}.aliquots`} sample={sample} onChange={(aliquots) => onChange({ aliquots })} />
        <SampleOutcome sample={sample} structure={structure} />
      </View>
      <View style={{ gap: 8 }}>
        <Heading level={4} look="small" tone="neurons">
          NeuN counts
        </Heading>
        <NeunFields path={`${path}.neun`} fields={sample.neun} onChange={(neun) => onChange({ neun })} />
      </View>
      <FieldGrid least={150}>
        <DraftText path={`${path}.countedOn`} label="Date of counting" placeholder="YYYY-MM-DD" value={sample.countedOn} maxLength={10} onChange={(countedOn) => onChange({ countedOn })} />
        <DraftText path={`${path}.observer`} label="Observer" value={sample.observer} maxLength={200} onChange={(observer) => onChange({ observer })} />
        <DraftText path={`${path}.secondObserver`} label="Second observer" value={sample.secondObserver} maxLength={200} onChange={(secondObserver) => onChange({ secondObserver })} />
        <DraftText path={`${path}.antibodyRrid`} label="Antibody RRID" placeholder="RRID:" value={sample.antibodyRrid} maxLength={200} onChange={(antibodyRrid) => onChange({ antibodyRrid })} />
      </FieldGrid>
      <Further path={path} sample={sample} onChange={onChange} />
    </View>
  );
}

type PartProps = Omit<SampleFieldsProps, 'structure'>;

export const doubledScaleUp: SampleEntry['scaleUp'] = { kind: 'other-side', factor: '2', factorSe: '' };

function ScaleUp({ path, sample, onChange }: PartProps) {
  const { scaleUp, side } = sample;
  const set = (part: Partial<SampleEntry['scaleUp']>) => onChange({ scaleUp: { ...scaleUp, ...part } });
  const byFactor = scaleUp.kind === 'mass-fraction' || scaleUp.kind === 'slab-series';
  const chooseKind = (kind: (typeof scaleUpKinds)[number]) => onChange({ scaleUp: kind === 'other-side' ? doubledScaleUp : { kind, factor: kind === 'none' ? '1' : scaleUp.factor, factorSe: kind === 'none' ? '' : scaleUp.factorSe } });
  return (
    <FieldPlace path={`${path}.scaleUp`}>
      <View style={{ gap: 10 }}>
        <FieldGrid least={280}>
          <DraftChoice path={`${path}.scaleUp.kind`} label="Scale-up" value={scaleUp.kind} options={optionsOf(scaleUpKinds, { none: 'none: all of it was dissociated' })} onChange={chooseKind} />
          {byFactor ? <DraftNumber path={`${path}.scaleUp.factor`} label="Scale-up factor" hint="Whole ÷ counted, 1 or more." value={scaleUp.factor} maxLength={20} onChange={(factor) => set({ factor })} /> : null}
          {byFactor ? <DraftNumber path={`${path}.scaleUp.factorSe`} label="Error of the scale-up factor" value={scaleUp.factorSe} maxLength={20} onChange={(factorSe) => set({ factorSe })} /> : null}
        </FieldGrid>
        {scaleUp.kind === 'none' && side !== 'both' && side !== 'midline' ? <Button label="One side counted: double it" onPress={() => onChange({ scaleUp: doubledScaleUp })} style={{ alignSelf: 'flex-start' }} /> : null}
        {scaleUp.kind === 'other-side' ? <Text size="secondary">×2: one side counted and scaled to both. Mass, counts and their standard errors × 2; per-mg values stay those of the tissue counted.</Text> : null}
        <FoundAt path={`${path}.scaleUp`} />
      </View>
    </FieldPlace>
  );
}

function Further({ path, sample, onChange }: PartProps) {
  const hasMore = [sample.suspension, sample.suspensionVolumeSe.text, sample.dilutionSe, sample.note].some((text) => text.trim() !== '') || sample.pooledWith.length > 0;
  return (
    <Disclosure label="Errors of volume and dilution, pooling, note" startsOpen={hasMore}>
      <View style={{ gap: 14 }}>
        <FieldGrid least={220}>
          <DraftText path={`${path}.suspension`} label="Suspension" hint="Samples with the same word here share the errors of volume and dilution." value={sample.suspension} maxLength={200} onChange={(suspension) => onChange({ suspension })} />
          <DraftQuantity path={`${path}.suspensionVolumeSe`} label="Error of the suspension volume" value={sample.suspensionVolumeSe} units={volumeUnits} onChange={(suspensionVolumeSe) => onChange({ suspensionVolumeSe })} />
          <DraftNumber path={`${path}.dilutionSe`} label="Error of the dilution" value={sample.dilutionSe} maxLength={20} onChange={(dilutionSe) => onChange({ dilutionSe })} />
          <DraftText
            path={`${path}.pooledWith`}
            label="Pooled with, codes of further animals"
            hint="Separated by commas; the specimen itself is not repeated."
            value={sample.pooledWith.join(', ')}
            onChange={(text) => onChange({ pooledWith: text.trim() === '' ? [] : text.split(',').map((code, at) => (at === 0 ? code.trimStart() : code.replace(/^ /, ''))) })}
          />
        </FieldGrid>
        <DraftText path={`${path}.note`} label="Note on the sample" rows={2} maxLength={4000} value={sample.note} onChange={(note) => onChange({ note })} />
      </View>
    </Disclosure>
  );
}
