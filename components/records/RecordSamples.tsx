import { View } from 'react-native';
import type { RecordPage } from '../../shared/contracts/register';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';

/** Raw counts of a specimen's record, sample by sample. Excluded aliquots stay listed with their reason. */
export function RecordSamples({ samples }: Pick<RecordPage, 'samples'>) {
  return (
    <Section title="Samples" look="small">
      {samples.map((sample, index) => (
        <View key={index} style={{ paddingVertical: 8, gap: 2 }}>
          <Text size="table" weight="semibold">
            {sample.label.startsWith(sample.side) ? sample.label : `${sample.label || `sample ${index + 1}`}, ${sample.side.replaceAll('-', ' ')}`}
          </Text>
          <Text size="table">{`nuclei ${sample.aliquots.map((aliquot) => `${aliquot.nuclei}${aliquot.excluded ? ` (excluded: ${aliquot.excluded})` : ''}`).join(', ')} in ${uniqueVolumes(sample.aliquots)} µL each`}</Text>
          <Text size="secondary" tone="inkSoft">
            {[
              sample.tissueMassG === null ? null : `tissue ${sample.tissueMassG} g`,
              `suspension ${sample.suspensionVolumeMl} mL`,
              `dilution ${sample.dilution}`,
              sample.neun.length > 0 ? `NeuN-positive ${sample.neun.map((field) => `${field.positive} of ${field.total}`).join(', ')}` : null,
            ]
              .filter(Boolean)
              .join(' · ')}
          </Text>
        </View>
      ))}
    </Section>
  );
}

function uniqueVolumes(aliquots: RecordPage['samples'][number]['aliquots']): string {
  return [...new Set(aliquots.map((aliquot) => Number((aliquot.volumeMl * 1000).toPrecision(4))))].join(' or ');
}
