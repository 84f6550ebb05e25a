import { View } from 'react-native';
import type { LiteratureValueEntry } from '../../../shared/contracts/content';
import { Button } from '../../ui/Button';
import { Disclosure } from '../../ui/Disclosure';
import { EmptyState } from '../../ui/Message';
import { useDraftContext } from './DraftContext';
import { FoundAt } from './FoundAt';
import { newLiteratureValue } from './newEntries';
import type { LiteraturePartProps } from './SourceStep';
import { ValueFields } from './ValueFields';

const fewRows = 3;

function rowName(value: LiteratureValueEntry, index: number): string {
  const name = [value.nameAsEntered || value.taxon.replace('-', ' '), value.structure.replaceAll('_', ' ')].filter(Boolean).join(', ');
  return `${index + 1} · ${name || 'a new row'}`;
}

/** Rows of a source: one species and structure each, opened one by one. */
export function ValuesStep({ content, change }: LiteraturePartProps) {
  const { checks } = useDraftContext();
  const { values } = content;
  const add = () => change((now) => ({ ...now, values: [...now.values, newLiteratureValue(now.values.at(-1))] }));
  const set = (index: number, patch: Partial<LiteratureValueEntry>) => change((now) => ({ ...now, values: now.values.map((value, at) => (at === index ? { ...value, ...patch } : value)) }));
  const remove = (index: number) => change((now) => ({ ...now, values: now.values.filter((_, at) => at !== index) }));
  return (
    <View id="field-values" style={{ gap: 12 }}>
      {values.length === 0 ? <EmptyState title="No value yet." text="Add a row for each species and structure that the source prints." action={{ label: 'Add a value', onPress: add }} /> : null}
      <FoundAt path="values" />
      {values.map((value, index) => {
        const open = checks.filter((check) => check.path.startsWith(`values.${index}.`) && check.level !== 'passes').length;
        return (
          <Disclosure key={value.id} label={rowName(value, index)} note={open > 0 ? `${open} to look at` : undefined} startsOpen={values.length <= fewRows || index === values.length - 1}>
            <ValueFields path={`values.${index}`} value={value} number={index + 1} onChange={(patch) => set(index, patch)} />
            <Button kind="quiet" label={`Remove row ${index + 1}`} onPress={() => remove(index)} style={{ alignSelf: 'flex-start', marginLeft: -8 }} />
          </Disclosure>
        );
      })}
      {values.length > 0 ? <Button label="Add a value" onPress={add} style={{ alignSelf: 'flex-start' }} /> : null}
    </View>
  );
}
