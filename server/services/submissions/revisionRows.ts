import { ensureSpecimens, insertLiteratureValues, insertSample, insertSpecimenState, insertStructureEstimates } from '../../../db/queries/specimens';
import type { Transaction } from '../../../db/client';
import type { LiteratureContent, SampleEntry, SpecimenContent, SubmissionContent } from '../../../shared/contracts/content';
import { readLiteratureValue } from '../../../shared/domain/literatureReading';
import { estimateSample, scaleUpFactor } from '../../../shared/domain/sampleEstimate';
import { readSpecimen, type ReadSample } from '../../../shared/domain/specimenReading';
import { parseMassG } from '../../../shared/domain/units';
import { AppError } from '../../errors';
import type { ContentVocabulary } from './vocabulary';

interface Written {
  revisionId: string;
  labId: string | null;
}

const trimmed = (codes: readonly string[]): string[] => codes.map((code) => code.trim()).filter((code) => code !== '');

function idOf(found: { id: string } | undefined, what: string): string {
  if (found === undefined) throw new AppError('wrong-state', `${what} is not in the register's vocabularies.`);
  return found.id;
}

async function writeSample(tx: Transaction, estimateId: string, entry: SampleEntry, read: ReadSample, structure: string, specimenIds: ReadonlyMap<string, string>, code: string): Promise<void> {
  const { input } = read;
  // A portion that was weighed and not counted has no suspension: its mass is in the structure's.
  if (input === null) return;
  const { factor, factorSe } = scaleUpFactor(input.scaleUp);
  const animals = [code, ...trimmed(entry.pooledWith)];
  await insertSample(tx, {
    sample: {
      structureEstimateId: estimateId,
      entryId: entry.id,
      label: entry.label,
      side: entry.side ?? 'not-stated',
      tissueMassG: read.tissueMassG,
      tissueMassText: entry.tissueMass.text,
      tissueMassUnit: entry.tissueMass.unit,
      suspension: entry.suspension.trim(),
      suspensionVolumeMl: input.suspensionVolumeMl,
      suspensionVolumeText: entry.suspensionVolume.text,
      suspensionVolumeUnit: entry.suspensionVolume.unit,
      suspensionVolumeSeMl: input.suspensionVolumeSe ?? null,
      dilution: input.dilution ?? 1,
      dilutionSe: input.dilutionSe ?? null,
      scaleUpKind: entry.scaleUp.kind,
      scaleUpFactor: factor,
      scaleUpFactorSe: factorSe,
      chamber: entry.chamber.key,
      countedOn: entry.countedOn,
      observer: entry.observer,
      estimate: estimateSample(input, { structure, side: entry.side, prefix: '' }),
    },
    specimenIds: animals.flatMap((animal) => specimenIds.get(animal) ?? []),
    aliquots: input.aliquots.map((aliquot, position) => ({ position, nuclei: aliquot.nuclei, volumeMl: aliquot.volumeMl, excluded: aliquot.excluded ?? null, note: noteOf(entry, read.aliquotPaths[position]) })),
    neun: neunOf(input).map((field, position) => ({ position, ...field })),
  });
}

function noteOf(entry: SampleEntry, path: string | undefined): string {
  const index = Number(path?.split('.').at(-1));
  return entry.aliquots[index]?.note ?? '';
}

function neunOf({ neun }: NonNullable<ReadSample['input']>): { positive: number; total: number }[] {
  if (neun == null) return [];
  const fields = 'fields' in neun ? neun.fields : [neun];
  return fields.filter((field) => field.total > 0).map(({ positive, total }) => ({ positive, total }));
}

async function writeSpecimen(tx: Transaction, content: SpecimenContent, vocabulary: ContentVocabulary, { revisionId, labId }: Written): Promise<void> {
  const { specimen, provenance } = content;
  const taxonId = idOf(vocabulary.taxa.get(specimen.taxon), `The taxon ${specimen.taxon}`);
  if (labId === null) throw new AppError('wrong-state', 'A specimen belongs to a laboratory.');
  const code = specimen.code.trim();
  const pooled = content.structures.flatMap((structure) => structure.samples.flatMap((sample) => trimmed(sample.pooledWith)));
  const specimenIds = await ensureSpecimens(tx, labId, taxonId, [code, ...pooled]);
  await insertSpecimenState(tx, {
    revisionId,
    specimenId: specimenIds.get(code)!,
    nameAsEntered: specimen.nameAsEntered,
    qualifier: specimen.qualifier,
    origin: specimen.origin ?? 'unknown',
    sex: specimen.sex ?? 'unknown',
    ageClass: specimen.ageClass ?? 'unknown',
    bodyMassG: parseMassG(specimen.bodyMass).value,
    bodyMassText: specimen.bodyMass.text,
    bodyMassUnit: specimen.bodyMass.unit,
    bodyMassKind: specimen.bodyMassKind ?? 'unknown',
    massState: content.massState ?? 'unknown',
    fixation: content.fixation ?? 'unknown',
    method: content.method ?? 'other',
    approvalKind: provenance.approvalKind ?? '',
    approvalText: provenance.approvalText,
  });
  const structures = readSpecimen(content);
  const estimateIds = await insertStructureEstimates(
    tx,
    structures.map(({ structure, structureMassG, estimate }, i) => {
      const entry = content.structures[i]!;
      return {
        revisionId,
        entryId: entry.id,
        structureId: idOf(vocabulary.structures.get(structure), `The structure ${structure}`),
        definitionVersion: entry.definitionVersion,
        delineation: entry.delineation,
        massG: structureMassG,
        massText: entry.mass.text,
        massUnit: entry.mass.unit,
        cells: estimate.cells.value,
        cellsSe: estimate.cells.standardError,
        neurons: estimate.neurons.value,
        neuronsSe: estimate.neurons.standardError,
        otherCells: estimate.otherCells.value,
        otherCellsSe: estimate.otherCells.standardError,
        cellsPerMg: estimate.cellsPerMg.value,
        neuronsPerMg: estimate.neuronsPerMg.value,
      };
    }),
  );
  for (const [i, read] of structures.entries()) {
    const entry = content.structures[i]!;
    for (const [j, sample] of read.samples.entries()) {
      await writeSample(tx, estimateIds.get(entry.id)!, entry.samples[j]!, sample, entry.structure, specimenIds, code);
    }
  }
}

const literatureFields = [
  ['bodyMassG', 'bodyMass'],
  ['structureMassG', 'structureMass'],
  ['cells', 'cells'],
  ['neurons', 'neurons'],
  ['otherCells', 'otherCells'],
] as const;

async function writeLiterature(tx: Transaction, content: LiteratureContent, vocabulary: ContentVocabulary, { revisionId }: Written): Promise<void> {
  const values = content.values.flatMap((entry, i) => {
    const read = readLiteratureValue(entry, `values.${i}`);
    const taxonId = idOf(vocabulary.taxa.get(entry.taxon), `The taxon ${entry.taxon}`);
    const structureId = idOf(vocabulary.structures.get(entry.structure), `The structure ${entry.structure}`);
    return literatureFields.flatMap(([variable, field]) => {
      const { value, spread, n } = read[variable];
      const { text, unit, centre, spreadKind } = entry[field];
      if (value === null) return [];
      return [{ revisionId, entryId: entry.id, variable, taxonId, structureId, definitionVersion: entry.definitionVersion, value, valueText: text, unit, centre, spread, spreadKind, n, printedDifferently: entry.printedDifferently }];
    });
  });
  await insertLiteratureValues(tx, values);
}

/**
 * Writes the rows of a submitted revision: specimen, estimates, samples, aliquots and NeuN counts, or printed values.
 * Canonical numbers (g, mL, counts) stand beside texts and units as entered. The content must have passed its checks.
 */
export async function writeRevisionRows(tx: Transaction, content: SubmissionContent, vocabulary: ContentVocabulary, written: Written): Promise<void> {
  if (content.kind === 'specimen') await writeSpecimen(tx, content, vocabulary, written);
  else await writeLiterature(tx, content, vocabulary, written);
}
