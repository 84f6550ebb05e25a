import { View } from 'react-native';
import type { SampleEntry } from '../../../shared/contracts/content';
import { exclusionReasons } from '../../../shared/contracts/vocabulary';
import { findChamber } from '../../../shared/domain/chambers';
import { formatQuantity } from '../../../shared/domain/quantityText';
import { parseCount, parseNumber, parseVolumeMl } from '../../../shared/domain/units';
import { useBreakpoint } from '../../layout/useBreakpoint';
import { Button } from '../../ui/Button';
import { Select } from '../../ui/Select';
import { Table, type TableColumn } from '../../ui/Table';
import { Text } from '../../ui/Text';
import { NumberField } from '../../ui/TextField';
import { useFieldChecks } from './DraftContext';
import { FieldPlace } from './fields';
import { FoundAt } from './FoundAt';
import { newAliquot } from './newEntries';
import { optionsOf } from './words';

type Aliquot = SampleEntry['aliquots'][number];
type Reason = (typeof exclusionReasons)[number];

interface AliquotRow {
  index: number;
  entry: Aliquot;
  volumeMl: number | null;
}

interface AliquotFieldsProps {
  path: string;
  sample: SampleEntry;
  onChange: (aliquots: Aliquot[]) => void;
}

const excludedOptions = [{ value: 'no' as const, label: 'counted' }, ...optionsOf(exclusionReasons).map(({ value, label }) => ({ value, label: `excluded: ${label}` }))];

/** The chamber loads: nuclei and squares of each, its density as one types, and why one is left out. */
export function AliquotFields({ path, sample, onChange }: AliquotFieldsProps) {
  const { wide } = useBreakpoint();
  const squareMl = findChamber(sample.chamber.key)?.squareVolumeMl ?? parseVolumeMl(sample.chamber.squareVolume).value;
  const rows = sample.aliquots.map((entry, index): AliquotRow => {
    const squares = parseCount(entry.squares).value;
    return { index, entry, volumeMl: squares === null || squareMl === null || squares <= 0 ? null : squares * squareMl };
  });
  const patch = (index: number, part: Partial<Aliquot>) => onChange(sample.aliquots.map((entry, at) => (at === index ? { ...entry, ...part } : entry)));
  const columns: TableColumn<AliquotRow>[] = [
    { key: 'number', head: 'aliquot', width: wide ? 60 : 48, cell: (row) => <Text size="table">{String(row.index + 1)}</Text> },
    { key: 'nuclei', head: 'nuclei', tone: 'cells', align: 'end', cell: (row) => <CountCell width={wide ? 110 : 92} path={`${path}.${row.index}.nuclei`} label={`Nuclei, aliquot ${row.index + 1}`} value={row.entry.nuclei} onChange={(nuclei) => patch(row.index, { nuclei })} strong /> },
    { key: 'squares', head: 'squares', align: 'end', cell: (row) => <CountCell width={wide ? 76 : 62} path={`${path}.${row.index}.squares`} label={`Squares, aliquot ${row.index + 1}`} value={row.entry.squares} onChange={(squares) => patch(row.index, { squares })} /> },
    { key: 'volume', head: 'volume', align: 'end', nowrap: true, phone: 'hide', cell: (row) => <Text size="table" tone="inkSoft">{row.volumeMl === null ? '–' : `${Number((row.volumeMl * 1000).toPrecision(4))} µL`}</Text> },
    { key: 'density', head: wide ? 'nuclei per mL' : 'per mL', align: 'end', nowrap: true, cell: (row) => <Density row={row} /> },
  ];
  if (wide) {
    columns.push({
      key: 'excluded',
      head: 'left out',
      align: 'end',
      width: 190,
      cell: (row) => <Exclusion row={row} onChange={(excluded) => patch(row.index, { excluded })} />,
    });
  }
  return (
    <FieldPlace path={path}>
      <View style={{ gap: 8 }}>
        <Table caption="Aliquots" rows={rows} columns={columns} rowKey={(row) => String(row.index)} phoneLayout="table" />
        <FoundAt path={path} under />
        {wide ? null : <ExclusionsOnPhone rows={rows} onChange={(index, excluded) => patch(index, { excluded })} />}
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 10 }}>
          <Button label="Add aliquot" onPress={() => onChange([...sample.aliquots, newAliquot(sample.aliquots.at(-1)?.squares)])} />
          {sample.aliquots.at(-1)?.nuclei.trim() === '' ? <Button kind="quiet" label={`Remove empty aliquot ${sample.aliquots.length}`} onPress={() => onChange(sample.aliquots.slice(0, -1))} /> : null}
        </View>
      </View>
    </FieldPlace>
  );
}

function CountCell({ path, label, value, onChange, strong, width }: { path: string; label: string; width: number; value: string; onChange: (text: string) => void; strong?: boolean }) {
  const found = useFieldChecks(path);
  return (
    <View style={{ width, marginLeft: 'auto' }}>
      <FieldPlace path={path}>
        <NumberField label={label} labelHidden messageHidden {...found} value={value} maxLength={20} onChangeText={onChange} whole align="right" strong={strong} />
      </FieldPlace>
    </View>
  );
}

function Density({ row }: { row: AliquotRow }) {
  const nuclei = parseNumber(row.entry.nuclei).value;
  const text = nuclei === null || row.volumeMl === null ? null : formatQuantity({ value: nuclei / row.volumeMl, error: null, unit: '', kind: 'count' })?.text;
  return (
    <Text size="table" tone={row.entry.excluded === null ? 'ink' : 'inkSoft'} style={row.entry.excluded === null ? undefined : { textDecorationLine: 'line-through' }}>
      {text ?? '–'}
    </Text>
  );
}

function Exclusion({ row, onChange, shown }: { row: AliquotRow; onChange: (reason: Reason | null) => void; shown?: boolean }) {
  return <Select label={`Aliquot ${row.index + 1} left out`} labelHidden={!shown} value={row.entry.excluded ?? 'no'} options={excludedOptions} onChange={(value) => onChange(value === 'no' ? null : value)} />;
}

/** On a phone there is no room in the row: one choice of the aliquot to leave out, then its reason below the table. */
function ExclusionsOnPhone({ rows, onChange }: { rows: readonly AliquotRow[]; onChange: (index: number, reason: Reason | null) => void }) {
  const left = rows.filter((row) => row.entry.excluded !== null);
  const rest = rows.filter((row) => row.entry.excluded === null && row.entry.nuclei.trim() !== '');
  return (
    <>
      {left.map((row) => (
        <Exclusion key={row.index} row={row} shown onChange={(reason) => onChange(row.index, reason)} />
      ))}
      {rest.length > 1 ? (
        <Select label="Leave an aliquot out" value="" placeholder="none" options={rest.map((row) => ({ value: String(row.index), label: `aliquot ${row.index + 1}` }))} onChange={(index) => onChange(Number(index), 'bubble')} />
      ) : null}
    </>
  );
}
