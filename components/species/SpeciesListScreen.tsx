import { router, type Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { SpeciesItem } from '../../shared/contracts/register';
import { Screen } from '../layout/Screen';
import { BinomialSpan } from '../marks/Binomial';
import { CladeName } from '../marks/CladeMark';
import { DemoMark } from '../marks/DemoMark';
import { Quantity } from '../marks/Quantity';
import { Sign } from '../ui/Sign';
import { errorInWords } from '../queries/errorInWords';
import { recordsCsvHref, useSpeciesList, useStructures } from '../queries/register';
import { BackLink, TextLink } from '../ui/TextLink';
import { Button } from '../ui/Button';
import { QueryView } from '../ui/QueryView';
import { Row } from '../ui/Row';
import { Select } from '../ui/Select';
import { Table, type TableColumn, type TableSort } from '../ui/Table';
import { Text } from '../ui/Text';
import { SearchField } from '../ui/TextField';

export interface SpeciesListParams {
  query?: string;
  clade?: string;
  structure?: string;
  version?: string;
  sort?: string;
}

const sortKeys: Record<string, string> = { species: 'name', records: 'records', neurons: 'neurons', mass: 'mass' };

const columns: TableColumn<SpeciesItem>[] = [
  {
    key: 'species',
    head: 'species',
    sortable: true,
    cell: (item) => (
      <View>
        <Row gap={8}>
          <Text>
            <BinomialSpan name={item.species} />
          </Text>
          {item.flagged ? <Sign name="ring" tone="flagged" size={14} /> : null}
        </Row>
        {item.commonNames.length > 0 ? (
          <Text size="secondary" tone="inkSoft">
            {item.commonNames.join(', ')}
          </Text>
        ) : null}
        {item.demonstration ? <DemoMark /> : null}
      </View>
    ),
  },
  { key: 'clade', head: 'clade', cell: (item) => <CladeName clade={item.clade} name={item.cladeName} /> },
  { key: 'structures', head: 'structures', cell: (item) => <Text size="secondary" tone="inkSoft">{item.structures.map((key) => key.replaceAll('_', ' ')).join(', ')}</Text> },
  { key: 'records', head: 'records', align: 'end', sortable: true, cell: (item) => <Text size="table">{String(item.records)}</Text> },
  { key: 'neurons', head: 'neurons of the cortex', tone: 'neurons', align: 'end', sortable: true, cell: (item) => <Quantity value={item.cortexNeurons} kind="count" tone="neurons" /> },
  { key: 'mass', head: 'brain mass, g', tone: 'mass', align: 'end', sortable: true, cell: (item) => <Quantity value={item.brainMassG} kind="mass" tone="mass" /> },
];

/** Species of a version; the address holds what is looked for. */
export function SpeciesListScreen({ params }: { params: SpeciesListParams }) {
  const [text, setText] = useState(params.query ?? '');
  const list = useSpeciesList(params);
  const structures = useStructures();
  const items = list.data?.pages.flatMap((page) => page.items);
  const set = (change: SpeciesListParams) => router.setParams({ ...params, ...change } as Record<string, string>);
  const sort = sortOf(params.sort);
  const filtered = Boolean(params.query || params.clade || params.structure);
  return (
    <Screen
      title="Species"
      sub={params.clade ? `Those of the clade ${params.clade}` : 'All species with a record in this version'}
      back={<BackLink href="/" label="Register" />}
      actions={<TextLink href={recordsCsvHref(params) as '/'} outside>Records as CSV</TextLink>}
    >
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 16, alignItems: 'flex-end' }}>
        <View style={{ flexGrow: 1, minWidth: 260, maxWidth: 480 }}>
          <SearchField label="Find a species" placeholder="species, clade or common name" value={text} onChangeText={setText} onSubmit={() => set({ query: text.trim() })} />
        </View>
        <Button label="Find" onPress={() => set({ query: text.trim() })} />
        <View style={{ minWidth: 220 }}>
          <Select
            label="Structure"
            value={params.structure ?? 'any'}
            options={[{ value: 'any', label: 'any structure' }, ...(structures.data ?? []).map((structure) => ({ value: structure.key, label: structure.name }))]}
            onChange={(structure) => set({ structure: structure === 'any' ? '' : structure })}
          />
        </View>
        {filtered ? <Button kind="quiet" label="Show all" onPress={() => (setText(''), set({ query: '', clade: '', structure: '' }))} /> : null}
      </View>
      <QueryView
        pending={list.isPending}
        error={list.error ? errorInWords(list.error) : null}
        data={items}
        isEmpty={(all) => all.length === 0}
        empty={filtered ? { title: 'No species fits.', text: 'Search by another name, or show all.' } : { title: 'No species yet.', text: 'They come with the first frozen version.', action: { label: 'To the register', href: '/' } }}
        onRetry={() => void list.refetch()}
      >
        {(all) => (
          <View style={{ gap: 12 }}>
            <Text size="secondary" tone="inkSoft" role="status">
              {`${all.length}${list.hasNextPage ? ' or more' : ''} species`}
            </Text>
            <Table caption="Species" rows={all} columns={columns} rowKey={(item) => item.slug} rowHref={(item) => `/species/${item.slug}${params.version ? `?version=${params.version}` : ''}` as Href} sort={sort} onSort={(next) => set({ sort: `${next.direction === 'descending' ? '-' : ''}${sortKeys[next.key] ?? 'name'}` })} boxHeight={720} />
            {list.hasNextPage ? <Button label="More species" working={list.isFetchingNextPage} onPress={() => void list.fetchNextPage()} /> : null}
          </View>
        )}
      </QueryView>
    </Screen>
  );
}

function sortOf(text: string | undefined): TableSort {
  const name = (text ?? 'name').replace(/^-/, '');
  const key = Object.keys(sortKeys).find((column) => sortKeys[column] === name) ?? 'species';
  return { key, direction: text?.startsWith('-') ? 'descending' : 'ascending' };
}
