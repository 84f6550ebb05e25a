import { View } from 'react-native';
import { countingMethods, fixations, massStates } from '../../../shared/contracts/vocabulary';
import { useTheme } from '../../theme/ThemeProvider';
import { Section } from '../../ui/Section';
import { Text } from '../../ui/Text';
import { DraftChoice, DraftNumber, DraftText, FieldGrid } from './fields';
import type { SpecimenPartProps } from './SpecimenStep';
import { optionsOf } from './words';

/** In which state the tissue was weighed, how it was fixed and kept, and how the nuclei were counted. */
export function TissueStep({ content, change }: SpecimenPartProps) {
  const { colour } = useTheme();
  return (
    <View style={{ gap: 24 }}>
      <Section title="Tissue" style={{ gap: 12 }}>
        <FieldGrid>
          <DraftChoice path="massState" label="Mass state" hint="Fresh and fixed masses are never converted; a fit that mixes them says so." value={content.massState} options={optionsOf(massStates)} onChange={(massState) => change((now) => ({ ...now, massState }))} />
          <DraftChoice path="fixation" label="Fixation" value={content.fixation} options={optionsOf(fixations)} onChange={(fixation) => change((now) => ({ ...now, fixation }))} />
          <DraftNumber path="postMortemIntervalH" label="Post-mortem interval" unit="h" value={content.postMortemIntervalH} maxLength={20} onChange={(postMortemIntervalH) => change((now) => ({ ...now, postMortemIntervalH }))} />
          <DraftNumber path="storageDays" label="Storage time" unit="days" value={content.storageDays} maxLength={20} onChange={(storageDays) => change((now) => ({ ...now, storageDays }))} />
        </FieldGrid>
      </Section>
      <Section title="Method" style={{ gap: 12 }}>
        <FieldGrid least={280}>
          <DraftChoice path="method" label="Method of counting" value={content.method} options={optionsOf(countingMethods)} onChange={(method) => change((now) => ({ ...now, method }))} />
        </FieldGrid>
        <DraftText path="note" label="Note on tissue and method" rows={3} maxLength={4000} value={content.note} hint="What a reviewer must know: meninges left on, a part lost, another buffer." onChange={(note) => change((now) => ({ ...now, note }))} />
      </Section>
      <View role="note" style={{ gap: 6, padding: 14, borderWidth: 1, borderColor: colour.hairline, borderLeftWidth: 4, borderLeftColor: colour.waiting, backgroundColor: colour.sheet, maxWidth: 640 }}>
        <Text size="table" weight="semibold">
          With care
        </Text>
        <Text size="table">Paraformaldehyde and DAPI are hazardous, glass homogenisers break, UV lamps harm eyes and skin. Never touch this device with gloves that met tissue, DAPI or fixative: change them, or bag the device.</Text>
        <Text size="table">For macaque, bat, carnivore and human tissue the laboratory’s biosafety rules and trained staff prevail.</Text>
      </View>
    </View>
  );
}
