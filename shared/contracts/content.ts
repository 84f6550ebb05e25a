import { z } from 'zod';
import {
  ageClasses,
  approvalKinds,
  bodyMassKinds,
  centreKinds,
  countingMethods,
  delineationCriteria,
  exclusionReasons,
  fixations,
  massStates,
  nameQualifiers,
  origins,
  overlapKinds,
  scaleUpKinds,
  sexes,
  sides,
  spreadKinds,
} from './vocabulary';

/**
 * What a contributor enters, kept as entered. These schemas hold the SHAPE only and accept a half-filled
 * draft: every text may be empty and every choice null. Whether it may be submitted is said by the checks
 * of shared/domain/checks, which name every missing or impossible field at once by its path.
 */
const shortText = z.string().max(200).default('');
const longText = z.string().max(4000).default('');
const dateText = z.string().max(10).default(''); // ISO date, or a year alone for human donors

/** A number as it was typed and its unit; the canonical number is derived by shared/domain/units. */
export const enteredSchema = z.object({ text: z.string().max(60).default(''), unit: z.string().max(20).default('') });
export type Entered = z.infer<typeof enteredSchema>;
const entered = (unit: string) => enteredSchema.default({ text: '', unit });

export const aliquotEntrySchema = z.object({
  /** Nuclei counted in this chamber load. */
  nuclei: z.string().max(20).default(''),
  /** Squares counted in this load; the counted volume is squares × volume of one square. */
  squares: z.string().max(10).default(''),
  excluded: z.enum(exclusionReasons).nullable().default(null),
  note: shortText,
});

export const neunFieldEntrySchema = z.object({
  positive: z.string().max(20).default(''),
  total: z.string().max(20).default(''),
});

export const sampleEntrySchema = z.object({
  /** Stable within the document, so that comments and revisions can point at it. */
  id: z.string().min(1).max(40),
  label: shortText,
  side: z.enum(sides).nullable().default(null),
  tissueMass: entered('g'),
  /** Samples that carry the same suspension label share the errors of its volume and dilution. */
  suspension: shortText,
  suspensionVolume: entered('mL'),
  suspensionVolumeSe: entered('mL'),
  dilution: z.string().max(20).default('1'),
  dilutionSe: z.string().max(20).default(''),
  scaleUp: z
    .object({
      kind: z.enum(scaleUpKinds).default('none'),
      factor: z.string().max(20).default('1'),
      factorSe: z.string().max(20).default(''),
    })
    .default({ kind: 'none', factor: '1', factorSe: '' }),
  chamber: z
    .object({
      key: z.string().max(60).default('improved-neubauer'),
      /** Volume of one square; empty for a chamber whose volume is known. */
      squareVolume: entered('µL'),
    })
    .default({ key: 'improved-neubauer', squareVolume: { text: '', unit: 'µL' } }),
  aliquots: z.array(aliquotEntrySchema).max(60).default([]),
  neun: z.array(neunFieldEntrySchema).max(200).default([]),
  /** Codes of further animals pooled in this sample. */
  pooledWith: z.array(z.string().max(60)).max(200).default([]),
  countedOn: dateText,
  observer: shortText,
  secondObserver: shortText,
  antibodyRrid: shortText,
  note: longText,
});
export type SampleEntry = z.infer<typeof sampleEntrySchema>;

export const structureEntrySchema = z.object({
  id: z.string().min(1).max(40),
  /** Structure key, for example `cerebral_cortex`; empty while it is not chosen. */
  structure: z.string().max(80).default(''),
  definitionVersion: z.number().int().min(1).default(1),
  /** Weighed mass of the whole structure, where it was weighed apart from its samples. */
  mass: entered('g'),
  delineation: z.array(z.enum(delineationCriteria)).max(6).default([]),
  delineationNote: longText,
  samples: z.array(sampleEntrySchema).max(60).default([]),
  note: longText,
});
export type StructureEntry = z.infer<typeof structureEntrySchema>;

export const nameEntrySchema = z.object({
  nameAsEntered: shortText,
  qualifier: z.enum(nameQualifiers).default('none'),
  /** Slug of the taxon chosen from the register; empty while none is chosen. */
  taxon: z.string().max(120).default(''),
});

export const provenanceEntrySchema = z.object({
  published: z.boolean().default(false),
  doi: shortText,
  citation: longText,
  protocolDoi: shortText,
  approvalKind: z.enum(approvalKinds).nullable().default(null),
  approvalText: shortText,
  /** CITES and Nagoya permits and the like, where they apply. */
  permits: shortText,
  licenceAccepted: z.boolean().default(false),
  embargoUntil: dateText,
  /** Sources that hold some of the same animals. */
  sharesAnimalsWith: z
    .array(z.object({ source: z.string().max(200), overlap: z.enum(overlapKinds) }))
    .max(20)
    .default([]),
});

/** A contributor's word on a doubtful check: check code and path → explanation. */
export const explanationsSchema = z.record(z.string().max(200), z.string().max(2000)).default({});

export const specimenContentSchema = z.object({
  kind: z.literal('specimen'),
  specimen: nameEntrySchema.extend({
    code: z.string().max(60).default(''),
    origin: z.enum(origins).nullable().default(null),
    strain: shortText,
    sex: z.enum(sexes).nullable().default(null),
    ageClass: z.enum(ageClasses).nullable().default(null),
    ageDays: z.string().max(20).default(''),
    bodyMass: entered('g'),
    bodyMassKind: z.enum(bodyMassKinds).nullable().default(null),
    diedOn: dateText,
    fixedOn: dateText,
    locality: shortText,
    voucher: shortText,
  }),
  massState: z.enum(massStates).nullable().default(null),
  fixation: z.enum(fixations).nullable().default(null),
  postMortemIntervalH: z.string().max(20).default(''),
  storageDays: z.string().max(20).default(''),
  method: z.enum(countingMethods).nullable().default('isotropic fractionation, by eye'),
  structures: z.array(structureEntrySchema).max(60).default([]),
  provenance: provenanceEntrySchema,
  explanations: explanationsSchema,
  note: longText,
});
export type SpecimenContent = z.infer<typeof specimenContentSchema>;

/** One value as printed, with what kind of centre and spread the paper gives. */
export const literatureNumberSchema = z.object({
  text: z.string().max(60).default(''),
  unit: z.string().max(20).default(''),
  centre: z.enum(centreKinds).default('not-stated'),
  spreadText: z.string().max(60).default(''),
  spreadKind: z.enum(spreadKinds).default('not-stated'),
  /** Number of animals, empty where the paper does not say. */
  n: z.string().max(10).default(''),
});
export type LiteratureNumber = z.infer<typeof literatureNumberSchema>;
const literatureNumber = (unit: string) =>
  literatureNumberSchema.default({ text: '', unit, centre: 'not-stated', spreadText: '', spreadKind: 'not-stated', n: '' });

export const literatureValueSchema = nameEntrySchema.extend({
  id: z.string().min(1).max(40),
  structure: z.string().max(80).default(''),
  definitionVersion: z.number().int().min(1).default(1),
  origin: z.enum(origins).nullable().default(null),
  massState: z.enum(massStates).nullable().default(null),
  method: z.enum(countingMethods).nullable().default(null),
  bodyMass: literatureNumber('g'),
  structureMass: literatureNumber('g'),
  cells: literatureNumber('count'),
  neurons: literatureNumber('count'),
  otherCells: literatureNumber('count'),
  /** Where in the source: table, figure, page. */
  place: shortText,
  /** What the source prints, where it differs from what is used, and why. */
  printedDifferently: longText,
  note: longText,
});
export type LiteratureValueEntry = z.infer<typeof literatureValueSchema>;

export const literatureContentSchema = z.object({
  kind: z.literal('literature'),
  source: z.object({
    doi: shortText,
    citation: z.string().max(1000).default(''),
    year: z.string().max(4).default(''),
    sharesAnimalsWith: z
      .array(z.object({ source: z.string().max(200), overlap: z.enum(overlapKinds) }))
      .max(20)
      .default([]),
  }),
  values: z.array(literatureValueSchema).max(400).default([]),
  provenance: provenanceEntrySchema,
  explanations: explanationsSchema,
  note: longText,
});
export type LiteratureContent = z.infer<typeof literatureContentSchema>;

export const submissionContentSchema = z.discriminatedUnion('kind', [specimenContentSchema, literatureContentSchema]);
export type SubmissionContent = z.infer<typeof submissionContentSchema>;
