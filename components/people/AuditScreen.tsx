import type { AuditEntry } from '../../shared/contracts/people';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { errorInWords } from '../queries/errorInWords';
import { useAudit } from '../queries/people';
import { QueryView } from '../ui/QueryView';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';
import { AdministrationLinks } from './AdministrationLinks';
import { timeText } from '../layout/timeText';

const columns: TableColumn<AuditEntry>[] = [
  { key: 'at', head: 'when', nowrap: true, cell: (entry) => <Text size="table">{timeText(entry.at)}</Text> },
  { key: 'actor', head: 'who', cell: (entry) => <Text size="table" weight="semibold">{entry.actor}</Text> },
  { key: 'action', head: 'act', cell: (entry) => <Text size="table">{entry.action}</Text> },
  { key: 'target', head: 'on', cell: (entry) => <Text size="table">{`${entry.targetType} ${entry.targetId}`}</Text> },
  { key: 'detail', head: 'detail', cell: (entry) => <Text size="secondary" tone="inkSoft">{Object.entries(entry.detail).map(([key, value]) => `${key}: ${typeof value === 'string' ? value : JSON.stringify(value)}`).join('; ')}</Text> },
];

/** Acts of people with power over others' data, newest first. */
export function AuditScreen() {
  return (
    <RoleGate title="Audit" roles={['curator', 'administrator']}>
      <Audit />
    </RoleGate>
  );
}

function Audit() {
  const audit = useAudit();
  return (
    <Screen title="Audit" sub="The newest 200 acts; nothing is ever taken out." actions={<AdministrationLinks current="audit" />}>
      <QueryView
        pending={audit.isPending}
        error={audit.error ? errorInWords(audit.error) : null}
        data={audit.data}
        isEmpty={(page) => page.items.length === 0}
        empty={{ title: 'Nothing yet.', text: 'Decisions, roles, set-asides and freezes are listed here.' }}
        onRetry={() => void audit.refetch()}
      >
        {(page) => <Table caption="Audit log" rows={page.items} columns={columns} rowKey={(entry) => entry.id} dense />}
      </QueryView>
    </Screen>
  );
}
