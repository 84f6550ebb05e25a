import { View } from 'react-native';
import type { LiteratureNumber, LiteratureValueEntry } from '../../../shared/contracts/content';
import { centreKinds, countingMethods, massStates, massUnits, origins, spreadKinds } from '../../../shared/contracts/vocabulary';
import { useStructures } from '../../queries/register';
import type { Tone } from '../../theme/tokens';
import { Disclosure } from '../../ui/Disclosure';
import { useFieldChecks } from './DraftContext';
import { DraftChoice, DraftNumber, DraftQuantity, DraftText, FieldGrid } from './fields';
import { SpeciesChoice } from './SpeciesChoice';
import { optionsOf } from './words';

interface ValueFieldsProps {
  path: string;
  value: LiteratureValueEntry;
  number: number;
  onChange: (patch: Partial<LiteratureValueEntry>) => void;
}

const quantities: readonly { key: 'structureMass' | 'cells' | 'neurons' | 'otherCells' | 'bodyMass'; label: string; tone: Tone }[] = [
  { key: 'structureMass', label: 'Structure mass', tone: 'mass' },
  { key: 'cells', label: 'Cells', tone: 'cells' },
  { key: 'neurons', label: 'Neurons', tone: 'neurons' },
  { key: 'otherCells', label: 'Other cells', tone: 'other' },
  { key: 'bodyMass', label: 'Body mass', tone: 'mass' },
];

/** One row of a source: species, structure, and each value as printed. */
export function ValueFields({ path, value, number, onChange }: ValueFieldsProps) {
  const structures = useStructures();
  const options = (structures.data ?? []).map(({ key, name, animalClass }) => ({ value: key, label: animalClass ? `${name} (${animalClass})` : name }));
  const choose = (structure: string) => onChange({ structure, definitionVersion: structures.data?.find(({ key }) => key === structure)?.definitions.at(-1)?.version ?? 1 });
  return (
    <View id={`field-${path}`} role="group" aria-label={`Row ${number}`} style={{ gap: 16 }}>
      <SpeciesChoice path={path} value={value} onChange={onChange} />
      <FieldGrid least={280}>
        <DraftChoice path={`${path}.structure`} label="Structure" value={value.structure === '' ? null : value.structure} options={options} onChange={choose} />
        <DraftText path={`${path}.place`} label="Place in the source" hint="Table, figure, page." value={value.place} maxLength={200} onChange={(place) => onChange({ place })} />
      </FieldGrid>
      {quantities.map(({ key, label, tone }) => (
        <PrintedNumber key={key} path={`${path}.${key}`} label={label} tone={tone} isMass={key.endsWith('Mass')} value={value[key]} onChange={(printed) => onChange({ [key]: printed })} />
      ))}
      <Disclosure label="Origin, mass state, method, what is printed differently" startsOpen={value.printedDifferently !== '' || value.note !== ''}>
        <View style={{ gap: 14 }}>
          <FieldGrid>
            <DraftChoice path={`${path}.origin`} label="Origin" value={value.origin} options={optionsOf(origins)} onChange={(origin) => onChange({ origin })} />
            <DraftChoice path={`${path}.massState`} label="Mass state" value={value.massState} options={optionsOf(massStates)} onChange={(massState) => onChange({ massState })} />
            <DraftChoice path={`${path}.method`} label="Method of counting" value={value.method} options={optionsOf(countingMethods)} onChange={(method) => onChange({ method })} />
          </FieldGrid>
          <DraftText path={`${path}.printedDifferently`} label="Printed differently" rows={2} hint="What the source prints where it is not what is used, and why." value={value.printedDifferently} maxLength={4000} onChange={(printedDifferently) => onChange({ printedDifferently })} />
          <DraftText path={`${path}.note`} label="Note on the value" rows={2} value={value.note} maxLength={4000} onChange={(note) => onChange({ note })} />
        </View>
      </Disclosure>
    </View>
  );
}

interface PrintedNumberProps {
  path: string;
  label: string;
  tone: Tone;
  isMass: boolean;
  value: LiteratureNumber;
  onChange: (value: LiteratureNumber) => void;
}

/** A value as printed, its kind of centre, its spread and the number of animals. The kinds are asked once there is a value. */
function PrintedNumber({ path, label, tone, isMass, value, onChange }: PrintedNumberProps) {
  const set = (patch: Partial<LiteratureNumber>) => onChange({ ...value, ...patch });
  const whole = useFieldChecks(path);
  const lower = label.toLowerCase();
  return (
    <View id={`field-${path}`} role="group" aria-label={label}>
      <FieldGrid least={150}>
        {isMass ? (
          <DraftQuantity path={`${path}.text`} label={label} tone={tone} value={value} units={massUnits} hint={whole.error ?? whole.warning} onChange={({ text, unit }) => set({ text, unit })} />
        ) : (
          <DraftNumber path={`${path}.text`} label={label} tone={tone} value={value.text} maxLength={60} hint={whole.error ?? whole.warning} onChange={(text) => set({ text })} />
        )}
        {value.text.trim() === '' ? null : (
          <>
            <DraftChoice path={`${path}.centre`} label={`Centre, ${lower}`} value={value.centre} options={optionsOf(centreKinds, { single: 'single animal' })} onChange={(centre) => set({ centre })} />
            <DraftNumber path={`${path}.spreadText`} label={`Spread, ${lower}`} value={value.spreadText} maxLength={60} onChange={(spreadText) => set({ spreadText })} />
            <DraftChoice path={`${path}.spreadKind`} label={`Kind of spread, ${lower}`} value={value.spreadKind} options={optionsOf(spreadKinds)} onChange={(spreadKind) => set({ spreadKind })} />
            <DraftNumber path={`${path}.n`} label={`Animals, ${lower}`} whole hint="Empty where not printed." value={value.n} maxLength={10} onChange={(n) => set({ n })} />
          </>
        )}
      </FieldGrid>
    </View>
  );
}
