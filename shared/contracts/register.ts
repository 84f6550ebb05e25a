import { z } from 'zod';
import { waitingItemSchema } from './account';
import { pageQuery, personRefSchema, timeSchema } from './common';
import { flagViewSchema, placeSchema } from './fits';
import { recordRowSchema, setAsideSchema } from './records';

/** One standing exponent, as tables show it. */
export const standingExponentSchema = z.object({
  slug: z.string(),
  title: z.string(),
  y: z.string(),
  yStructure: z.string().nullable(),
  x: z.string(),
  xStructure: z.string().nullable(),
  clade: z.string(),
  cladeName: z.string(),
  method: z.string(),
  n: z.number().int(),
  exponent: z.number().nullable(),
  lower: z.number().nullable(),
  upper: z.number().nullable(),
  standardError: z.number().nullable(),
  residualSd: z.number().nullable(),
  rSquared: z.number().nullable(),
  log10Coefficient: z.number().nullable(),
  /** Exponent of the same fit in the previous version, null where there was none. */
  previous: z.number().nullable(),
  previousN: z.number().int().nullable(),
  previousLower: z.number().nullable(),
  previousUpper: z.number().nullable(),
  unfit: z.string().nullable(),
});
export type StandingExponent = z.infer<typeof standingExponentSchema>;

/** GET /register: what the first screen shows. */
export const registerSchema = z.object({
  version: z
    .object({ label: z.string(), title: z.string(), doi: z.string().nullable(), frozenAt: timeSchema, sha256: z.string(), demonstration: z.boolean() })
    .nullable(),
  counts: z.object({ species: z.number().int(), records: z.number().int(), specimens: z.number().int(), structures: z.number().int(), sources: z.number().int(), labs: z.number().int() }),
  exponents: z.array(standingExponentSchema.extend({ strokes: z.array(z.object({ species: z.string(), slug: z.string(), x: z.number(), isNew: z.boolean(), setAside: z.boolean() })) })),
  newest: z.array(z.object({ number: z.string(), species: z.string(), slug: z.string(), structure: z.string(), neurons: z.number().nullable(), neuronsError: z.number().nullable(), structureMassG: z.number().nullable(), place: placeSchema.nullable(), clade: z.string().nullable(), source: z.string(), at: z.string(), demonstration: z.boolean() })),
  waiting: z.array(waitingItemSchema),
  since: z.object({ previous: z.string().nullable(), speciesCame: z.number().int(), recordsCame: z.number().int(), recordsRevised: z.number().int(), setAside: z.number().int(), withdrawn: z.number().int() }).nullable(),
  versions: z.array(z.object({ label: z.string(), frozenAt: timeSchema, records: z.number().int(), species: z.number().int() })),
});
export type Register = z.infer<typeof registerSchema>;

export const structureSchema = z.object({
  key: z.string(),
  name: z.string(),
  parent: z.string().nullable(),
  animalClass: z.string().nullable(),
  midline: z.boolean(),
  byComplement: z.boolean(),
  definitions: z.array(z.object({ version: z.number().int(), includes: z.array(z.string()), excludes: z.array(z.string()), note: z.string(), uberonId: z.string().nullable(), uberonMatch: z.string().nullable() })),
});
export type Structure = z.infer<typeof structureSchema>;

export const taxonSchema = z.object({
  id: z.string(),
  slug: z.string(),
  name: z.string(),
  rank: z.string(),
  path: z.string(),
  commonNames: z.array(z.string()),
  synonyms: z.array(z.string()),
  identifiers: z.array(z.object({ authority: z.string(), identifier: z.string() })),
  authority: z.string(),
  named: z.boolean(),
  status: z.enum(['proposed', 'accepted', 'refused']),
  demonstration: z.boolean(),
  species: z.number().int().meta({ description: 'Species below this node' }),
});
export type Taxon = z.infer<typeof taxonSchema>;
export const taxaQuerySchema = z.object({ query: z.string().max(200).default(''), rank: z.string().max(40).optional(), status: z.enum(['proposed', 'accepted', 'refused']).optional(), ...pageQuery });
export const taxonProposalSchema = z.object({ name: z.string().trim().min(3).max(120), rank: z.string().trim().min(3).max(40), parent: z.string().trim().min(1).max(120), authority: z.string().trim().max(400).default(''), demonstration: z.boolean().default(false) });
export const taxonDecisionSchema = z.object({ decision: z.enum(['accept', 'refuse']), reason: z.string().trim().max(1000).default('') });
/** A former or alternative name; its address leads on to the taxon. */
export const synonymCreateSchema = z.object({ name: z.string().trim().min(3).max(120), reason: z.string().trim().min(1, 'Say where the name is used, or since when it is not').max(1000) });
/** A phylogeny as lists show it. */
export const treeItemSchema = z.object({ id: z.string(), name: z.string(), tips: z.number().int(), dated: z.boolean(), source: z.string().nullable() });

export const speciesQuerySchema = z.object({
  query: z.string().max(200).default(''),
  clade: z.string().max(120).optional(),
  structure: z.string().max(80).optional(),
  version: z.string().max(10).optional(),
  sort: z.enum(['name', '-name', 'records', '-records', 'neurons', '-neurons', 'mass', '-mass']).default('name'),
  ...pageQuery,
});
export const speciesItemSchema = z.object({
  slug: z.string(),
  species: z.string(),
  commonNames: z.array(z.string()),
  clade: z.string(),
  cladeName: z.string(),
  order: z.string(),
  records: z.number().int(),
  structures: z.array(z.string()),
  brainMassG: z.number().nullable(),
  bodyMassG: z.number().nullable(),
  cortexNeurons: z.number().nullable(),
  flagged: z.boolean(),
  demonstration: z.boolean(),
});
export type SpeciesItem = z.infer<typeof speciesItemSchema>;

export const speciesPageSchema = z.object({
  version: z.string(),
  slug: z.string(),
  /** Slug asked for, where it was a synonym that led here. */
  from: z.string().nullable(),
  species: z.string(),
  commonNames: z.array(z.string()),
  synonyms: z.array(z.string()),
  lineage: z.array(z.object({ name: z.string(), slug: z.string() })),
  clade: z.string(),
  cladeName: z.string(),
  named: z.boolean(),
  demonstration: z.boolean(),
  structures: z.array(
    z.object({
      key: z.string(),
      name: z.string(),
      mean: z.object({ structureMassG: z.number().nullable(), cells: z.number().nullable(), neurons: z.number().nullable(), otherCells: z.number().nullable(), neuronsPerMg: z.number().nullable(), bodyMassG: z.number().nullable(), n: z.number().int().nullable(), structureMassError: z.number().nullable(), cellsError: z.number().nullable(), neuronsError: z.number().nullable(), otherCellsError: z.number().nullable(), errorKind: z.string() }),
      place: placeSchema.nullable(),
      /** Why there is no place on a line. */
      noPlace: z.string().nullable(),
      records: z.array(recordRowSchema),
    }),
  ),
  flags: z.array(flagViewSchema),
  sources: z.array(z.object({ key: z.string(), citation: z.string(), doi: z.string().nullable(), year: z.number().int().nullable() })),
});
export type SpeciesPage = z.infer<typeof speciesPageSchema>;

export const recordsQuerySchema = z.object({ version: z.string().max(10).optional(), clade: z.string().max(120).optional(), structure: z.string().max(80).optional(), species: z.string().max(120).optional(), ...pageQuery });

export const trailItemSchema = z.object({ at: timeSchema, what: z.string(), who: z.string(), why: z.string(), current: z.boolean().default(false) });
export type TrailItem = z.infer<typeof trailItemSchema>;

export const recordPageSchema = z.object({
  id: z.string(),
  row: recordRowSchema,
  version: z.string().nullable(),
  /** True where the row shown is of the working set and stands in no version yet. */
  working: z.boolean(),
  withdrawn: z.string().nullable(),
  structureName: z.string(),
  cladeName: z.string(),
  inVersions: z.array(z.string()),
  revisions: z.array(z.object({ revision: z.number().int(), at: timeSchema })),
  trail: z.array(trailItemSchema),
  flags: z.array(flagViewSchema),
  places: z.array(placeSchema),
  setAside: z.array(setAsideSchema),
  rechecks: z.array(z.object({ id: z.string(), status: z.string(), question: z.string(), at: timeSchema })),
  /** What the person who asks may do here. */
  may: z.object({ askRecheck: z.boolean(), setAside: z.boolean(), revise: z.string().nullable() }),
  samples: z.array(z.object({ label: z.string(), side: z.string(), tissueMassG: z.number().nullable(), suspensionVolumeMl: z.number(), dilution: z.number(), aliquots: z.array(z.object({ nuclei: z.number(), volumeMl: z.number(), excluded: z.string().nullable() })), neun: z.array(z.object({ positive: z.number(), total: z.number() })) })),
  contributors: z.array(personRefSchema),
});
export type RecordPage = z.infer<typeof recordPageSchema>;
