import { View } from 'react-native';
import type { LiteratureContent } from '../../../shared/contracts/content';
import { Section } from '../../ui/Section';
import { DraftText, FieldGrid } from './fields';
import { SharedAnimals } from './ProvenanceStep';

export interface LiteraturePartProps {
  content: LiteratureContent;
  change: (make: (content: LiteratureContent) => LiteratureContent) => void;
}

/** The publication that prints the values, and which other sources hold the same animals. */
export function SourceStep({ content, change }: LiteraturePartProps) {
  const { source } = content;
  const set = (patch: Partial<LiteratureContent['source']>) => change((now) => ({ ...now, source: { ...now.source, ...patch } }));
  return (
    <View style={{ gap: 24 }}>
      <Section title="Source" style={{ gap: 12 }}>
        <FieldGrid least={260}>
          <DraftText path="source.doi" label="DOI of the source" hint="It begins with 10." value={source.doi} maxLength={200} onChange={(doi) => set({ doi })} />
          <DraftText path="source.year" label="Year" inputMode="numeric" value={source.year} maxLength={4} onChange={(year) => set({ year })} />
        </FieldGrid>
        <DraftText path="source.citation" label="Citation of the source" rows={3} value={source.citation} maxLength={1000} hint="Authors, year, title, where it was published." onChange={(citation) => set({ citation })} />
      </Section>
      <SharedAnimals path="source.sharesAnimalsWith" shared={source.sharesAnimalsWith} onChange={(sharesAnimalsWith) => set({ sharesAnimalsWith })} />
      <DraftText path="note" label="Note on the source" rows={3} maxLength={4000} value={content.note} onChange={(note) => change((now) => ({ ...now, note }))} />
    </View>
  );
}
