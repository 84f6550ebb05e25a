import { findDefinedStructures, findTaxaInPlace, type DefinedStructure, type TaxonInPlace } from '../../../db/queries/recordVocabulary';
import type { Queryable } from '../../../db/client';
import type { SubmissionContent } from '../../../shared/contracts/content';
import { taxonSlugsOf } from './contentFacts';

/** What the register knows of the taxa and structures that a content names. */
export interface ContentVocabulary {
  taxa: ReadonlyMap<string, TaxonInPlace>;
  structures: ReadonlyMap<string, DefinedStructure>;
}

/** Reads the taxa and structures that contents name; a synonym's slug answers its taxon. */
export async function readVocabulary(db: Queryable, contents: readonly SubmissionContent[]): Promise<ContentVocabulary> {
  const taxa = await findTaxaInPlace(db, contents.flatMap(taxonSlugsOf));
  return { taxa, structures: await findDefinedStructures(db) };
}
