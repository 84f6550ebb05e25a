import type { SubmissionContent } from '../../../shared/contracts/content';
import { specimenContentSchema, literatureContentSchema } from '../../../shared/contracts/content';
import type { TaxonInPlace } from '../../../db/queries/recordVocabulary';
import { standingCladeNames } from '../dataset/taxonomy';

/** Slugs of all taxa that a content names, in order, once each. */
export function taxonSlugsOf(content: SubmissionContent): string[] {
  const slugs = content.kind === 'specimen' ? [content.specimen.taxon] : content.values.map((value) => value.taxon);
  return [...new Set(slugs.filter((slug) => slug !== ''))];
}

/** Keys of all structures that a content names, in order, once each. */
export function structureKeysOf(content: SubmissionContent): string[] {
  const keys = content.kind === 'specimen' ? content.structures.map((entry) => entry.structure) : content.values.map((entry) => entry.structure);
  return [...new Set(keys.filter((key) => key !== ''))];
}

/** An empty form of a kind. */
export function emptyContent(kind: SubmissionContent['kind']): SubmissionContent {
  if (kind === 'specimen') return specimenContentSchema.parse({ kind, specimen: {}, provenance: {} });
  return literatureContentSchema.parse({ kind, source: {}, provenance: {} });
}

/** The clade a species is listed under: the lowest one with standing fits, else its order, else nothing. */
export function cladeOf(taxon: TaxonInPlace | null): { slug: string; name: string } | null {
  const nodes = taxon?.lineage ?? [];
  const node = nodes.findLast(({ name }) => standingCladeNames.some((known) => known === name)) ?? nodes.findLast(({ rank }) => rank === 'order');
  return node === undefined ? null : { slug: node.slug, name: node.name };
}

/** Species, code and title of a submission as lists show it. */
export function headingOf(content: SubmissionContent, taxa: ReadonlyMap<string, TaxonInPlace>): { title: string; species: string; code: string } {
  if (content.kind === 'specimen') {
    const { taxon, nameAsEntered, code } = content.specimen;
    const species = taxa.get(taxon)?.name ?? nameAsEntered;
    return { title: [species, code].filter((part) => part !== '').join(', ') || 'Specimen without a name yet', species, code };
  }
  const names = [...new Set(content.values.map((value) => taxa.get(value.taxon)?.name ?? value.nameAsEntered).filter((name) => name !== ''))];
  const species = names.length > 1 ? `${names.length} species` : (names[0] ?? '');
  const title = content.source.citation || (content.source.doi === '' ? 'Source without a name yet' : `doi:${content.source.doi}`);
  return { title, species, code: '' };
}
