import type { Variable } from '../../contracts/vocabulary';

/** The place of one entry against its clade's line, fitted without its species, as the unit slip needs it. */
export interface LineOfEntry {
  /** Path of the entry: `structures.0` or `values.3`. */
  path: string;
  cladeName: string;
  x: Variable;
  xStructure: string | null;
  y: Variable;
  yStructure: string | null;
  exponent: number;
  /** log10 of y over the line. */
  log10Ratio: number;
  residualSd: number;
  /** Within the 95 % prediction interval. */
  inside: boolean;
}

/** What the register holds of another specimen of the same species. */
export interface OtherSpecimen {
  code: string;
  structure: string;
  neurons: number | null;
}

/** What only the server knows; every member but the date may be missing, its checks then do not apply. */
export interface CheckContext {
  /** Today as an ISO date. */
  today: string;
  lines?: readonly LineOfEntry[];
  otherSpecimens?: readonly OtherSpecimen[];
  /** Codes of other animals of the same lab. */
  labSpecimenCodes?: readonly string[];
  /** Criteria by which the register's records of a structure are delineated, by structure key. */
  delineations?: Readonly<Record<string, readonly string[]>>;
  /** Parts of a structure, by its key, beyond the four gross parts of a brain. */
  parts?: Readonly<Record<string, readonly string[]>>;
  /** ORCID iDs that stand beside the content, with their paths. */
  orcids?: readonly { path: string; text: string }[];
}
