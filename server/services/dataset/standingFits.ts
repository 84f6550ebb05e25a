import type { Transaction } from '../../../db/client';
import { findStandingFits, insertFitResults, insertFlags, insertStandingFits, type StandingFitRow } from '../../../db/queries/fits';
import type { ScalingFitAnswer } from '../../../shared/contracts/fits';
import type { FlagKind } from '../../../shared/contracts/vocabulary';
import { fitScaling } from '../../../shared/stats/fit';
import { unfitGroup } from '../../../shared/stats/scalingAnswer';
import type { FitPoint } from '../../../shared/stats/types';
import { toFitAnswer } from './fitAnswer';
import { speciesMeansFor, type MeanPoint } from './means';
import { standingFitSlug, type Question } from './questions';
import type { DatasetRow } from './rows';
import { liesIn, loadTaxonomy } from './taxonomy';

/** Fewest species of a fit that the register keeps. */
export const leastStandingSpecies = 5;
/** Exponents that every fit of the register is tested against. */
export const statedExponents = [1, 3 / 4, 2 / 3] as const;

export type FitDefinition = StandingFitRow;

/** A species as it entered a stored fit. */
export type FitInput = Pick<MeanPoint, 'slug' | 'species' | 'x' | 'y' | 'n' | 'marks' | 'demonstration' | 'contributions'>;
/** A species that holds both values and stands outside the fit, with the reason. */
export type FitExclusion = FitInput & { reason: string };
export interface FitFlag {
  recordId: string;
  kind: Exclude<FlagKind, 'none'>;
  studentised: number | null;
  bonferroniP: number | null;
  reasons: string[];
}
export interface ComputedFit {
  definition: FitDefinition;
  inputs: FitInput[];
  exclusions: FitExclusion[];
  result: ScalingFitAnswer;
  flags: FitFlag[];
}

const massAndNeurons: readonly Question[] = ['cerebral_cortex', 'cerebellum', 'rest_of_brain'].flatMap((key) => [
  { y: 'structureMassG' as const, yStructure: key, x: 'neurons' as const, xStructure: key },
  { y: 'neurons' as const, yStructure: key, x: 'structureMassG' as const, xStructure: key },
]);
const massOnBody: readonly Question[] = ['whole_brain', 'brain_not_specified'].map((key) => ({ y: 'structureMassG' as const, yStructure: key, x: 'bodyMassG' as const, xStructure: null }));

/** Questions that the register keeps answering for every clade with enough species. */
export const standingQuestions: readonly Question[] = [...massAndNeurons, ...massOnBody];

const toInput = ({ slug, species, x, y, n, marks, demonstration, contributions }: MeanPoint): FitInput => ({ slug, species, x, y, n, marks, demonstration, contributions });
export const toFitPoint = (group: string) => ({ slug, x, y }: MeanPoint): FitPoint => ({ id: slug, group, x, y });

/**
 * Computes standing fits over species means.
 * @param rows rows of one version or of the working set
 * @param definitions the questions with their clades
 * @returns one computation a definition, in order; below five species the result carries `unfit`. Flags come from
 *   the least-squares fits at α = 0.05 and speak of every record that entered the flagged species' mean
 */
export function computeStandingFits(rows: readonly DatasetRow[], definitions: readonly FitDefinition[]): ComputedFit[] {
  const recordIds = new Map(rows.map(({ recordId, row }) => [row.number, recordId]));
  return definitions.map((definition) => {
    const found = speciesMeansFor(rows, definition);
    const inside = found.points.filter((point) => liesIn(point.lineage, { path: definition.cladePath }));
    const aside = found.aside.filter((point) => liesIn(point.lineage, { path: definition.cladePath }));
    const result = fitOne(definition, inside);
    return {
      definition,
      inputs: inside.map(toInput),
      exclusions: aside.map((point) => ({ ...toInput(point), reason: point.setAside ?? '' })),
      result,
      flags: definition.method === 'ols' ? flagsOf(result, inside, recordIds) : [],
    };
  });
}

function fitOne(definition: FitDefinition, inside: readonly MeanPoint[]): ScalingFitAnswer {
  const method = definition.method === 'sma' ? 'sma' : 'ols';
  const points = inside.map(toFitPoint(definition.cladeSlug));
  if (points.length < leastStandingSpecies) {
    const message = `${points.length === 1 ? 'One species holds' : `${points.length} species hold`} both values here; a fit that the register keeps needs ${leastStandingSpecies}.`;
    return toFitAnswer(unfitGroup(definition.cladeSlug, method, points, 0.95, { code: 'too-few-points', message }));
  }
  const [fit] = fitScaling({ points, method, against: statedExponents }).fits;
  if (fit === undefined) throw new Error('A fit of points gave no answer.');
  return toFitAnswer(fit);
}

function flagsOf(result: ScalingFitAnswer, inside: readonly MeanPoint[], recordIds: ReadonlyMap<string, string>): FitFlag[] {
  const bySlug = new Map(inside.map((point) => [point.slug, point]));
  return result.points.flatMap(({ id, flags, studentised, bonferroniP, reasons }) =>
    flags.flatMap((kind) => {
      if (kind === 'none') return [];
      return (bySlug.get(id)?.contributions ?? []).flatMap(({ record }) => {
        const recordId = recordIds.get(record);
        return recordId === undefined ? [] : [{ recordId, kind, studentised, bonferroniP, reasons }];
      });
    }),
  );
}

/**
 * Writes the definitions that the register keeps: every standing question by least squares and standardised major
 * axis, for each named clade with at least five species in the rows at hand. What was defined once stays.
 * @returns all active definitions in order of their address
 */
export async function ensureStandingFits(tx: Transaction, rows: readonly DatasetRow[]): Promise<FitDefinition[]> {
  const taxonomy = await loadTaxonomy(tx);
  const wanted = standingQuestions.flatMap((question) => {
    const { points } = speciesMeansFor(rows, question);
    return taxonomy.standing
      .filter((clade) => points.filter((point) => liesIn(point.lineage, clade)).length >= leastStandingSpecies)
      .flatMap((clade) => (['ols', 'sma'] as const).map((method) => ({ ...question, cladeId: clade.id, method, slug: standingFitSlug(question, clade.slug, method) })));
  });
  await insertStandingFits(tx, wanted);
  return findStandingFits(tx);
}

/**
 * Stores computed fits with their flags as results of one run, inside the caller's transaction.
 * @param target the working set (its results become the latest ones) or a version that is being prepared
 */
export async function storeStandingFits(tx: Transaction, runId: string, computed: readonly ComputedFit[], target: { set: 'working' } | { set: 'version'; versionId: string }): Promise<void> {
  const stored = await insertFitResults(
    tx,
    computed.map(({ definition, inputs, exclusions, result }) => ({
      runId,
      standingFitId: definition.id,
      set: target.set,
      versionId: target.set === 'version' ? target.versionId : null,
      latest: target.set === 'working',
      inputs,
      exclusions,
      result,
    })),
  );
  const resultIds = new Map(stored.map(({ id, standingFitId }) => [standingFitId, id]));
  await insertFlags(
    tx,
    computed.flatMap(({ definition, flags }) => {
      const fitResultId = resultIds.get(definition.id);
      return fitResultId === undefined ? [] : flags.map((flag) => ({ fitResultId, ...flag }));
    }),
  );
}
