import { useEffect, useState } from 'react';
import { View } from 'react-native';
import type { Taxon } from '../../../shared/contracts/register';
import { nameQualifiers } from '../../../shared/contracts/vocabulary';
import type { SpecimenContent } from '../../../shared/contracts/content';
import { Binomial } from '../../marks/Binomial';
import { DemoMark } from '../../marks/DemoMark';
import { useTaxa, useTaxon } from '../../queries/taxa';
import { useTheme } from '../../theme/ThemeProvider';
import { Button } from '../../ui/Button';
import { Row } from '../../ui/Row';
import { Text } from '../../ui/Text';
import { TextField } from '../../ui/TextField';
import { useFieldChecks } from './DraftContext';
import { DraftChoice, DraftText, FieldGrid, FieldPlace } from './fields';
import { ProposeSpecies } from './ProposeSpecies';
import { optionsOf } from './words';

export type NameEntry = Pick<SpecimenContent['specimen'], 'nameAsEntered' | 'qualifier' | 'taxon'>;

interface SpeciesChoiceProps {
  /** Path of what holds the name: `specimen` or `values.3`. */
  path: string;
  value: NameEntry;
  onChange: (patch: Partial<NameEntry>) => void;
}

/** The species of the register that a name stands for, beside the name as it was entered. */
export function SpeciesChoice({ path, value, onChange }: SpeciesChoiceProps) {
  const choose = (taxon: Taxon) => onChange({ taxon: taxon.slug, nameAsEntered: value.nameAsEntered.trim() === '' ? taxon.name : value.nameAsEntered });
  return (
    <View style={{ gap: 14 }}>
      <FieldPlace path={`${path}.taxon`}>{value.taxon === '' ? <SpeciesSearch path={`${path}.taxon`} onChoose={choose} /> : <ChosenSpecies path={`${path}.taxon`} slug={value.taxon} name={value.nameAsEntered} onClear={() => onChange({ taxon: '' })} />}</FieldPlace>
      <FieldGrid>
        <DraftText path={`${path}.nameAsEntered`} label="Name as entered" hint="As your label or the paper says it; it is kept beside the species." value={value.nameAsEntered} maxLength={200} onChange={(nameAsEntered) => onChange({ nameAsEntered })} />
        <DraftChoice path={`${path}.qualifier`} label="Name qualifier" value={value.qualifier} options={optionsOf(nameQualifiers)} onChange={(qualifier) => onChange({ qualifier })} />
      </FieldGrid>
    </View>
  );
}

function ChosenSpecies({ path, slug, name, onClear }: { path: string; slug: string; name: string; onClear: () => void }) {
  const { colour } = useTheme();
  const taxon = useTaxon(slug);
  const { error } = useFieldChecks(path);
  return (
    <View style={{ gap: 4, paddingLeft: 12, borderLeftWidth: 3, borderLeftColor: error ? colour.flagged : colour.cresyl }}>
      <Row justify="space-between" wrap>
        <Binomial name={taxon.data?.name ?? (name || slug.replace('-', ' '))} />
        <Button kind="quiet" label="Choose another species" onPress={onClear} />
      </Row>
      {taxon.data ? (
        <Text size="secondary" tone="inkSoft">
          {lineageWords(taxon.data)}
        </Text>
      ) : null}
      {taxon.data?.demonstration ? <DemoMark /> : null}
      {taxon.data?.status === 'proposed' ? (
        <Text size="secondary" tone="waiting">
          Proposed; a curator has not accepted it yet. You can go on entering; submitting waits for it.
        </Text>
      ) : null}
      {error ? (
        <Text size="secondary" tone="flagged">
          {error}
        </Text>
      ) : null}
    </View>
  );
}

function SpeciesSearch({ path, onChoose }: { path: string; onChoose: (taxon: Taxon) => void }) {
  const [text, setText] = useState('');
  const [query, setQuery] = useState('');
  const [proposing, setProposing] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setQuery(text.trim()), 250);
    return () => clearTimeout(timer);
  }, [text]);
  const found = useTaxa({ query, rank: 'species' }, query.length > 1);
  const { error } = useFieldChecks(path);
  const items = query.length > 1 ? (found.data?.items ?? []).slice(0, 8) : [];
  const settled = query === text.trim() && !found.isFetching;
  return (
    <View style={{ gap: 6 }}>
      <TextField label="Search species" value={text} onChangeText={setText} error={error} hint="Scientific or common name; choose from what the register knows." autoComplete="off" />
      <View role="list" aria-label="Species found">
        {items.map((taxon) => (
          <FoundSpecies key={taxon.id} taxon={taxon} onChoose={() => onChoose(taxon)} />
        ))}
      </View>
      {query.length > 1 && settled && items.length === 0 ? (
        <Text size="secondary" tone="inkSoft" role="status">
          {found.error ? 'The species could not be searched just now.' : 'No species of the register holds these words.'}
        </Text>
      ) : null}
      <Button kind="quiet" label="Propose a species" onPress={() => setProposing(true)} style={{ alignSelf: 'flex-start', marginLeft: -8 }} />
      {proposing ? (
        <ProposeSpecies
          startName={text}
          onClose={() => setProposing(false)}
          onProposed={(taxon) => {
            setProposing(false);
            onChoose(taxon);
          }}
        />
      ) : null}
    </View>
  );
}

function FoundSpecies({ taxon, onChoose }: { taxon: Taxon; onChoose: () => void }) {
  const { colour } = useTheme();
  return (
    <View role="listitem" style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', gap: 12, paddingVertical: 4, borderBottomWidth: 1, borderBottomColor: colour.hairline }}>
      <View style={{ flexShrink: 1 }}>
        <Binomial name={taxon.name} />
        <Text size="least" tone="inkSoft">
          {[lineageWords(taxon), taxon.status === 'proposed' ? 'proposed' : ''].filter(Boolean).join(' · ')}
        </Text>
        {taxon.demonstration ? <DemoMark /> : null}
      </View>
      <Button label="Choose" spokenLabel={`Choose ${taxon.name}`} onPress={onChoose} />
    </View>
  );
}

/** The last nodes above a species, from its path; common names after them. */
function lineageWords(taxon: Taxon): string {
  const above = taxon.path.split(' > ').slice(0, -1).slice(-3).join(' > ');
  return [above, taxon.commonNames.join(', ')].filter(Boolean).join(' · ');
}
