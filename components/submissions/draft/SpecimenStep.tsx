import { View } from 'react-native';
import type { SpecimenContent } from '../../../shared/contracts/content';
import { ageClasses, bodyMassKinds, massUnits, origins, sexes } from '../../../shared/contracts/vocabulary';
import { Hint } from '../../ui/Hint';
import { Section } from '../../ui/Section';
import { DraftChoice, DraftNumber, DraftQuantity, DraftText, FieldGrid } from './fields';
import { SpeciesChoice } from './SpeciesChoice';
import { optionsOf } from './words';

export interface SpecimenPartProps {
  content: SpecimenContent;
  change: (make: (content: SpecimenContent) => SpecimenContent) => void;
}

/** The animal: species, code, origin, sex, age, body mass, dates, place. */
export function SpecimenStep({ content, change }: SpecimenPartProps) {
  const { specimen } = content;
  const set = (patch: Partial<SpecimenContent['specimen']>) => change((now) => ({ ...now, specimen: { ...now.specimen, ...patch } }));
  const human = specimen.taxon === 'homo-sapiens';
  const dateHint = human ? 'Of a human donor the year alone.' : undefined;
  return (
    <View style={{ gap: 24 }}>
      <Section title="Species" style={{ gap: 12 }}>
        <SpeciesChoice path="specimen" value={specimen} onChange={set} />
      </Section>
      <Section title="Animal" style={{ gap: 12 }}>
        <FieldGrid pairs>
          <DraftText path="specimen.code" label="Specimen code" hint={human ? 'No hospital code and no initials.' : 'Unique in your laboratory.'} value={specimen.code} maxLength={60} onChange={(code) => set({ code })} />
          <DraftChoice path="specimen.origin" label="Origin" value={specimen.origin} options={optionsOf(origins)} onChange={(origin) => set({ origin })} />
          <DraftText path="specimen.strain" label="Strain or breed" value={specimen.strain} maxLength={200} onChange={(strain) => set({ strain })} />
          <DraftChoice path="specimen.sex" label="Sex" value={specimen.sex} options={optionsOf(sexes)} onChange={(sex) => set({ sex })} />
          <DraftChoice path="specimen.ageClass" label="Age class" value={specimen.ageClass} options={optionsOf(ageClasses)} onChange={(ageClass) => set({ ageClass })} />
          {human && specimen.ageDays === '' ? null : <DraftNumber path="specimen.ageDays" label="Age in days" value={specimen.ageDays} maxLength={20} onChange={(ageDays) => set({ ageDays })} />}
          <DraftQuantity path="specimen.bodyMass" label="Body mass" tone="mass" value={specimen.bodyMass} units={massUnits} onChange={(bodyMass) => set({ bodyMass })} />
          <DraftChoice path="specimen.bodyMassKind" label="Kind of body mass" value={specimen.bodyMassKind} options={optionsOf(bodyMassKinds)} onChange={(bodyMassKind) => set({ bodyMassKind })} />
        </FieldGrid>
      </Section>
      <Section title="Dates and places" style={{ gap: 12 }}>
        <FieldGrid pairs>
          <DraftText path="specimen.diedOn" label="Date of death" hint={dateHint} value={specimen.diedOn} placeholder={human ? 'YYYY' : 'YYYY-MM-DD'} maxLength={10} onChange={(diedOn) => set({ diedOn })} />
          <DraftText path="specimen.fixedOn" label="Date of fixation" hint={dateHint} value={specimen.fixedOn} placeholder={human ? 'YYYY' : 'YYYY-MM-DD'} maxLength={10} onChange={(fixedOn) => set({ fixedOn })} />
          <DraftText path="specimen.locality" label="Locality" hint="Coarse: a region or a tenth of a degree, no exact place of wild animals." value={specimen.locality} maxLength={200} onChange={(locality) => set({ locality })} />
          <DraftText path="specimen.voucher" label="Voucher" hint="Collection and number, where one is kept." value={specimen.voucher} maxLength={200} onChange={(voucher) => set({ voucher })} />
        </FieldGrid>
        {human ? <Hint>Human donors are never identifiable: years instead of days, ages as a class, no codes of a hospital.</Hint> : null}
      </Section>
    </View>
  );
}
