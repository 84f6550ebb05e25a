import type { Href } from 'expo-router';
import { View } from 'react-native';
import type { VersionChanges } from '../../shared/contracts/versions';
import { Disclosure } from '../ui/Disclosure';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

interface Line {
  number: string;
  text: string;
}

const FIRST = 100;

function Lines({ lines }: { lines: readonly Line[] }) {
  return (
    <View role="list">
      {lines.slice(0, FIRST).map((line) => (
        <View key={line.number} role="listitem" style={{ paddingVertical: 4 }}>
          <Text size="secondary">
            <TextLink href={`/records/${line.number}` as Href} size="secondary">
              {line.number}
            </TextLink>
            {` ${line.text}`}
          </Text>
        </View>
      ))}
      {lines.length > FIRST ? <Text size="secondary" tone="inkSoft">{`and ${lines.length - FIRST} more, in CHANGES.md`}</Text> : null}
    </View>
  );
}

const of = (row: { species: string; structure: string }): string => `${row.species}, ${row.structure.replaceAll('_', ' ')}`;

/** What came, changed and went since the version before, record by record. */
export function WhatChanged({ changes, label }: { changes: VersionChanges; label?: string }) {
  const groups: readonly { words: string; lines: Line[] }[] = [
    { words: 'records came', lines: changes.came.map((row) => ({ number: row.number, text: of(row) })) },
    { words: 'revised', lines: changes.revised.map((row) => ({ number: row.number, text: `${of(row)}: revision ${row.from} → ${row.to}` })) },
    { words: 'set aside', lines: changes.setAside.map((row) => ({ number: row.number, text: `${of(row)}: ${row.reason}` })) },
    { words: 'went', lines: changes.went.map((row) => ({ number: row.number, text: `${of(row)}: ${row.reason}` })) },
  ];
  return (
    <Section title={label === undefined ? 'What will change' : 'What changed'} end={<Text size="secondary" tone="inkSoft">{changes.previous === null ? 'the first version' : `since version ${changes.previous}`}</Text>}>
      {groups.map(({ words, lines }) =>
        lines.length === 0 ? (
          <Text key={words} size="table" tone="inkSoft" style={{ paddingVertical: 8 }}>{`0 ${words}`}</Text>
        ) : (
          <Disclosure key={words} label={`${lines.length} ${words}`} note={words === 'records came' && changes.speciesCame > 0 ? `${changes.speciesCame} species new` : undefined}>
            <Lines lines={lines} />
          </Disclosure>
        ),
      )}
    </Section>
  );
}
