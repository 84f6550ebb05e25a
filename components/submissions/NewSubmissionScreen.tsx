import { router, type Href } from 'expo-router';
import { View } from 'react-native';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { useBreakpoint } from '../layout/useBreakpoint';
import { errorInWords } from '../queries/errorInWords';
import { useCreateSubmission } from '../queries/submissions';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { BackLink } from '../ui/TextLink';

const kinds = [
  { kind: 'specimen', title: 'A specimen', label: 'Enter a specimen', text: 'One animal with the structures that were dissected and weighed, and the raw counts of each sample; the register computes cells and neurons with their errors as you type.' },
  { kind: 'literature', title: 'Literature values', label: 'Enter literature values', text: 'The values that one publication prints, species by species, each with its kind of centre, its spread and its number of animals.' },
] as const;

/** Begins a draft: one specimen, or the values of one source. */
export function NewSubmissionScreen() {
  return (
    <RoleGate title="New submission" roles={['contributor']}>
      <ChooseKind />
    </RoleGate>
  );
}

function ChooseKind() {
  const { wide } = useBreakpoint();
  const create = useCreateSubmission();
  const begin = (kind: 'specimen' | 'literature') => create.mutate({ kind }, { onSuccess: (detail) => router.replace(`/submissions/${detail.id}` as Href) });
  return (
    <Screen title="New submission" sub="It begins as a draft that you and your laboratory alone can see. It is reviewed and decided as a whole." back={<BackLink href={'/submissions' as Href} label="Submissions" />}>
      {create.error ? <Notice tone="flagged" {...errorInWords(create.error)} /> : null}
      <View style={{ flexDirection: wide ? 'row' : 'column', gap: wide ? 40 : 24, maxWidth: 960 }}>
        {kinds.map(({ kind, title, label, text }) => (
          <Section key={kind} title={title} style={{ flex: wide ? 1 : undefined, gap: 12 }}>
            <Text>{text}</Text>
            <Button kind={kind === 'specimen' ? 'primary' : 'secondary'} label={label} working={create.isPending && create.variables.kind === kind} disabled={create.isPending && create.variables.kind !== kind} onPress={() => begin(kind)} style={{ alignSelf: wide ? 'flex-start' : 'stretch' }} />
          </Section>
        ))}
      </View>
    </Screen>
  );
}
