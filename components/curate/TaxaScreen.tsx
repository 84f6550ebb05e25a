import { useState } from 'react';
import { View } from 'react-native';
import type { Taxon } from '../../shared/contracts/register';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { BinomialSpan } from '../marks/Binomial';
import { DemoMark } from '../marks/DemoMark';
import { errorInWords } from '../queries/errorInWords';
import { useDecideTaxon, useTaxa } from '../queries/taxa';
import { Button } from '../ui/Button';
import { ConfirmDialog } from '../ui/Dialog';
import { QueryView } from '../ui/QueryView';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';
import { SearchField, TextField } from '../ui/TextField';
import { CurateLinks } from './CurateLinks';
import { NewTaxon } from './NewTaxon';

const nameCell = (taxon: Taxon) => (
  <View>
    <Text>{taxon.rank === 'species' || taxon.rank === 'genus' ? <BinomialSpan name={taxon.name} /> : taxon.name}</Text>
    {taxon.commonNames.length + taxon.synonyms.length > 0 ? <Text size="secondary" tone="inkSoft">{[...taxon.commonNames, ...taxon.synonyms.map((name) => `was ${name}`)].join(', ')}</Text> : null}
    {taxon.demonstration ? <DemoMark words="invented taxon" /> : null}
  </View>
);

const columns: TableColumn<Taxon>[] = [
  { key: 'name', head: 'name', cell: nameCell },
  { key: 'rank', head: 'rank', cell: (taxon) => <Text size="table">{taxon.rank}</Text> },
  { key: 'path', head: 'lies in', cell: (taxon) => <Text size="secondary" tone="inkSoft">{taxon.path.split(' > ').slice(0, -1).join(' › ')}</Text> },
  { key: 'species', head: 'species below', align: 'end', cell: (taxon) => <Text size="table">{String(taxon.species)}</Text> },
  { key: 'authority', head: 'after', cell: (taxon) => <Text size="secondary" tone="inkSoft">{taxon.authority || '–'}</Text> },
];

/** The classification: proposals to decide, taxa to find, and a new one. */
export function TaxaScreen() {
  return (
    <RoleGate title="Taxa" roles={['curator']}>
      <Taxa />
    </RoleGate>
  );
}

function Taxa() {
  const [text, setText] = useState('');
  const found = useTaxa({ query: text, status: 'accepted' });
  return (
    <Screen title="Taxa" sub="A clade is any node of the classification; its address never changes." actions={<CurateLinks current="taxa" />}>
      <Proposals />
      <Section title="Accepted taxa" bare style={{ gap: 12 }}>
        <SearchField label="Find a taxon" placeholder="name, synonym or common name" value={text} onChangeText={setText} />
        <QueryView pending={found.isPending} error={found.error ? errorInWords(found.error) : null} data={found.data} isEmpty={(page) => page.items.length === 0} empty={{ title: 'No taxon of this name.', text: 'Add it below.' }} onRetry={() => void found.refetch()}>
          {(page) => <Table caption="Accepted taxa" rows={page.items} columns={columns} rowKey={(taxon) => taxon.id} dense />}
        </QueryView>
      </Section>
      <NewTaxon />
    </Screen>
  );
}

function Proposals() {
  const proposals = useTaxa({ status: 'proposed' });
  const decide = useDecideTaxon();
  const [refusing, setRefusing] = useState<Taxon | null>(null);
  const [reason, setReason] = useState('');
  const close = () => (setRefusing(null), setReason(''));
  const acts: TableColumn<Taxon> = {
    key: 'act',
    head: 'decide',
    align: 'end',
    cell: (taxon) => (
      <Row gap={8} justify="flex-end">
        <Button label="Accept" spokenLabel={`Accept ${taxon.name}`} working={decide.isPending} onPress={() => decide.mutate({ id: taxon.id, decision: 'accept', reason: '' })} />
        <Button kind="danger" label="Refuse" spokenLabel={`Refuse ${taxon.name}`} onPress={() => setRefusing(taxon)} />
      </Row>
    ),
  };
  return (
    <Section title="Proposed" bare style={{ gap: 8 }}>
      <QueryView pending={proposals.isPending} error={proposals.error ? errorInWords(proposals.error) : null} data={proposals.data} isEmpty={(page) => page.items.length === 0} empty={{ title: 'No proposal waits.' }} onRetry={() => void proposals.refetch()}>
        {(page) => <Table caption="Proposed taxa" rows={page.items} columns={[...columns.slice(0, 3), acts]} rowKey={(taxon) => taxon.id} />}
      </QueryView>
      {decide.error ? (
        <Text role="alert" tone="flagged">
          {errorInWords(decide.error).text}
        </Text>
      ) : null}
      <ConfirmDialog open={refusing !== null} question={`Refuse ${refusing?.name ?? ''}?`} consequence="The proposer is told your reason; submissions under this name cannot be sent." confirmLabel="Refuse it" cancelLabel="Keep it waiting" working={decide.isPending} onConfirm={() => refusing && decide.mutate({ id: refusing.id, decision: 'refuse', reason }, { onSuccess: close })} onCancel={close}>
        <TextField label="Reason" value={reason} onChangeText={setReason} rows={2} />
      </ConfirmDialog>
    </Section>
  );
}
