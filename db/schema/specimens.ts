import { sql } from 'drizzle-orm';
import { check, doublePrecision, index, integer, jsonb, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core';
import { centreKinds, exclusionReasons, scaleUpKinds, sides, spreadKinds } from '../../shared/contracts/vocabulary';
import { createdAt, id, wordsIn } from './columns';
import { labs } from './people';
import { submissionRevisions } from './submissions';
import { structures, taxa } from './vocabularies';

/**
 * The rows of a submitted revision, written when it is submitted and never changed after.
 * Values stand as entered (text and unit, in the revision's content) beside these canonical numbers.
 */

/** One animal of a lab; its code is the lab's own. */
export const specimens = pgTable(
  'specimens',
  {
    id: id(),
    labId: uuid('lab_id').notNull().references(() => labs.id),
    code: text('code').notNull(),
    taxonId: uuid('taxon_id').notNull().references(() => taxa.id),
    createdAt: createdAt(),
  },
  (t) => [unique('specimens_code').on(t.labId, t.code), index('specimens_taxon').on(t.taxonId)],
);

/** What a revision says of its specimen. */
export const specimenStates = pgTable(
  'specimen_states',
  {
    revisionId: uuid('revision_id').primaryKey().references(() => submissionRevisions.id),
    specimenId: uuid('specimen_id').notNull().references(() => specimens.id),
    nameAsEntered: text('name_as_entered').notNull(),
    qualifier: text('qualifier').notNull(),
    origin: text('origin').notNull(),
    sex: text('sex').notNull(),
    ageClass: text('age_class').notNull(),
    bodyMassG: doublePrecision('body_mass_g'),
    bodyMassText: text('body_mass_text').notNull().default(''),
    bodyMassUnit: text('body_mass_unit').notNull().default(''),
    bodyMassKind: text('body_mass_kind').notNull(),
    massState: text('mass_state').notNull(),
    fixation: text('fixation').notNull(),
    method: text('method').notNull(),
    approvalKind: text('approval_kind').notNull(),
    approvalText: text('approval_text').notNull().default(''),
  },
  (t) => [check('specimen_states_mass', sql`${t.bodyMassG} is null or ${t.bodyMassG} > 0`), index('specimen_states_specimen').on(t.specimenId)],
);

/** A structure of a revision's specimen and the sum of its samples. */
export const structureEstimates = pgTable(
  'structure_estimates',
  {
    id: id(),
    revisionId: uuid('revision_id').notNull().references(() => submissionRevisions.id),
    /** Id of the structure's entry in the revision's content; links the revisions of one record. */
    entryId: text('entry_id').notNull(),
    structureId: uuid('structure_id').notNull().references(() => structures.id),
    definitionVersion: integer('definition_version').notNull(),
    delineation: text('delineation').array().notNull().default(sql`'{}'`),
    massG: doublePrecision('mass_g'),
    massText: text('mass_text').notNull().default(''),
    massUnit: text('mass_unit').notNull().default(''),
    cells: doublePrecision('cells'),
    cellsSe: doublePrecision('cells_se'),
    neurons: doublePrecision('neurons'),
    neuronsSe: doublePrecision('neurons_se'),
    otherCells: doublePrecision('other_cells'),
    otherCellsSe: doublePrecision('other_cells_se'),
    cellsPerMg: doublePrecision('cells_per_mg'),
    neuronsPerMg: doublePrecision('neurons_per_mg'),
  },
  (t) => [
    unique('structure_estimates_entry').on(t.revisionId, t.entryId),
    check('structure_estimates_mass', sql`${t.massG} is null or ${t.massG} > 0`),
    check('structure_estimates_counts', sql`coalesce(${t.cells}, 0) >= 0 and coalesce(${t.neurons}, 0) >= 0 and coalesce(${t.otherCells}, 0) >= 0`),
  ],
);

/** A dissociated portion of a structure, counted. */
export const samples = pgTable(
  'samples',
  {
    id: id(),
    structureEstimateId: uuid('structure_estimate_id').notNull().references(() => structureEstimates.id),
    entryId: text('entry_id').notNull(),
    label: text('label').notNull().default(''),
    side: text('side').notNull(),
    tissueMassG: doublePrecision('tissue_mass_g'),
    tissueMassText: text('tissue_mass_text').notNull().default(''),
    tissueMassUnit: text('tissue_mass_unit').notNull().default(''),
    suspension: text('suspension').notNull().default(''),
    suspensionVolumeMl: doublePrecision('suspension_volume_ml').notNull(),
    suspensionVolumeText: text('suspension_volume_text').notNull().default(''),
    suspensionVolumeUnit: text('suspension_volume_unit').notNull().default(''),
    suspensionVolumeSeMl: doublePrecision('suspension_volume_se_ml'),
    dilution: doublePrecision('dilution').notNull(),
    dilutionSe: doublePrecision('dilution_se'),
    scaleUpKind: text('scale_up_kind').notNull(),
    scaleUpFactor: doublePrecision('scale_up_factor').notNull(),
    scaleUpFactorSe: doublePrecision('scale_up_factor_se').notNull().default(0),
    chamber: text('chamber').notNull(),
    countedOn: text('counted_on').notNull().default(''),
    observer: text('observer').notNull().default(''),
    estimate: jsonb('estimate').notNull(),
  },
  (t) => [
    unique('samples_entry').on(t.structureEstimateId, t.entryId),
    check('samples_side', wordsIn('side', sides)),
    check('samples_scale_up', wordsIn('scale_up_kind', scaleUpKinds)),
    check('samples_positive', sql`${t.suspensionVolumeMl} > 0 and ${t.dilution} >= 1 and ${t.scaleUpFactor} > 0 and (${t.tissueMassG} is null or ${t.tissueMassG} > 0)`),
  ],
);

/** Samples and specimens are many-to-many: small structures are pooled over animals. */
export const sampleSpecimens = pgTable(
  'sample_specimens',
  {
    sampleId: uuid('sample_id').notNull().references(() => samples.id),
    specimenId: uuid('specimen_id').notNull().references(() => specimens.id),
  },
  (t) => [primaryKey({ columns: [t.sampleId, t.specimenId] }), index('sample_specimens_specimen').on(t.specimenId)],
);

/** One chamber load. An excluded one stays listed with its reason. */
export const aliquots = pgTable(
  'aliquots',
  {
    sampleId: uuid('sample_id').notNull().references(() => samples.id),
    position: integer('position').notNull(),
    nuclei: doublePrecision('nuclei').notNull(),
    volumeMl: doublePrecision('volume_ml').notNull(),
    excluded: text('excluded'),
    note: text('note').notNull().default(''),
  },
  (t) => [
    primaryKey({ columns: [t.sampleId, t.position] }),
    check('aliquots_counts', sql`${t.nuclei} >= 0 and ${t.nuclei} = floor(${t.nuclei}) and ${t.volumeMl} > 0`),
    check('aliquots_excluded', sql`${t.excluded} is null or ${wordsIn('excluded', exclusionReasons)}`),
  ],
);

export const neunCounts = pgTable(
  'neun_counts',
  {
    sampleId: uuid('sample_id').notNull().references(() => samples.id),
    position: integer('position').notNull(),
    positive: doublePrecision('positive').notNull(),
    total: doublePrecision('total').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.sampleId, t.position] }),
    check('neun_counts_order', sql`${t.positive} >= 0 and ${t.total} > 0 and ${t.positive} <= ${t.total}`),
  ],
);

/** One printed number of a source: its centre, spread and number of animals, and the canonical value. */
export const literatureValues = pgTable(
  'literature_values',
  {
    revisionId: uuid('revision_id').notNull().references(() => submissionRevisions.id),
    entryId: text('entry_id').notNull(),
    variable: text('variable').notNull(),
    taxonId: uuid('taxon_id').notNull().references(() => taxa.id),
    structureId: uuid('structure_id').notNull().references(() => structures.id),
    definitionVersion: integer('definition_version').notNull(),
    value: doublePrecision('value').notNull(),
    valueText: text('value_text').notNull(),
    unit: text('unit').notNull(),
    centre: text('centre').notNull(),
    spread: doublePrecision('spread'),
    spreadKind: text('spread_kind').notNull(),
    n: integer('n'),
    printedDifferently: text('printed_differently').notNull().default(''),
  },
  (t) => [
    primaryKey({ columns: [t.revisionId, t.entryId, t.variable] }),
    check('literature_values_positive', sql`${t.value} >= 0 and (${t.n} is null or ${t.n} > 0)`),
    check('literature_values_centre', wordsIn('centre', centreKinds)),
    check('literature_values_spread', wordsIn('spread_kind', spreadKinds)),
  ],
);
