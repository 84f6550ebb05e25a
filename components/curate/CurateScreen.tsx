import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { Waits } from '../../shared/contracts/versions';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { dayText } from '../layout/timeText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { StateSign } from '../marks/StateSign';
import { useWaits } from '../queries/curate';
import { errorInWords } from '../queries/errorInWords';
import { FlagList } from '../species/FlagList';
import { SpeciesCell } from '../species/SpeciesCell';
import { Button } from '../ui/Button';
import { QueryView } from '../ui/QueryView';
import { Section } from '../ui/Section';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';
import { CurateLinks } from './CurateLinks';
import { SetAsideList } from './SetAsideList';

/** What waits for a curator: records for the next version, re-checks, flags, set-asides, proposed taxa. */
export function CurateScreen() {
  return (
    <RoleGate title="Curate" roles={['curator']}>
      <Curate />
    </RoleGate>
  );
}

function Curate() {
  const waits = useWaits();
  return (
    <Screen title="Curate" sub="The working set: approved, in no version yet, and what it raises." actions={<CurateLinks current="waits" />}>
      <QueryView pending={waits.isPending} error={waits.error ? errorInWords(waits.error) : null} data={waits.data} onRetry={() => void waits.refetch()}>
        {(data) => <WaitsView data={data} />}
      </QueryView>
    </Screen>
  );
}

type ToFreeze = Waits['toFreeze'][number];

const columns: TableColumn<ToFreeze>[] = [
  { key: 'number', head: 'record', nowrap: true, cell: (row) => <Text size="table">{row.number}</Text> },
  {
    key: 'species',
    head: 'species',
    cell: (row) => <SpeciesCell species={row.species} demonstration={row.demonstration} />,
  },
  { key: 'structure', head: 'structure', cell: (row) => <Text size="table">{row.structure.replaceAll('_', ' ')}</Text> },
  { key: 'at', head: 'approved', align: 'end', nowrap: true, cell: (row) => <Text size="table" tone="inkSoft">{dayText(row.approvedAt)}</Text> },
];

function WaitsView({ data }: { data: Waits }) {
  const { sideBySide } = useBreakpoint();
  const left = (
    <Section title="Approved, in no version yet" bare={data.toFreeze.length > 0} end={<Button kind="quiet" label="Look at the next version" href={'/curate/freeze' as Href} />}>
      {data.toFreeze.length === 0 ? (
        <Text size="table" tone="inkSoft" style={{ paddingTop: 10 }}>
          Nothing: the current version holds every approved record.
        </Text>
      ) : (
        <Table caption="Approved records in no version yet" rows={data.toFreeze} columns={columns} rowKey={(row) => row.number} rowHref={(row) => `/records/${row.number}` as Href} />
      )}
    </Section>
  );
  const right = (
    <>
      <Section title="Re-checks" end={<TextLink href={'/rechecks' as Href} size="secondary">all re-checks</TextLink>}>
        {data.openRechecks.length === 0 ? <Text size="table" tone="inkSoft" style={{ paddingTop: 10 }}>None is open.</Text> : null}
        {data.openRechecks.map((recheck) => (
          <View key={recheck.id} style={{ paddingVertical: 10, gap: 2 }}>
            <StateSign state={recheck.status} words={`re-check ${recheck.status} since ${dayText(recheck.at)}`} />
            <TextLink href={`/rechecks/${recheck.id}` as Href}>{`${recheck.record}, ${recheck.species}, ${recheck.structure.replaceAll('_', ' ')}`}</TextLink>
          </View>
        ))}
      </Section>
      {data.proposedTaxa > 0 ? (
        <Section title="Taxa">
          <View style={{ paddingTop: 10 }}>
            <TextLink href={'/curate/taxa' as Href}>{`${data.proposedTaxa} proposed, to accept or refuse`}</TextLink>
          </View>
        </Section>
      ) : null}
      <SetAsideList />
    </>
  );
  const flags = data.flags.length > 0 ? <FlagList flags={data.flags} title="Flags of the working set" withSpecies /> : <Section title="Flags of the working set"><Text size="table" tone="inkSoft" style={{ paddingTop: 10 }}>None.</Text></Section>;
  if (!sideBySide) {
    return (
      <>
        {left}
        {right}
        {flags}
      </>
    );
  }
  return (
    <View style={{ flexDirection: 'row', gap: 40 }}>
      <View style={{ flex: 1.3, minWidth: 0, gap: 28 }}>
        {left}
        {flags}
      </View>
      <View style={{ flex: 1, minWidth: 0, gap: 28 }}>{right}</View>
    </View>
  );
}
