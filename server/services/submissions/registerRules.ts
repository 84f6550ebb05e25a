import type { CheckResult } from '../../../shared/contracts/checks';
import type { SpecimenContent, SubmissionContent } from '../../../shared/contracts/content';
import { isDate } from '../../../shared/domain/checks/dateChecks';
import { outcome } from '../../../shared/domain/checks/outcome';
import { parseCount } from '../../../shared/domain/units';
import type { ContentVocabulary } from './vocabulary';

/** Animals of one mean; more would not fit the column and no paper has them. */
const mostAnimals = 1_000_000;

interface NamedEntry {
  taxonPath: string;
  taxon: string;
  structures: { path: string; structure: string; definitionVersion: number }[];
}

function entriesOf(content: SubmissionContent): NamedEntry[] {
  if (content.kind === 'specimen') {
    const structures = content.structures.map(({ structure, definitionVersion }, i) => ({ path: `structures.${i}`, structure, definitionVersion }));
    return [{ taxonPath: 'specimen.taxon', taxon: content.specimen.taxon, structures }];
  }
  return content.values.map((value, i) => ({ taxonPath: `values.${i}.taxon`, taxon: value.taxon, structures: [{ path: `values.${i}`, structure: value.structure, definitionVersion: value.definitionVersion }] }));
}

function checkTaxon({ taxon: slug, taxonPath }: NamedEntry, { taxa }: ContentVocabulary, demonstrationLab: boolean): CheckResult[] {
  if (slug === '') return [];
  const taxon = taxa.get(slug);
  if (taxon === undefined) return [outcome('blocks', 'taxon-unknown', taxonPath, 'The register has no taxon of this address: choose one from the list, or propose it.', slug)];
  if (taxon.status !== 'accepted') return [outcome('blocks', 'taxon-not-accepted', taxonPath, 'A curator has not accepted this taxon.', taxon.name)];
  if (taxon.named && taxon.rank !== 'species') return [outcome('blocks', 'taxon-not-a-species', taxonPath, 'Values belong to a species, not to a clade.', `${taxon.name}, ${taxon.rank}`, 'a species')];
  if (demonstrationLab && !taxon.demonstration) {
    return [outcome('blocks', 'real-species-in-demonstration', taxonPath, 'Invented counts never stand under a real species’ name: a demonstration laboratory chooses a demonstration species.', taxon.name, 'a demonstration species')];
  }
  return [];
}

function checkStructures({ taxon: slug, structures }: NamedEntry, vocabulary: ContentVocabulary): CheckResult[] {
  const taxon = vocabulary.taxa.get(slug);
  return structures.flatMap(({ path, structure: key, definitionVersion }) => {
    if (key === '') return [];
    const structure = vocabulary.structures.get(key);
    if (structure === undefined) return [outcome('blocks', 'structure-unknown', `${path}.structure`, 'The register has no structure of this key.', key)];
    const found: CheckResult[] = [];
    if (!structure.definitions.some((definition) => definition.version === definitionVersion)) {
      found.push(outcome('blocks', 'definition-unknown', `${path}.definitionVersion`, `${structure.name} has no definition of this number.`, definitionVersion));
    }
    if (structure.animalClass !== null && taxon !== undefined && !taxon.lineage.some((node) => node.name === structure.animalClass)) {
      found.push(outcome('blocks', 'structure-of-another-class', `${path}.structure`, `${structure.name} is a structure of ${structure.animalClass} only.`, taxon.name, structure.animalClass));
    }
    return found;
  });
}

function checkSpecimenEntries(content: SpecimenContent): CheckResult[] {
  const twice = <Entry extends { id: string }>(entries: readonly Entry[], path: string): CheckResult[] =>
    entries.flatMap((entry, i) => (entries.findIndex((other) => other.id === entry.id) < i ? [outcome('blocks', 'entry-twice', `${path}.${i}.id`, 'Two entries carry the same id.', entry.id, 'once')] : []));
  const code = content.specimen.code.trim().toLowerCase();
  return [
    ...twice(content.structures, 'structures'),
    ...content.structures.flatMap((structure, i) => [
      ...twice(structure.samples, `structures.${i}.samples`),
      ...structure.samples.flatMap((sample, j) =>
        sample.pooledWith.flatMap((other, k) => {
          const plain = other.trim().toLowerCase();
          const isOwn = plain !== '' && (plain === code || sample.pooledWith.findIndex((earlier) => earlier.trim().toLowerCase() === plain) < k);
          return isOwn ? [outcome('blocks', 'pooled-twice', `structures.${i}.samples.${j}.pooledWith.${k}`, 'Each further animal of a pooled sample stands once, beside the specimen itself.', other, 'once')] : [];
        }),
      ),
    ]),
  ];
}

/** A human donor is never identifiable: of the count, too, only the year is kept. Death, fixation and age are judged with the form's own checks. */
function checkHumanDonor(content: SpecimenContent, { taxa }: ContentVocabulary): CheckResult[] {
  if (taxa.get(content.specimen.taxon)?.name !== 'Homo sapiens') return [];
  return content.structures.flatMap((structure, i) =>
    structure.samples.flatMap((sample, j) =>
      sample.countedOn.trim().length > 4 ? [outcome('blocks', 'human-donor', `structures.${i}.samples.${j}.countedOn`, 'Of a human donor only the year is kept.', null, 'YYYY')] : [],
    ),
  );
}

function checkLiteratureEntries(content: SubmissionContent): CheckResult[] {
  if (content.kind !== 'literature') return [];
  return content.values.flatMap((value, i) => [
    ...(content.values.findIndex((other) => other.id === value.id) < i ? [outcome('blocks', 'entry-twice', `values.${i}.id`, 'Two entries carry the same id.', value.id, 'once')] : []),
    ...(['bodyMass', 'structureMass', 'cells', 'neurons', 'otherCells'] as const).flatMap((field) => {
      const n = parseCount(value[field].n).value;
      return n !== null && n > mostAnimals ? [outcome('blocks', 'too-many-animals', `values.${i}.${field}.n`, 'The number of animals cannot be right.', value[field].n, `≤ ${mostAnimals}`)] : [];
    }),
  ]);
}

function checkEmbargo(content: SubmissionContent): CheckResult[] {
  const until = content.provenance.embargoUntil.trim();
  if (until === '' || (until.length === 10 && isDate(until))) return [];
  return [outcome('blocks', 'date-malformed', 'provenance.embargoUntil', 'The end of the embargo is a day, written as year-month-day.', until, 'YYYY-MM-DD')];
}

/**
 * Rules that need the register's own vocabularies: known and accepted taxa, structures of the class and their
 * definitions, demonstration species for demonstration laboratories, ids that stand once.
 *
 * @param demonstrationLab whether the submitting laboratory is one of the demonstration
 * @returns blocking checks only, with paths of the content
 */
export function checkRegisterRules(content: SubmissionContent, vocabulary: ContentVocabulary, demonstrationLab: boolean): CheckResult[] {
  return [
    ...entriesOf(content).flatMap((entry) => [...checkTaxon(entry, vocabulary, demonstrationLab), ...checkStructures(entry, vocabulary)]),
    ...(content.kind === 'specimen' ? [...checkSpecimenEntries(content), ...checkHumanDonor(content, vocabulary)] : []),
    ...checkLiteratureEntries(content),
    ...checkEmbargo(content),
  ];
}
