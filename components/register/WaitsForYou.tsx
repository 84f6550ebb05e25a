import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { WaitingItem } from '../../shared/contracts/account';
import { ageText } from '../layout/timeText';
import { BinomialSpan } from '../marks/Binomial';
import { DemoMark } from '../marks/DemoMark';
import { StateSign } from '../marks/StateSign';
import { useAccount } from '../queries/account';
import { useTheme } from '../theme/ThemeProvider';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

const states: Record<WaitingItem['kind'], { state: string; words: string }> = {
  'changes-requested': { state: 'changes requested', words: 'changes requested' },
  'recheck-open': { state: 're-check open', words: 're-check open' },
  'recheck-answered': { state: 'answered', words: 're-check answered' },
  draft: { state: 'draft', words: 'draft' },
  'to-review': { state: 'to review', words: 'to review' },
  'to-freeze': { state: 'approved', words: 'approved, in no version yet' },
  flag: { state: 'flagged', words: 'flagged' },
};

/** Titles begin with the species, which stands in italic before them. */
function withoutSpecies({ title, species }: WaitingItem): string {
  return species !== '' && title.startsWith(species) ? title.slice(species.length).replace(/^[,\s]+/, '') : title;
}

/** What waits for the person who looks, each with the way to it. */
export function WaitsForYou({ items }: { items: readonly WaitingItem[] }) {
  const { colour } = useTheme();
  const { status } = useAccount();
  if (status !== 'in') return null;
  return (
    <Section title="Waits for you">
      {items.length === 0 ? (
        <Text size="table" tone="inkSoft" style={{ paddingTop: 10 }}>
          Nothing waits.
        </Text>
      ) : null}
      <View role="list">
        {items.map((item) => (
          <View key={`${item.kind}${item.href}`} role="listitem" style={{ position: 'relative', paddingVertical: 10, gap: 2, borderBottomWidth: 1, borderBottomColor: colour.hairline }}>
            <Row justify="space-between">
              <StateSign state={states[item.kind].state} words={states[item.kind].words} />
              <Text size="secondary" tone="inkSoft">
                {ageText(item.since)}
              </Text>
            </Row>
            <TextLink href={item.href as Href} look="plain" coversRow spokenLabel={`${states[item.kind].words}: ${item.species} ${item.title}`}>
              <Text>
                {item.species ? <BinomialSpan name={item.species} /> : null}
                {item.species ? ' ' : ''}
                {withoutSpecies(item)}
              </Text>
            </TextLink>
            {item.detail ? (
              <Text size="secondary" tone="inkSoft" lines={2}>
                {item.detail}
              </Text>
            ) : null}
            {item.demonstration ? <DemoMark /> : null}
          </View>
        ))}
      </View>
    </Section>
  );
}
