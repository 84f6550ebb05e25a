import { router, useLocalSearchParams, type Href } from 'expo-router';
import { View } from 'react-native';
import { revisionStatuses, type RevisionStatus } from '../../shared/contracts/vocabulary';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { useBreakpoint } from '../layout/useBreakpoint';
import { errorInWords } from '../queries/errorInWords';
import { useSubmissions } from '../queries/submissions';
import { Button } from '../ui/Button';
import { EmptyState } from '../ui/Message';
import { QueryView } from '../ui/QueryView';
import { Select } from '../ui/Select';
import { Skeleton } from '../ui/Skeleton';
import { Text } from '../ui/Text';
import { SubmissionsList } from './SubmissionsList';

const newHref = '/submissions/new' as Href;

/** A contributor's own submissions and those of their laboratory, by state. */
export function SubmissionsScreen() {
  return (
    <RoleGate title="Submissions" roles={['contributor']}>
      <Submissions />
    </RoleGate>
  );
}

function Submissions() {
  const { wide } = useBreakpoint();
  const params = useLocalSearchParams<{ state?: string }>();
  const state = revisionStatuses.find((status) => status === params.state) ?? null;
  const submissions = useSubmissions();
  const count = (status: RevisionStatus) => submissions.data?.items.filter((item) => item.status === status).length ?? 0;
  const options = [
    { value: 'all' as const, label: `all states, ${submissions.data?.items.length ?? 0}` },
    ...revisionStatuses.map((status) => ({ value: status, label: `${status.replaceAll('-', ' ')}, ${count(status)}` })),
  ];
  return (
    <Screen title="Submissions" sub="Your specimens and literature values, and those of your laboratory; what changed last comes first." actions={<Button kind="primary" label="New submission" href={newHref} />}>
      <QueryView
        pending={submissions.isPending}
        error={submissions.error ? errorInWords(submissions.error) : null}
        data={submissions.data}
        isEmpty={(page) => page.items.length === 0}
        empty={{ title: 'No submissions yet.', text: 'Enter a specimen with its counts, or the values of a publication.', action: { label: 'New submission', href: newHref } }}
        skeleton={<Skeleton rows={6} rowHeight={wide ? 40 : 96} />}
        onRetry={() => void submissions.refetch()}
      >
        {(page) => {
          const shown = state === null ? page.items : page.items.filter((item) => item.status === state);
          return (
            <View style={{ gap: 16 }}>
              <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 16, alignItems: 'flex-end', justifyContent: 'space-between' }}>
                <View style={{ width: wide ? 280 : '100%' }}>
                  <Select label="State" value={state ?? 'all'} options={options} onChange={(value) => router.setParams({ state: value === 'all' ? '' : value })} />
                </View>
                <Button kind="quiet" label="Re-checks" href={'/rechecks' as Href} />
              </View>
              {shown.length > 0 ? <SubmissionsList items={shown} /> : <EmptyState title={`None is ${(state ?? '').replaceAll('-', ' ')}.`} text="Choose another state." action={{ label: 'Show all states', onPress: () => router.setParams({ state: '' }) }} />}
              {page.nextCursor ? <Text size="secondary" tone="inkSoft">The 200 that changed last are shown.</Text> : null}
            </View>
          );
        }}
      </QueryView>
    </Screen>
  );
}
