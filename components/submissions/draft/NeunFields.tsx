import { View } from 'react-native';
import type { SampleEntry } from '../../../shared/contracts/content';
import { Button } from '../../ui/Button';
import { DraftNumber, FieldGrid, FieldPlace } from './fields';
import { FoundAt } from './FoundAt';

type Field = SampleEntry['neun'][number];

/** NeuN counts, kept per field or load: positive nuclei of those scored. */
export function NeunFields({ path, fields, onChange }: { path: string; fields: readonly Field[]; onChange: (fields: Field[]) => void }) {
  const patch = (index: number, part: Partial<Field>) => onChange(fields.map((field, at) => (at === index ? { ...field, ...part } : field)));
  const last = fields.at(-1);
  const lastIsEmpty = last !== undefined && last.positive.trim() === '' && last.total.trim() === '';
  return (
    <FieldPlace path={path}>
      <View style={{ gap: 10 }}>
        {fields.map((field, index) => (
          <FieldGrid key={index} least={150}>
            <DraftNumber path={`${path}.${index}.positive`} label={`NeuN-positive, field ${index + 1}`} tone="neurons" value={field.positive} maxLength={20} whole onChange={(positive) => patch(index, { positive })} />
            <DraftNumber path={`${path}.${index}.total`} label={`Nuclei scored, field ${index + 1}`} value={field.total} maxLength={20} whole onChange={(total) => patch(index, { total })} />
          </FieldGrid>
        ))}
        <FoundAt path={path} />
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
          <Button label="Add NeuN field" onPress={() => onChange([...fields, { positive: '', total: '' }])} />
          {lastIsEmpty ? <Button kind="quiet" label={`Remove empty field ${fields.length}`} onPress={() => onChange(fields.slice(0, -1))} /> : null}
        </View>
      </View>
    </FieldPlace>
  );
}
