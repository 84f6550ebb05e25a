import { findDelineations, findRowsOfTaxon } from '../../../db/queries/records';
import { findSpecimenCodes } from '../../../db/queries/specimens';
import type { Queryable } from '../../../db/client';
import type { SubmissionContent } from '../../../shared/contracts/content';
import type { DerivedStructure, Preview } from '../../../shared/contracts/submissions';
import type { CheckContext } from '../../../shared/domain/checks/context';
import { checkLiteratureContent } from '../../../shared/domain/checks/literatureContent';
import { byLevel } from '../../../shared/domain/checks/outcome';
import { checkSpecimenContent } from '../../../shared/domain/checks/specimenContent';
import { readLiteratureValue } from '../../../shared/domain/literatureReading';
import { UNDEFINED_QUANTITY } from '../../../shared/domain/quantity';
import { readSpecimen } from '../../../shared/domain/specimenReading';
import { taxonSlugsOf, structureKeysOf } from './contentFacts';
import { placeEntries, type PlacingSet } from './places';
import { checkRegisterRules } from './registerRules';
import { readVocabulary, type ContentVocabulary } from './vocabulary';

/** From where a content is looked at. */
export interface Viewpoint {
  /** Today, ISO. */
  today: string;
  submissionId: string | null;
  labId: string | null;
  demonstrationLab: boolean;
  /** Whether the checks may speak of the whole working set, as for reviewers; else of what is published and of the own laboratory. */
  seesWorkingSet: boolean;
  /** Rows whose lines the entries are placed on: those of the current version, or the working set for reviewers. Null places nothing. */
  placing: PlacingSet | null;
}

const printed = (value: number | null, spread: number | null, isError: boolean) => ({ ...UNDEFINED_QUANTITY, value, standardError: isError ? spread : null });

/** Derived values of each structure or row, before they are placed. */
function deriveStructures(content: SubmissionContent): Omit<DerivedStructure, 'place' | 'noPlace'>[] {
  if (content.kind === 'specimen') {
    return readSpecimen(content).map(({ structure, structureMassG, estimate }, i) => ({
      entryId: content.structures[i]?.id ?? '',
      structure,
      structureMassG,
      cells: estimate.cells,
      neurons: estimate.neurons,
      otherCells: estimate.otherCells,
      cellsPerMg: estimate.cellsPerMg,
      neuronsPerMg: estimate.neuronsPerMg,
      doubled: content.structures[i]?.samples.some((sample) => sample.scaleUp.kind === 'other-side') ?? false,
    }));
  }
  return content.values.map((entry, i) => {
    const { structureMassG, cells, neurons, otherCells } = readLiteratureValue(entry, `values.${i}`);
    return {
      entryId: entry.id,
      structure: entry.structure,
      structureMassG: structureMassG.value,
      cells: printed(cells.value, cells.spread, entry.cells.spreadKind === 'SE'),
      neurons: printed(neurons.value, neurons.spread, entry.neurons.spreadKind === 'SE'),
      otherCells: printed(otherCells.value, otherCells.spread, entry.otherCells.spreadKind === 'SE'),
      cellsPerMg: UNDEFINED_QUANTITY,
      neuronsPerMg: UNDEFINED_QUANTITY,
      doubled: false,
    };
  });
}

async function checkContextOf(db: Queryable, content: SubmissionContent, vocabulary: ContentVocabulary, viewpoint: Viewpoint): Promise<CheckContext> {
  const { today, submissionId, labId } = viewpoint;
  if (content.kind === 'literature') return { today };
  const taxon = vocabulary.taxa.get(taxonSlugsOf(content)[0] ?? '');
  const scope = { exceptSubmissionId: submissionId, day: today, workingOf: viewpoint.seesWorkingSet ? ('all' as const) : { labId } };
  const held = taxon === undefined ? [] : await findRowsOfTaxon(db, taxon.id, scope);
  const parts: Record<string, string[]> = {};
  for (const { key, parentKey } of vocabulary.structures.values()) if (parentKey !== null) parts[parentKey] = [...(parts[parentKey] ?? []), key];
  return {
    today,
    otherSpecimens: held.flatMap(({ row }) => (row.specimen === null ? [] : [{ code: row.specimen, structure: row.structure, neurons: row.neurons }])),
    labSpecimenCodes: labId === null ? [] : await findSpecimenCodes(db, labId, submissionId),
    delineations: await findDelineations(db, structureKeysOf(content), scope),
    parts,
  };
}

/**
 * Derived values, checks and places of a content: the same for the form, at submission and in review.
 *
 * @returns structures in the order of the content, checks by level (blocks, warns, passes) with paths of the content
 */
export async function evaluateContent(db: Queryable, content: SubmissionContent, viewpoint: Viewpoint): Promise<Preview & { vocabulary: ContentVocabulary }> {
  const vocabulary = await readVocabulary(db, [content]);
  const derived = deriveStructures(content);
  const { places, lines } = placeEntries(content, derived, vocabulary, viewpoint.placing);
  const context: CheckContext = { ...(await checkContextOf(db, content, vocabulary, viewpoint)), lines };
  const checks = content.kind === 'specimen' ? checkSpecimenContent(content, context) : checkLiteratureContent(content, context);
  return {
    structures: derived.map((structure, i) => ({ ...structure, ...(places[i] ?? { place: null, noPlace: null }) })),
    checks: byLevel([...checkRegisterRules(content, vocabulary, viewpoint.demonstrationLab), ...checks]),
    vocabulary,
  };
}
