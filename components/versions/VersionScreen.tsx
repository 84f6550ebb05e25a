import type { Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type { VersionPage } from '../../shared/contracts/versions';
import { Screen } from '../layout/Screen';
import { timeText } from '../layout/timeText';
import { useBreakpoint } from '../layout/useBreakpoint';
import { DemoMark } from '../marks/DemoMark';
import { VersionStamp } from '../marks/VersionStamp';
import { errorInWords } from '../queries/errorInWords';
import { useVersionPage } from '../queries/versions';
import { useTheme } from '../theme/ThemeProvider';
import { radius } from '../theme/tokens';
import { QueryView } from '../ui/QueryView';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { BackLink, TextLink } from '../ui/TextLink';
import { CitationBox } from './CiteSheet';
import { Manifest } from './Manifest';
import { VersionExponents } from './VersionExponents';
import { VersionFiles } from './VersionFiles';
import { WhatChanged } from './WhatChanged';

/** A version's page: the slide, checksums, exponents, citation, files, what changed. */
export function VersionScreen({ label }: { label: string }) {
  const version = useVersionPage(label);
  if (version.data) return <VersionView page={version.data} />;
  return (
    <Screen title={`Version ${label}`} back={<BackLink href={'/versions' as Href} label="Versions" />}>
      <QueryView pending={version.isPending} error={version.error ? errorInWords(version.error) : null} data={version.data} onRetry={() => void version.refetch()}>
        {() => null}
      </QueryView>
    </Screen>
  );
}

function VersionView({ page }: { page: VersionPage }) {
  const { sideBySide, wide } = useBreakpoint();
  const { colour } = useTheme();
  const [style, setStyle] = useState<'text' | 'bibtex'>('text');
  const { counts } = page;
  const holds = `${counts.records} of ${counts.species} species${counts.specimens > 0 ? `, ${counts.specimens} specimens` : ''}`;
  const main = (
    <>
      <VersionStamp
        label={page.label}
        sha256={page.sha256}
        doi={page.doi}
        frozen={timeText(page.frozenAt)}
        demo={page.demonstration}
        tall={wide}
        facts={[
          { label: 'DOI', value: page.doi ?? 'not minted' },
          { label: 'frozen', value: timeText(page.frozenAt) },
          { label: 'licence', value: page.licence },
          { label: 'records', value: holds },
        ]}
      />
      <Manifest label={page.label} sha256={page.sha256} />
      <VersionExponents fits={page.standingFits} label={page.label} previous={page.previous} />
      {page.setAside.length > 0 ? (
        <Section title="Set aside in this version" look="small">
          {page.setAside.map((aside) => (
            <Text key={aside.number} size="table" style={{ paddingVertical: 6 }}>
              <TextLink href={`/records/${aside.number}` as Href}>{aside.number}</TextLink>
              {` ${aside.species}, ${aside.structure.replaceAll('_', ' ')}: ${aside.reason}`}
            </Text>
          ))}
        </Section>
      ) : null}
      {page.contributors.length > 0 ? (
        <Text size="secondary">
          <Text size="secondary" weight="semibold">
            Contributors{'  '}
          </Text>
          {page.contributors.map((person) => `${person.name} ${person.records} records`).join(' · ')}
        </Text>
      ) : null}
    </>
  );
  const aside = (
    <>
      <Section title="Cite it" bare style={{ gap: 8 }}>
        <View style={{ padding: 14, backgroundColor: colour.sheet, borderWidth: 1, borderColor: colour.hairline, borderRadius: radius.control }}>
          <CitationBox label={page.label} records={[]} style={style} onStyle={setStyle} />
        </View>
        <Text size="secondary" tone="inkSoft">
          For some records only, cite them from their species or their fit: the primary sources come with it.
        </Text>
      </Section>
      <VersionFiles page={page} />
      <WhatChanged changes={page.changes} label={page.label} />
    </>
  );
  return (
    <Screen
      title={page.title}
      back={<BackLink href={'/versions' as Href} label="Versions" />}
      sub={page.current ? 'current' : 'superseded by a later version; it stays as it is'}
      actions={
        <View role="navigation" aria-label="Versions" style={{ flexDirection: 'row', flexWrap: 'wrap', gap: 4 }}>
          {page.labels.slice(-6).map((other) => (
            <View key={other} style={{ minWidth: 44, minHeight: 44, alignItems: 'center', justifyContent: 'center', backgroundColor: other === page.label ? colour.frost : 'transparent', borderRadius: radius.control }}>
              {other === page.label ? <Text weight="semibold">{other}</Text> : <TextLink href={`/versions/${other}` as Href} spokenLabel={`Version ${other}`}>{other}</TextLink>}
            </View>
          ))}
        </View>
      }
      demonstration={page.demonstration}
    >
      {page.demonstration ? <DemoMark words="This version holds demonstration data: invented animals and counts." /> : null}
      {page.note ? <Text>{page.note}</Text> : null}
      {sideBySide ? (
        <View style={{ flexDirection: 'row', gap: 40 }}>
          <View style={{ flex: 1, minWidth: 0, gap: 28 }}>{main}</View>
          <View style={{ width: 400, gap: 28 }}>{aside}</View>
        </View>
      ) : (
        <>
          {main}
          {aside}
        </>
      )}
    </Screen>
  );
}
