import { router, type Href } from 'expo-router';
import { useEffect, useState } from 'react';
import { View } from 'react-native';
import type { SpeciesPage } from '../../shared/contracts/register';
import { isGenusLevel } from '../../shared/domain/identifiers';
import { Screen } from '../layout/Screen';
import { useBreakpoint } from '../layout/useBreakpoint';
import { CladeMark } from '../marks/CladeMark';
import { MassNeuronShares } from '../marks/MassNeuronShares';
import { CiteSheet } from '../versions/CiteSheet';
import { errorInWords } from '../queries/errorInWords';
import { useSpeciesPage } from '../queries/register';
import { Button } from '../ui/Button';
import { QueryView } from '../ui/QueryView';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Text } from '../ui/Text';
import { BackLink, TextLink } from '../ui/TextLink';
import { FlagList } from './FlagList';
import { StructureOfSpecies } from './StructureOfSpecies';
import { sharesOf } from './sharesOf';

/** A species: its place on the lines first, then what was measured, by whom, and where it stands in print. */
export function SpeciesScreen({ slug, version }: { slug: string; version: string | null }) {
  const species = useSpeciesPage(slug, version);
  const page = species.data;
  // A synonym's address leads on to the name in use.
  useEffect(() => {
    if (page && page.slug !== slug) router.replace(`/species/${page.slug}${version ? `?version=${version}` : ''}` as Href);
  }, [page, slug, version]);
  if (page) return <SpeciesView page={page} />;
  return (
    <Screen title="Species" back={<BackLink href={'/species' as Href} label="Species" />}>
      <QueryView pending={species.isPending} error={species.error ? errorInWords(species.error) : null} data={page} onRetry={() => void species.refetch()}>
        {() => null}
      </QueryView>
    </Screen>
  );
}

function SpeciesView({ page }: { page: SpeciesPage }) {
  const { sideBySide, wide } = useBreakpoint();
  const [citing, setCiting] = useState(false);
  const shares = sharesOf(page);
  const records = page.structures.flatMap((structure) => structure.records);
  const animals = records.reduce((sum, record) => sum + (record.kind === 'specimen' ? 1 : 0), 0);
  const sub = (
    <Row gap={8} wrap>
      <CladeMark clade={page.clade} />
      <Text size="table" tone="inkSoft">
        {[page.cladeName, `${records.length} records`, animals > 0 ? `${animals} of single specimens` : null, `version ${page.version}`, page.commonNames[0]].filter(Boolean).join(' · ')}
      </Text>
    </Row>
  );
  const main = (
    <>
      {shares.length > 1 ? <MassNeuronShares parts={shares} /> : null}
      {page.structures.map((structure) => (
        <StructureOfSpecies key={structure.key} structure={structure} clade={page.clade} />
      ))}
      {page.flags.length > 0 ? <FlagList flags={page.flags} /> : null}
    </>
  );
  const aside = (
    <>
      <Section title="Classification" look="small">
        <Row wrap gap={6} style={{ paddingTop: 8 }}>
          {page.lineage.map((node, index) => (
            <Text key={node.slug} size="table">
              {index > 0 ? '› ' : ''}
              <TextLink href={`/species?clade=${node.slug}` as Href}>{node.name}</TextLink>
            </Text>
          ))}
        </Row>
        {page.synonyms.length > 0 ? <Text size="secondary" tone="inkSoft">{`also entered as ${page.synonyms.join(', ')}`}</Text> : null}
        {isGenusLevel(page.species) ? <Text size="secondary">This name is kept at genus level: it enters fits with a mark.</Text> : page.named ? null : <Text size="secondary">The species is not named: it enters no fit.</Text>}
      </Section>
      <Section title="Sources" look="small">
        {page.sources.map((source) => (
          <View key={source.key} style={{ paddingVertical: 8 }}>
            <Text science size="secondary">
              {source.citation}
            </Text>
            {source.doi ? (
              <TextLink href={`https://doi.org/${source.doi}` as '/'} outside size="secondary">
                {source.doi}
              </TextLink>
            ) : null}
          </View>
        ))}
      </Section>
    </>
  );
  return (
    <Screen
      title={page.species}
      headingLook="species"
      sub={sub}
      back={<BackLink href={'/species' as Href} label="Species" />}
      actions={<Button kind={wide ? 'primary' : 'secondary'} label="Cite" spokenLabel={`Cite the records of ${page.species}`} onPress={() => setCiting(true)} />}
      demonstration={page.demonstration}
    >
      {page.from ? <Text size="secondary" tone="inkSoft">{`You came by the name ${page.from.replaceAll('-', ' ')}.`}</Text> : null}
      {sideBySide ? (
        <View style={{ flexDirection: 'row', gap: 40 }}>
          <View style={{ flex: 1, minWidth: 0, gap: 28 }}>{main}</View>
          <View style={{ width: 340, gap: 28 }}>{aside}</View>
        </View>
      ) : (
        <>
          {main}
          {aside}
        </>
      )}
      {citing ? <CiteSheet label={page.version} records={records.map((record) => record.number)} title={`Cite the records of ${page.species}`} onClose={() => setCiting(false)} /> : null}
    </Screen>
  );
}
