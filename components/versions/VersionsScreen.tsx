import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { VersionItem } from '../../shared/contracts/versions';
import { Screen } from '../layout/Screen';
import { dayText, timeText } from '../layout/timeText';
import { DemoMark } from '../marks/DemoMark';
import { StateSign } from '../marks/StateSign';
import { shortChecksum, VersionStamp } from '../marks/VersionStamp';
import { errorInWords } from '../queries/errorInWords';
import { useVersions } from '../queries/versions';
import { QueryView } from '../ui/QueryView';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';

const columns: TableColumn<VersionItem>[] = [
  {
    key: 'label',
    head: 'version',
    cell: (item) => (
      <View>
        <Text science weight="semibold">
          {`Version ${item.label}`}
        </Text>
        {item.demonstration ? <DemoMark words="holds demonstration data" /> : null}
      </View>
    ),
  },
  { key: 'frozen', head: 'frozen', nowrap: true, cell: (item) => <Text size="table">{dayText(item.frozenAt)}</Text> },
  { key: 'records', head: 'records', align: 'end', cell: (item) => <Text size="table">{String(item.records)}</Text> },
  { key: 'species', head: 'species', align: 'end', cell: (item) => <Text size="table">{String(item.species)}</Text> },
  { key: 'doi', head: 'DOI', cell: (item) => <Text size="table" tone={item.doi ? 'ink' : 'inkSoft'}>{item.doi ?? 'not minted'}</Text> },
  { key: 'sha', head: 'SHA-256', nowrap: true, cell: (item) => <Text size="table" tone="inkSoft">{shortChecksum(item.sha256)}</Text> },
  { key: 'current', head: 'state', cell: (item) => (item.current ? <StateSign state="frozen" words="current" /> : <Text size="table" tone="inkSoft">frozen</Text>) },
];

/** Every frozen version, newest first. */
export function VersionsScreen() {
  const versions = useVersions();
  return (
    <Screen title="Versions" sub="What was frozen never changes: cite a version, and its exponents stay.">
      <QueryView
        pending={versions.isPending}
        error={versions.error ? errorInWords(versions.error) : null}
        data={versions.data}
        isEmpty={(list) => list.items.length === 0 && list.preparing === null}
        empty={{ title: 'No version is frozen yet.', text: 'A curator freezes the approved records; until then nothing is published.' }}
        onRetry={() => void versions.refetch()}
      >
        {(list) => (
          <View style={{ gap: 24 }}>
            {list.preparing ? <Text role="status">{`Version ${list.preparing.label} is being frozen by ${list.preparing.by} since ${timeText(list.preparing.since)}.`}</Text> : null}
            {list.items[0] ? (
              <View style={{ maxWidth: 560 }}>
                <VersionStamp label={list.items[0].label} sha256={list.items[0].sha256} doi={list.items[0].doi} frozen={dayText(list.items[0].frozenAt)} demo={list.items[0].demonstration} />
              </View>
            ) : null}
            <Table caption="Versions" rows={list.items} columns={columns} rowKey={(item) => item.label} rowHref={(item) => `/versions/${item.label}` as Href} />
          </View>
        )}
      </QueryView>
    </Screen>
  );
}
