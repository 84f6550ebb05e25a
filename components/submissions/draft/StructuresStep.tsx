import { useState } from 'react';
import { View } from 'react-native';
import type { StructureEntry } from '../../../shared/contracts/content';
import type { Preview } from '../../../shared/contracts/submissions';
import { useBreakpoint } from '../../layout/useBreakpoint';
import { Button } from '../../ui/Button';
import { ConfirmDialog } from '../../ui/Dialog';
import { EmptyState } from '../../ui/Message';
import { Tabs } from '../../ui/Tabs';
import { FoundAt } from './FoundAt';
import { newStructure } from './newEntries';
import type { SpecimenPartProps } from './SpecimenStep';
import { StructureFields } from './StructureFields';
import { StructureOutcome } from './StructureOutcome';
import type { DraftPlace } from './useDraftPlace';

interface StructuresStepProps extends SpecimenPartProps {
  place: DraftPlace;
  preview: Preview | null;
  pending: boolean;
}

/** A position of the web: what follows stays beside the field one is in. */
const staysInView = { position: 'sticky' as 'relative', top: 0, alignSelf: 'flex-start' } as const;

const nameOf = (entry: StructureEntry, index: number) => entry.structure.replaceAll('_', ' ') || `structure ${index + 1}`;

/** The structures of the specimen, one open at a time; what follows from it stands beside it on wide screens. */
export function StructuresStep({ content, change, place, preview, pending }: StructuresStepProps) {
  const { sideBySide } = useBreakpoint();
  const [removing, setRemoving] = useState(false);
  const { structures } = content;
  const index = Math.min(place.structure, structures.length - 1);
  const entry = structures[index];
  const path = `structures.${index}`;
  const add = () => {
    change((now) => ({ ...now, structures: [...now.structures, newStructure()] }));
    place.go({ structure: structures.length });
  };
  const edit = (make: (now: StructureEntry) => StructureEntry) => change((now) => ({ ...now, structures: now.structures.map((one, at) => (at === index ? make(one) : one)) }));
  const remove = () => {
    setRemoving(false);
    change((now) => ({ ...now, structures: now.structures.filter((_, at) => at !== index) }));
    place.go({ structure: Math.max(0, index - 1) });
  };
  if (!entry) {
    return (
      <View id="field-structures" style={{ gap: 10 }}>
        <EmptyState title="No structure yet." text="Add the first one that was dissected: cerebral cortex, cerebellum, rest of brain." action={{ label: 'Add a structure', onPress: add }} />
        <FoundAt path="structures" />
      </View>
    );
  }
  return (
    <View id="field-structures" style={{ gap: 16 }}>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
        <Button label="Add a structure" onPress={add} />
        <Button kind="quiet" label={`Remove ${nameOf(entry, index)}`} onPress={() => setRemoving(true)} />
      </View>
      <Tabs label="Structures" value={entry.id} tabs={structures.map((one, at) => ({ value: one.id, label: nameOf(one, at) }))} onChange={(id) => place.go({ structure: structures.findIndex((one) => one.id === id) })}>
        <View style={{ flexDirection: sideBySide ? 'row' : 'column', gap: sideBySide ? 40 : 24 }}>
          <View style={{ flex: sideBySide ? 1.7 : undefined, minWidth: 0 }}>
            <StructureFields key={entry.id} path={path} entry={entry} openSample={place.sample} onOpenSample={(sample) => place.go({ sample })} onChange={edit} />
          </View>
          <View style={[{ flex: sideBySide ? 1 : undefined, minWidth: 0 }, sideBySide ? staysInView : null]}>
            <StructureOutcome path={path} entry={entry} derived={preview?.structures.find((derived) => derived.entryId === entry.id)} pending={pending} onSamples={(make) => edit((now) => ({ ...now, samples: make(now.samples) }))} />
          </View>
        </View>
      </Tabs>
      <ConfirmDialog
        open={removing}
        question={`Remove ${nameOf(entry, index)} from this draft?`}
        consequence={`Its mass${entry.samples.length > 0 ? `, ${entry.samples.length === 1 ? 'its sample' : `${entry.samples.length} samples`} and their counts` : ''} go out of the draft.`}
        confirmLabel="Remove it"
        cancelLabel="Keep it"
        onConfirm={remove}
        onCancel={() => setRemoving(false)}
      />
    </View>
  );
}
