import type { CheckResult } from '../../contracts/checks';
import type { LiteratureContent, SpecimenContent } from '../../contracts/content';
import { outcome } from './outcome';

type Provenance = SpecimenContent['provenance'];

function missing(path: string, what: string): CheckResult {
  return outcome('blocks', 'missing', path, `${what} is missing.`);
}

function required(present: boolean, path: string, what: string): CheckResult[] {
  return present ? [] : [missing(path, what)];
}

function has(text: string): boolean {
  return text.trim() !== '';
}

function missingName(entry: { nameAsEntered: string; taxon: string }, path: string): CheckResult[] {
  return [
    ...required(has(entry.nameAsEntered), `${path}.nameAsEntered`, 'The name of the species as entered'),
    ...required(has(entry.taxon), `${path}.taxon`, 'The taxon of the register that the name stands for'),
  ];
}

function missingProvenance(provenance: Provenance): CheckResult[] {
  const at = 'provenance';
  const { approvalKind } = provenance;
  return [
    ...required(!provenance.published || has(provenance.doi) || has(provenance.citation), `${at}.doi`, 'The source, by DOI or citation, of published values'),
    ...required(approvalKind !== null, `${at}.approvalKind`, 'The approval: a number, a permit, exempt with its reason, or see source'),
    ...required(
      approvalKind === null || approvalKind === 'see-source' || has(provenance.approvalText),
      `${at}.approvalText`, approvalKind === 'exempt' ? 'The reason of the exemption' : 'The number of the approval or permit',
    ),
    ...required(approvalKind !== 'see-source' || has(provenance.doi) || has(provenance.citation), `${at}.citation`, 'The source that states the approval'),
    ...required(provenance.licenceAccepted, `${at}.licenceAccepted`, 'Agreement to the licence CC BY 4.0'),
  ];
}

/** What a specimen cannot be submitted without, one finding a field. */
export function missingOfSpecimen(content: SpecimenContent): CheckResult[] {
  const { specimen } = content;
  const acts = [specimen.diedOn, specimen.fixedOn, ...content.structures.flatMap((structure) => structure.samples.map((sample) => sample.countedOn))];
  return [
    ...missingName(specimen, 'specimen'),
    ...required(has(specimen.code), 'specimen.code', 'The specimen code'),
    ...required(specimen.origin !== null, 'specimen.origin', 'The origin (wild, captive, domestic, strain)'),
    ...required(specimen.origin !== 'strain' || has(specimen.strain), 'specimen.strain', 'The name of the strain'),
    ...required(specimen.sex !== null, 'specimen.sex', 'The sex, or that it is unknown,'),
    ...required(specimen.ageClass !== null, 'specimen.ageClass', 'The age class'),
    ...required(specimen.bodyMassKind !== null, 'specimen.bodyMassKind', 'The kind of the body mass (measured, estimated, literature, unknown)'),
    ...required(specimen.bodyMassKind === null || specimen.bodyMassKind === 'unknown' || has(specimen.bodyMass.text), 'specimen.bodyMass', 'The body mass'),
    ...required(content.massState !== null, 'massState', 'The state of the tissue when weighed'),
    ...required(content.fixation !== null, 'fixation', 'The fixation'),
    ...required(content.method !== null, 'method', 'The method of counting'),
    ...required(acts.some(has), 'specimen.diedOn', 'A date (of death, fixation or count)'),
    ...required(content.structures.length > 0, 'structures', 'A structure'),
    ...content.structures.flatMap((structure, i) => missingOfStructure(structure, `structures.${i}`)),
    ...missingProvenance(content.provenance),
  ];
}

function missingOfStructure(structure: SpecimenContent['structures'][number], path: string): CheckResult[] {
  const isWeighed = has(structure.mass.text) || (structure.samples.length > 0 && structure.samples.every((sample) => has(sample.tissueMass.text)));
  return [
    ...required(has(structure.structure), `${path}.structure`, 'The structure'),
    ...required(isWeighed, `${path}.mass`, 'The mass of the structure, or of each of its samples,'),
    ...structure.samples.flatMap((sample, i) => {
      const at = `${path}.samples.${i}`;
      const isCounted = sample.aliquots.some((aliquot) => has(aliquot.nuclei));
      return [
        ...required(sample.side !== null, `${at}.side`, 'The side, or that it is not stated,'),
        ...required(!isCounted || has(sample.suspensionVolume.text), `${at}.suspensionVolume`, 'The volume of the suspension'),
        ...required(isCounted || !has(sample.suspensionVolume.text), `${at}.aliquots`, 'A counted aliquot'),
        ...sample.aliquots.flatMap((aliquot, j) => required(!has(aliquot.nuclei) || has(aliquot.squares), `${at}.aliquots.${j}.squares`, 'The number of squares counted')),
        ...sample.neun.flatMap((field, j) => [
          ...required(has(field.positive) || !has(field.total), `${at}.neun.${j}.positive`, 'The number of NeuN-positive nuclei'),
          ...required(has(field.total) || !has(field.positive), `${at}.neun.${j}.total`, 'The number of nuclei scored for NeuN'),
        ]),
      ];
    }),
  ];
}

/** What values from a source cannot be submitted without: the source, and a species, structure and value a row. */
export function missingOfLiterature(content: LiteratureContent): CheckResult[] {
  return [
    ...required(has(content.source.doi) || has(content.source.citation), 'source.doi', 'The source, by DOI or citation,'),
    ...required(content.provenance.licenceAccepted, 'provenance.licenceAccepted', 'Agreement to the licence CC BY 4.0'),
    ...required(content.values.length > 0, 'values', 'A value'),
    ...content.values.flatMap((value, i) => [
      ...missingName(value, `values.${i}`),
      ...required(has(value.structure), `values.${i}.structure`, 'The structure'),
      ...required(
        [value.structureMass, value.cells, value.neurons, value.otherCells].some((number) => has(number.text)),
        `values.${i}.structureMass`, 'A mass or a count',
      ),
    ]),
  ];
}
