import type { Variable } from '../contracts/vocabulary';

export type Overlap = 'none' | 'same' | 'partly' | 'unknown';

/** What a record was set aside for: everything, or one pair of variables, either one on x. */
export type SetAsideScope = 'all' | { x: Variable; xStructure?: string | null; y: Variable; yStructure?: string | null };

/** One record as the species means need it: values canonical (g, counts, per mg), null where not held. */
export interface MeanInput {
  recordNumber: string;
  taxonSlug: string;
  /** Binomial or name at genus level; empty for an unnamed species, which enters no mean. */
  speciesName: string;
  /** The register's marks, kept with the mean. */
  marks?: { domestic?: boolean; strain?: boolean; hybrid?: boolean; genusLevel?: boolean; demonstration?: boolean };
  /** A publication, or one lab's own specimens. */
  sourceKey: string;
  sourceKind: 'literature' | 'specimen';
  /** The animal, or the group of animals of a pooled sample; null for a mean of a publication. */
  specimenKey: string | null;
  /** Animals behind the record: 1 for a specimen; null where a source does not say. */
  n: number | null;
  structure: string;
  definitionVersion: number | string;
  composition: string;
  values: Readonly<Record<Variable, number | null>>;
  setAside: readonly { scope: SetAsideScope; reason: string }[];
  sharesAnimalsWith: readonly { sourceKey: string; overlap: Overlap }[];
  year: number | null;
  /** What a fit must say when it mixes them. */
  massState?: string | null;
  countingMethod?: string | null;
  delineation?: string | null;
}

/** A variable of a structure; body mass has no structure. */
export interface AxisQuestion {
  variable: Variable;
  structure: string | null;
  /** Matched exactly where given; else the definition that most species carry is taken. */
  definitionVersion?: number | string;
  composition?: string;
}

export interface PairQuestion {
  x: AxisQuestion;
  y: AxisQuestion;
}

export interface MeanContribution {
  recordNumber: string;
  /** Which value the record gives. */
  axis: 'x' | 'y' | 'both';
  sourceKey: string;
  specimenKey: string | null;
  n: number | null;
  /** Share in the mean of its species; the shares of one axis sum to 1. */
  weight: number;
  x: number;
  y: number;
}

export interface SpeciesMean {
  taxonSlug: string;
  speciesName: string;
  x: number;
  y: number;
  contributions: MeanContribution[];
  /** Independent sources, and animals over them; null where any is unknown. */
  sources: number;
  n: number | null;
  weighting: 'animals' | 'equal';
  /** True where one specimen alone stands for the species. */
  isSingleSpecimen: boolean;
  marks: string[];
  massStates: string[];
  countingMethods: string[];
  delineations: string[];
  /** Reason, where every record of the species is set aside for this pair: drawn hollow, fitted never. */
  setAside?: string;
}

export interface LeftOut {
  taxonSlug: string;
  recordNumber: string;
  reason: string;
}

export interface SpeciesMeans {
  means: SpeciesMean[];
  leftOut: LeftOut[];
  definitions: { x: string | null; y: string | null };
  /** Why there is no mean at all; null where there is one. */
  emptyReason: string | null;
}
