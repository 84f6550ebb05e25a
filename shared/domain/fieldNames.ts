import type { SubmissionContent } from '../contracts/content';

/** Words of a form for the last part of a field path; everything the forms show is listed. */
const words: Readonly<Record<string, string>> = {
  specimen: 'specimen',
  code: 'specimen code',
  nameAsEntered: 'species',
  taxon: 'species of the register',
  qualifier: 'name qualifier',
  origin: 'origin',
  strain: 'strain or breed',
  sex: 'sex',
  ageClass: 'age class',
  ageDays: 'age in days',
  bodyMass: 'body mass',
  bodyMassKind: 'kind of body mass',
  diedOn: 'date of death',
  fixedOn: 'date of fixation',
  locality: 'locality',
  voucher: 'voucher',
  massState: 'mass state',
  fixation: 'fixation',
  postMortemIntervalH: 'post-mortem interval',
  storageDays: 'storage time',
  method: 'method of counting',
  structure: 'structure',
  structures: 'structures',
  definitionVersion: 'definition version',
  mass: 'mass of the structure',
  delineation: 'delineation',
  delineationNote: 'note on the delineation',
  samples: 'samples',
  label: 'portion label',
  side: 'side counted',
  tissueMass: 'tissue mass',
  suspension: 'suspension',
  suspensionVolume: 'suspension volume',
  suspensionVolumeSe: 'error of the suspension volume',
  dilution: 'dilution',
  dilutionSe: 'error of the dilution',
  scaleUp: 'scale-up',
  factor: 'scale-up factor',
  factorSe: 'error of the scale-up factor',
  chamber: 'counting chamber',
  squareVolume: 'volume of one square',
  aliquots: 'aliquots',
  nuclei: 'nuclei',
  squares: 'squares counted',
  excluded: 'reason for exclusion',
  neun: 'NeuN counts',
  positive: 'NeuN-positive nuclei',
  total: 'nuclei scored for NeuN',
  pooledWith: 'animals pooled',
  countedOn: 'date of counting',
  observer: 'observer',
  secondObserver: 'second observer',
  antibodyRrid: 'antibody RRID',
  note: 'note',
  published: 'published or not',
  doi: 'DOI',
  citation: 'citation',
  protocolDoi: 'protocol DOI',
  approvalKind: 'approval',
  approvalText: 'number of the approval',
  permits: 'permits',
  licenceAccepted: 'licence',
  embargoUntil: 'embargo',
  sharesAnimalsWith: 'sources that share animals',
  overlap: 'overlap of specimens',
  source: 'source',
  year: 'year',
  values: 'values',
  structureMass: 'structure mass',
  cells: 'cells',
  neurons: 'neurons',
  otherCells: 'other cells',
  place: 'place in the source',
  printedDifferently: 'printed differently',
  centre: 'centre',
  spreadText: 'spread',
  spreadKind: 'kind of spread',
  n: 'number of animals',
  kind: 'kind',
  provenance: 'provenance',
};

/** Members that only wrap a text or a unit and are not named by themselves. */
const silent = new Set(['text', 'unit', 'key', 'id', 'specimen', 'provenance', 'explanations']);
const numbered: Readonly<Record<string, string>> = { samples: 'sample', aliquots: 'aliquot', neun: 'NeuN field', values: 'value', pooledWith: 'animal', sharesAnimalsWith: 'shared source' };

function structureWords(content: SubmissionContent | null, index: number): string {
  const key = content?.kind === 'specimen' ? content.structures[index]?.structure : undefined;
  return key ? key.replaceAll('_', ' ') : `structure ${index + 1}`;
}

/**
 * What a field of a submission is called in a sentence or at a thread:
 * `structures.0.samples.1.aliquots.2.nuclei` → "cerebral cortex, sample 2, aliquot 3, nuclei".
 * @param content used for the names of structures; without it they are numbered.
 */
export function fieldName(path: string, content: SubmissionContent | null = null): string {
  if (path === '') return 'the whole submission';
  const parts = path.split('.');
  const named: string[] = [];
  for (let at = 0; at < parts.length; at += 1) {
    const part = parts[at] ?? '';
    const next = parts[at + 1];
    if (next !== undefined && /^\d+$/.test(next)) {
      const index = Number(next);
      named.push(part === 'structures' ? structureWords(content, index) : `${numbered[part] ?? words[part] ?? part} ${index + 1}`);
      at += 1;
    } else if (!silent.has(part) || (at === parts.length - 1 && named.length === 0)) {
      named.push(words[part] ?? part);
    }
  }
  return named.join(', ');
}
