import type { Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { SetAsideView } from '../../shared/contracts/versions';
import { dayText } from '../layout/timeText';
import { useLiftSetAside, useSetAsides } from '../queries/curate';
import { errorInWords } from '../queries/errorInWords';
import { useTheme } from '../theme/ThemeProvider';
import { Button } from '../ui/Button';
import { ConfirmDialog } from '../ui/Dialog';
import { QueryView } from '../ui/QueryView';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { TextField } from '../ui/TextField';
import { TextLink } from '../ui/TextLink';

const axis = ({ variable, structure }: { variable: string; structure: string | null }): string => {
  const names: Record<string, string> = { structureMassG: 'mass', bodyMassG: 'body mass', neurons: 'neurons', cells: 'cells', otherCells: 'other cells' };
  return `${names[variable] ?? variable}${structure ? ` of ${structure.replaceAll('_', ' ')}` : ''}`;
};

const scopeWords = ({ scope }: Pick<SetAsideView, 'scope'>): string => (scope === 'all' ? 'every fit' : `fits of ${axis(scope.a)} and ${axis(scope.b)}`);

/** Records left out of fits, each with its reason; lifting is an act of its own and stays in the trail. */
export function SetAsideList() {
  const list = useSetAsides();
  const lift = useLiftSetAside();
  const { colour } = useTheme();
  const [lifting, setLifting] = useState<SetAsideView | null>(null);
  const [reason, setReason] = useState('');
  const close = () => (setLifting(null), setReason(''));
  return (
    <Section title="Set aside">
      <QueryView
        pending={list.isPending}
        error={list.error ? errorInWords(list.error) : null}
        data={list.data?.items.filter((item) => item.liftedAt === null)}
        isEmpty={(items) => items.length === 0}
        empty={{ title: 'No record is set aside.', text: 'It is done on a record’s page, with scope and reason.' }}
        onRetry={() => void list.refetch()}
      >
        {(items) => (
          <View role="list">
            {items.map((item) => (
              <View key={item.id} role="listitem" style={{ paddingVertical: 10, gap: 2, borderBottomWidth: 1, borderBottomColor: colour.hairline }}>
                <TextLink href={`/records/${item.record}` as Href}>{`${item.record}, ${item.species}, ${item.structure.replaceAll('_', ' ')}`}</TextLink>
                <Text size="table">{item.reason}</Text>
                <Text size="secondary" tone="inkSoft">{`from ${scopeWords(item)}, by ${item.by}, ${dayText(item.at)}`}</Text>
                <Button kind="quiet" label="Lift" spokenLabel={`Lift the set-aside of ${item.record}`} onPress={() => setLifting(item)} style={{ alignSelf: 'flex-start', marginLeft: -8 }} />
              </View>
            ))}
          </View>
        )}
      </QueryView>
      <ConfirmDialog
        open={lifting !== null}
        kind="primary"
        question={`Lift the set-aside of ${lifting?.record ?? ''}?`}
        consequence="From the next version on the record counts in these fits again."
        confirmLabel="Lift the set-aside"
        cancelLabel="Leave it"
        working={lift.isPending}
        onConfirm={() => lifting && reason.trim() !== '' && lift.mutate({ id: lifting.id, reason }, { onSuccess: close })}
        onCancel={close}
      >
        <TextField label="Reason" value={reason} onChangeText={setReason} required rows={2} error={lift.error ? errorInWords(lift.error).text : undefined} hint="Needed; it stays in the record’s trail." />
      </ConfirmDialog>
    </Section>
  );
}
