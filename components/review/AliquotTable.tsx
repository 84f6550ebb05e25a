import { View } from 'react-native';
import Svg, { Circle, Line } from 'react-native-svg';
import type { ReadSample } from '../../shared/domain/specimenReading';
import { formatQuantity } from '../../shared/domain/quantityText';
import { useTheme } from '../theme/ThemeProvider';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';

interface AliquotRow {
  key: string;
  number: number;
  nuclei: number;
  volumeMl: number;
  densityPerMl: number;
  /** Difference from the mean density, as a share of it; null where excluded. */
  fromMean: number | null;
  excluded: string | null;
}

function rowsOf(sample: ReadSample): AliquotRow[] {
  const aliquots = sample.input?.aliquots ?? [];
  const used = aliquots.filter((aliquot) => !aliquot.excluded);
  const mean = used.reduce((sum, aliquot) => sum + aliquot.nuclei, 0) / used.reduce((sum, aliquot) => sum + aliquot.volumeMl, 0);
  return aliquots.map((aliquot, index) => {
    const densityPerMl = aliquot.nuclei / aliquot.volumeMl;
    return { key: String(index), number: index + 1, nuclei: aliquot.nuclei, volumeMl: aliquot.volumeMl, densityPerMl, fromMean: aliquot.excluded ? null : densityPerMl / mean - 1, excluded: aliquot.excluded ?? null };
  });
}

/** A density of 1 in 5 from the mean reaches the thin lines. */
const SHARE_AT_LINE = 0.1;
const WIDTH = 92;

function FromMean({ share }: { share: number }) {
  const { colour } = useTheme();
  const middle = WIDTH / 2;
  const at = middle + Math.max(-1.8, Math.min(1.8, share / SHARE_AT_LINE)) * 24;
  return (
    <Svg width={WIDTH} height={22} role="img" aria-label={`${share < 0 ? '−' : '+'}${Math.abs(share * 100).toFixed(1)} % from the mean`}>
      {[-24, 24].map((offset) => (
        <Line key={offset} x1={middle + offset} x2={middle + offset} y1={3} y2={19} stroke={colour.hairline} />
      ))}
      <Line x1={middle} x2={at} y1={11} y2={11} stroke={colour.cells} strokeWidth={1.6} />
      <Line x1={middle} x2={middle} y1={1} y2={21} stroke={colour.ink} strokeWidth={1.4} />
      <Circle cx={at} cy={11} r={4.2} fill={colour.cells} />
    </Svg>
  );
}

const columns: TableColumn<AliquotRow>[] = [
  { key: 'number', head: 'aliquot', cell: (row) => <Text size="table">{String(row.number)}</Text> },
  {
    key: 'nuclei',
    head: 'nuclei',
    tone: 'cells',
    align: 'end',
    cell: (row) => (
      <Text size="table" weight="semibold" style={row.excluded ? { textDecorationLine: 'line-through' } : undefined}>
        {String(row.nuclei)}
      </Text>
    ),
  },
  { key: 'volume', head: 'volume', align: 'end', nowrap: true, phone: 'hide', cell: (row) => <Text size="table" tone="inkSoft">{`${Number((row.volumeMl * 1000).toPrecision(4))} µL`}</Text> },
  { key: 'density', head: 'nuclei per mL', align: 'end', nowrap: true, cell: (row) => <Text size="table">{formatQuantity({ value: row.densityPerMl, error: null, unit: '', kind: 'count' })?.text ?? '–'}</Text> },
  { key: 'from', head: 'from the mean', align: 'end', width: 110, cell: (row) => (row.fromMean === null ? <Text size="secondary" tone="flagged">{`excluded: ${row.excluded}`}</Text> : <FromMean share={row.fromMean} />) },
];

/** Raw counts of a sample: what was counted in which volume, and how far each aliquot lies from their mean. */
export function AliquotTable({ sample, label }: { sample: ReadSample; label: string }) {
  const neun = sample.input?.neun ?? null;
  const fields = neun === null ? [] : 'fields' in neun ? neun.fields : [neun];
  const positive = fields.reduce((sum, field) => sum + field.positive, 0);
  const total = fields.reduce((sum, field) => sum + field.total, 0);
  const facts = [
    sample.input ? `dilution ${sample.input.dilution ?? 1}` : null,
    sample.input ? `suspension ${sample.input.suspensionVolumeMl} mL` : null,
    sample.tissueMassG === null ? 'tissue mass not given' : `tissue ${sample.tissueMassG} g`,
    fields.length > 0 ? `NeuN-positive ${positive} of ${total}${fields.length > 1 ? ` in ${fields.length} fields` : ''}` : 'no NeuN count',
    sample.animals > 1 ? `pooled over ${sample.animals} animals` : null,
  ];
  return (
    <View style={{ gap: 6 }}>
      <Table caption={`Aliquots of ${label}`} rows={rowsOf(sample)} columns={columns} rowKey={(row) => row.key} dense phoneLayout="table" />
      <Text size="secondary" tone="inkSoft">
        {facts.filter((fact) => fact !== null).join(' · ')}
      </Text>
    </View>
  );
}
