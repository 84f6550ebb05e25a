import { sql } from 'drizzle-orm';
import { boolean, check, doublePrecision, index, jsonb, pgTable, text, unique, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { fitMethods, variables } from '../../shared/contracts/vocabulary';
import { users } from './auth';
import { at, createdAt, id, wordsIn } from './columns';
import { records } from './records';
import { versions } from './versions';
import { taxa } from './vocabularies';

/** A question the register keeps answering: y on x, in a clade, by a method. */
export const standingFits = pgTable(
  'standing_fits',
  {
    id: id(),
    /** `y-ystructure--x-xstructure--clade--method`, never changed. */
    slug: text('slug').notNull().unique(),
    y: text('y').$type<(typeof variables)[number]>().notNull(),
    yStructure: text('y_structure'),
    x: text('x').$type<(typeof variables)[number]>().notNull(),
    xStructure: text('x_structure'),
    cladeId: uuid('clade_id').notNull().references(() => taxa.id),
    method: text('method').$type<(typeof fitMethods)[number]>().notNull(),
    active: boolean('active').notNull().default(true),
    createdBy: uuid('created_by').references(() => users.id),
    createdAt: createdAt(),
  },
  () => [
    check('standing_fits_y', wordsIn('y', variables)),
    check('standing_fits_x', wordsIn('x', variables)),
    check('standing_fits_method', wordsIn('method', fitMethods)),
  ],
);

/** One computation of standing fits: of the working set, or of a version. */
export const fitRuns = pgTable(
  'fit_runs',
  {
    id: id(),
    set: text('set').$type<'working' | 'version'>().notNull(),
    versionId: uuid('version_id').references(() => versions.id),
    reason: text('reason').notNull().default(''),
    /** Records whose change asked for this run; empty asks for every standing fit. A row without `finishedAt` is a request still to be worked on. */
    touches: uuid('touches').array().notNull().default(sql`'{}'`),
    createdAt: createdAt(),
    finishedAt: at('finished_at'),
  },
  (t) => [check('fit_runs_set', sql`(${t.set} = 'working' and ${t.versionId} is null) or (${t.set} = 'version' and ${t.versionId} is not null)`)],
);

export const fitResults = pgTable(
  'fit_results',
  {
    id: id(),
    runId: uuid('run_id').notNull().references(() => fitRuns.id),
    standingFitId: uuid('standing_fit_id').notNull().references(() => standingFits.id),
    set: text('set').$type<'working' | 'version'>().notNull(),
    versionId: uuid('version_id').references(() => versions.id),
    /** True for the newest working result of a standing fit. */
    latest: boolean('latest').notNull().default(false),
    /** Species means with their contributing records and weights. */
    inputs: jsonb('inputs').notNull(),
    exclusions: jsonb('exclusions').notNull(),
    /** One element of `fits` in the answer of POST /fits. */
    result: jsonb('result').notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    unique('fit_results_once').on(t.runId, t.standingFitId),
    uniqueIndex('fit_results_latest').on(t.standingFitId).where(sql`latest`),
    index('fit_results_version').on(t.versionId),
  ],
);

/** A flag names the fit, the set and the run that raised it, and the record it speaks of. */
export const flags = pgTable(
  'flags',
  {
    id: id(),
    fitResultId: uuid('fit_result_id').notNull().references(() => fitResults.id),
    recordId: uuid('record_id').notNull().references(() => records.id),
    kind: text('kind').$type<'watch' | 'outlier' | 'influential'>().notNull(),
    studentised: doublePrecision('studentised'),
    bonferroniP: doublePrecision('bonferroni_p'),
    reasons: text('reasons').array().notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    unique('flags_once').on(t.fitResultId, t.recordId, t.kind),
    check('flags_kind', sql`${t.kind} in ('watch', 'outlier', 'influential')`),
    index('flags_record').on(t.recordId),
  ],
);
