import type { z } from 'zod';
import type { scalingQuerySchema } from '../../../shared/contracts/fits';
import type { FieldError } from '../../../shared/contracts/problems';
import type { Variable } from '../../../shared/contracts/vocabulary';
import type { TaxonNode } from '../../../db/queries/species';
import { AppError } from '../../errors';
import { isMadeFromTheOther, isSameOnBothAxes, type Question } from './questions';
import type { DatasetRow } from './rows';
import type { Taxonomy } from './taxonomy';

export type ScalingQuery = z.infer<typeof scalingQuerySchema>;

export interface ScalingQuestion extends Question {
  method: 'ols' | 'sma';
  level: number;
  /** Clades asked for; null where the asker leaves the choice to us. */
  clades: TaxonNode[] | null;
  /** Slugs of species left out on request. */
  without: string[];
}

const mostClades = 12;
const defaultStructure = 'cerebral_cortex';

/** A structure that is not said is that of the other axis. */
function structuresOf(query: ScalingQuery): { xStructure: string | null; yStructure: string | null } {
  const own = (variable: Variable, structure: string | undefined, other: string | undefined) => (variable === 'bodyMassG' ? null : (structure ?? other ?? defaultStructure));
  return { xStructure: own(query.x, query.xStructure, query.yStructure), yStructure: own(query.y, query.yStructure, query.xStructure) };
}

/**
 * Reads the query of a scaling question.
 * @param known structure keys, classification and rows that the names in it must belong to
 * @returns the question, with synonyms led on to their species
 * @throws invalid-input with every problem at once
 */
export function readScalingQuery(query: ScalingQuery, known: { structures: ReadonlySet<string>; taxonomy: Taxonomy; rows: readonly DatasetRow[] }): ScalingQuestion {
  const errors: FieldError[] = [];
  const refuse = (path: string, message: string) => errors.push({ path, message });
  const { xStructure, yStructure } = structuresOf(query);
  for (const [axis, variable, said, taken] of [['x', query.x, query.xStructure, xStructure], ['y', query.y, query.yStructure, yStructure]] as const) {
    if (variable === 'bodyMassG' && said !== undefined) refuse(`${axis}Structure`, `Body mass belongs to no structure; leave ${axis}Structure out, found "${said}"`);
    if (taken !== null && !known.structures.has(taken)) refuse(`${axis}Structure`, `Expected is the key of a structure, such as cerebral_cortex; found "${taken}"`);
  }
  const question: Question = { x: query.x, xStructure, y: query.y, yStructure };
  if (isSameOnBothAxes(question)) refuse('x', `x and y are the same; found "${query.x}" twice`);
  if (query.method === 'sma' && isMadeFromTheOther(question)) refuse('method', 'One of the two is made from the other, so a standardised major axis has no meaning; expected is "ols", found "sma"');
  if (query.clades.length > mostClades) refuse('clades', `At most ${mostClades} clades stand in one figure; found ${query.clades.length}`);
  const clades = [...new Set(query.clades)].flatMap((slug) => {
    const node = known.taxonomy.resolve(slug)?.node;
    if (node === undefined) refuse('clades', `Expected is the address of a clade, such as primates; found "${slug}"`);
    return node ?? [];
  });
  const slugs = new Set(known.rows.map(({ row }) => row.taxonSlug));
  const without = [...new Set(query.without)].map((slug) => (slugs.has(slug) ? slug : (known.taxonomy.resolve(slug)?.node.slug ?? slug)));
  for (const slug of without) if (!slugs.has(slug)) refuse('without', `Expected is the address of a species of this version; found "${slug}"`);
  if (errors.length > 0) throw new AppError('invalid-input', `${errors.length === 1 ? 'One entry' : `${errors.length} entries`} of the query cannot be used.`, { errors });
  return { ...question, method: query.method, level: query.level, clades: clades.length === 0 ? null : clades, without };
}
