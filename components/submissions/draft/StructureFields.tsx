import { View } from 'react-native';
import type { SampleEntry, StructureEntry } from '../../../shared/contracts/content';
import { delineationCriteria, massUnits } from '../../../shared/contracts/vocabulary';
import { useStructures } from '../../queries/register';
import { Button } from '../../ui/Button';
import { Checkbox } from '../../ui/Checkbox';
import { Disclosure } from '../../ui/Disclosure';
import { Hint } from '../../ui/Hint';
import { Section } from '../../ui/Section';
import { Tabs } from '../../ui/Tabs';
import { DraftChoice, DraftQuantity, DraftText, FieldGrid, FieldPlace } from './fields';
import { FoundAt } from './FoundAt';
import { newSample } from './newEntries';
import { SampleFields } from './SampleFields';
import { wordOf } from './words';

interface StructureFieldsProps {
  path: string;
  entry: StructureEntry;
  openSample: number;
  onOpenSample: (index: number) => void;
  onChange: (make: (entry: StructureEntry) => StructureEntry) => void;
}

/** One dissected structure: which, its mass where weighed apart, how it was bounded, and its samples. */
export function StructureFields({ path, entry, openSample, onOpenSample, onChange }: StructureFieldsProps) {
  const structures = useStructures();
  const set = (patch: Partial<StructureEntry>) => onChange((now) => ({ ...now, ...patch }));
  const chosen = structures.data?.find((structure) => structure.key === entry.structure);
  const options = (structures.data ?? []).map(({ key, name, animalClass }) => ({ value: key, label: animalClass ? `${name} (${animalClass})` : name }));
  const definition = chosen?.definitions.find(({ version }) => version === entry.definitionVersion);
  const composition = definition ? [definition.includes.length > 0 ? `with ${definition.includes.join(', ')}` : '', definition.excludes.length > 0 ? `without ${definition.excludes.join(', ')}` : ''].filter(Boolean).join('; ') : '';
  const choose = (key: string) => set({ structure: key, definitionVersion: structures.data?.find((structure) => structure.key === key)?.definitions.at(-1)?.version ?? 1 });
  return (
    <View id={`field-${path}`} style={{ gap: 18 }}>
      <FieldGrid least={280}>
        <DraftChoice path={`${path}.structure`} label="Structure" hint={composition || (structures.isError ? 'The list of structures did not arrive; reload the page.' : undefined)} value={entry.structure === '' ? null : entry.structure} options={options} onChange={choose} />
        {chosen && chosen.definitions.length > 1 ? (
          <DraftChoice path={`${path}.definitionVersion`} label="Definition version" value={String(entry.definitionVersion)} options={chosen.definitions.map(({ version, note }) => ({ value: String(version), label: note ? `${version}: ${note}` : String(version) }))} onChange={(version) => set({ definitionVersion: Number(version) })} />
        ) : null}
        <DraftQuantity path={`${path}.mass`} label="Mass of the structure" tone="mass" hint="Both sides, where it was weighed apart; else the samples give it." value={entry.mass} units={massUnits} onChange={(mass) => set({ mass })} />
      </FieldGrid>
      <Delineation path={path} entry={entry} set={set} />
      <Samples path={path} entry={entry} open={openSample} onOpen={onOpenSample} onChange={onChange} />
      <DraftText path={`${path}.note`} label="Note on the structure" rows={2} maxLength={4000} value={entry.note} onChange={(note) => set({ note })} />
    </View>
  );
}

function Delineation({ path, entry, set }: { path: string; entry: StructureEntry; set: (patch: Partial<StructureEntry>) => void }) {
  return (
    <Disclosure label="Delineation, for areas" note={entry.delineation.map(wordOf).join(', ') || 'how the area was bounded'} startsOpen={entry.delineationNote !== ''}>
      <FieldPlace path={`${path}.delineation`}>
        <View role="group" aria-label="Criteria of delineation">
          {delineationCriteria.map((criterion) => (
            <Checkbox key={criterion} label={wordOf(criterion)} checked={entry.delineation.includes(criterion)} onChange={(on) => set({ delineation: delineationCriteria.filter((known) => (known === criterion ? on : entry.delineation.includes(known))) })} />
          ))}
        </View>
        <FoundAt path={`${path}.delineation`} />
        <DraftText path={`${path}.delineationNote`} label="Note on the delineation" rows={2} maxLength={4000} value={entry.delineationNote} onChange={(delineationNote) => set({ delineationNote })} />
      </FieldPlace>
    </Disclosure>
  );
}

interface SamplesProps {
  path: string;
  entry: StructureEntry;
  open: number;
  onOpen: (index: number) => void;
  onChange: StructureFieldsProps['onChange'];
}

function Samples({ path, entry, open, onOpen, onChange }: SamplesProps) {
  const index = Math.min(open, entry.samples.length - 1);
  const sample = entry.samples[index];
  const patch = (part: Partial<SampleEntry>) => onChange((now) => ({ ...now, samples: now.samples.map((one, at) => (at === index ? { ...one, ...part } : one)) }));
  const add = () => {
    onChange((now) => ({ ...now, samples: [...now.samples, newSample()] }));
    onOpen(entry.samples.length);
  };
  const remove = () => {
    onChange((now) => ({ ...now, samples: now.samples.filter((_, at) => at !== index) }));
    onOpen(Math.max(0, index - 1));
  };
  const fields = sample ? <SampleFields key={sample.id} path={`${path}.samples.${index}`} sample={sample} structure={entry.structure} onChange={patch} /> : null;
  return (
    <Section title={entry.samples.length > 1 ? `Samples, ${index + 1} of ${entry.samples.length}` : 'Sample'} level={3} id={`field-${path}.samples`} style={{ gap: 12 }}>
      {sample ? null : <Hint>A structure that was only weighed needs none. Counted: add one sample for each portion that was dissociated.</Hint>}
      {entry.samples.length > 1 && sample ? (
        <Tabs label="Samples" value={sample.id} tabs={entry.samples.map((one, at) => ({ value: one.id, label: one.label || `Sample ${at + 1}` }))} onChange={(id) => onOpen(entry.samples.findIndex((one) => one.id === id))}>
          {fields}
        </Tabs>
      ) : (
        fields
      )}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <Button label={sample ? 'Add another sample' : 'Add a sample'} onPress={add} />
        {sample ? <Button kind="quiet" label={entry.samples.length > 1 ? `Remove sample ${index + 1}` : 'Remove this sample'} onPress={remove} /> : null}
      </View>
    </Section>
  );
}
