import { z } from 'zod';
import { overlapKinds, variables } from './vocabulary';

/** Where a record is set aside: from every fit, or from the fits of one pair of variables (either one on x, every clade). */
export const setAsideScopeSchema = z.union([
  z.literal('all'),
  z.object({
    a: z.object({ variable: z.enum(variables), structure: z.string().nullable() }),
    b: z.object({ variable: z.enum(variables), structure: z.string().nullable() }),
  }),
]);
export type SetAsideScope = z.infer<typeof setAsideScopeSchema>;

export const setAsideSchema = z.object({
  scope: setAsideScopeSchema,
  reason: z.string(),
  by: z.string(),
  at: z.string(),
});

const positiveOrNull = z.number().nullable();

/**
 * One row of the published dataset, and of the working set: what the register keeps of one taxon × structure ×
 * (specimen or source). It is flat, complete and self-explaining: fits, pages, CSV files and frozen versions are
 * all made from rows of this shape. Masses in g; counts scaled up to the whole structure; per-mg values are those
 * of the tissue counted, never scaled.
 */
export const recordRowSchema = z.object({
  number: z.string().meta({ description: 'Record number, never reused', example: 'AK-000012' }),
  revision: z.number().int(),
  kind: z.enum(['specimen', 'literature']),
  taxonSlug: z.string(),
  species: z.string(),
  nameAsEntered: z.string(),
  qualifier: z.string(),
  /** False for a species without a full name: kept at genus level ("Genus sp.") it enters fits with a mark, else none. */
  named: z.boolean(),
  /** Names from the root to the parent of the species. */
  lineage: z.array(z.string()),
  origin: z.string(),
  demonstration: z.boolean(),
  structure: z.string(),
  definitionVersion: z.number().int(),
  composition: z.string().meta({ description: 'What the structure includes and excludes, in words' }),
  delineation: z.array(z.string()),
  /** The lab's code of the animal, null for literature values. */
  specimen: z.string().nullable(),
  /** Further animals pooled in its samples. */
  pooledWith: z.array(z.string()),
  sex: z.string(),
  ageClass: z.string(),
  sourceKey: z.string(),
  sourceCitation: z.string(),
  sourceDoi: z.string().nullable(),
  sourceYear: z.number().int().nullable(),
  sourcePlace: z.string(),
  sharesAnimalsWith: z.array(z.object({ source: z.string(), overlap: z.enum(overlapKinds) })),
  lab: z.string().nullable(),
  contributors: z.array(z.object({ name: z.string(), orcid: z.string().nullable() })),
  /** Number of animals; null where the source does not say. */
  n: z.number().int().nullable(),
  centre: z.string(),
  spreadKind: z.string(),
  bodyMassG: positiveOrNull,
  bodyMassError: positiveOrNull,
  bodyMassKind: z.string(),
  structureMassG: positiveOrNull,
  structureMassError: positiveOrNull,
  cells: positiveOrNull,
  cellsError: positiveOrNull,
  neurons: positiveOrNull,
  neuronsError: positiveOrNull,
  otherCells: positiveOrNull,
  otherCellsError: positiveOrNull,
  cellsPerMg: positiveOrNull,
  neuronsPerMg: positiveOrNull,
  otherToNeuronRatio: positiveOrNull,
  massState: z.string(),
  fixation: z.string(),
  method: z.string(),
  /** Portions that were doubled or otherwise scaled up, in words; empty where none was. */
  scaledUp: z.string(),
  printedDifferently: z.string(),
  note: z.string(),
  approval: z.string(),
  setAside: z.array(setAsideSchema),
  openRecheck: z.boolean(),
  approvedAt: z.string(),
  approvedBy: z.string(),
});
export type RecordRow = z.infer<typeof recordRowSchema>;
