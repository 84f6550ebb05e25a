import type { Href } from 'expo-router';
import { View } from 'react-native';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { useAccount } from '../queries/account';
import { useTheme } from '../theme/ThemeProvider';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

const sections = [
  { role: 'contributor', label: 'Submissions', href: '/submissions', words: 'what your laboratory entered, and what is asked of it', waiting: 'submissions' },
  { role: 'reviewer', label: 'Review', href: '/review', words: 'submissions of other laboratories', waiting: 'review' },
  { role: 'curator', label: 'Curate', href: '/curate', words: 'the working set, set-asides, taxa and the next version', waiting: 'curate' },
  { role: 'administrator', label: 'People', href: '/people', words: 'people, laboratories, roles', waiting: null },
] as const;

/** For who holds several roles: the places of each. */
export function DeskScreen() {
  return (
    <RoleGate title="Desk" roles={sections.map((section) => section.role)}>
      <Desk />
    </RoleGate>
  );
}

function Desk() {
  const { roles, waiting } = useAccount();
  const { colour } = useTheme();
  return (
    <Screen title="Desk" sub="Your roles, side by side.">
      <View role="list" style={{ maxWidth: 640 }}>
        {sections
          .filter((section) => roles.includes(section.role))
          .map((section) => {
            const count = section.waiting === null ? 0 : (waiting[section.waiting] ?? 0);
            return (
              <View key={section.role} role="listitem" style={{ position: 'relative', paddingVertical: 14, borderBottomWidth: 1, borderBottomColor: colour.hairline }}>
                <TextLink href={section.href as Href} coversRow spokenLabel={count > 0 ? `${section.label}, ${count} waiting` : section.label}>
                  {section.label}
                </TextLink>
                <Text size="table" tone="inkSoft">{`${section.words}${count > 0 ? `; ${count} waiting` : ''}`}</Text>
              </View>
            );
          })}
        <View role="listitem" style={{ position: 'relative', paddingVertical: 14 }}>
          <TextLink href={'/rechecks' as Href} coversRow>
            Re-checks
          </TextLink>
          <Text size="table" tone="inkSoft">questions put to laboratories, and their answers</Text>
        </View>
      </View>
    </Screen>
  );
}
