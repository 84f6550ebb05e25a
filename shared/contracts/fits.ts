import { z } from 'zod';
import { fitMethodSchema, flagKindSchema, variables } from './vocabulary';

const nullableNumber = z.number().nullable();
const interval = z.object({ lower: nullableNumber, upper: nullableNumber });
const parameter = z.object({ estimate: z.number(), standardError: nullableNumber, lower: nullableNumber, upper: nullableNumber });

export const fitPointSchema = z.object({
  id: z.string(),
  x: z.number(),
  y: z.number(),
  fittedLog10: nullableNumber,
  residual: nullableNumber,
  studentised: nullableNumber.meta({ description: 'Externally studentised residual' }),
  leverage: nullableNumber,
  cooksDistance: nullableNumber,
  bonferroniP: nullableNumber,
  flag: flagKindSchema,
  flags: z.array(flagKindSchema),
  reasons: z.array(z.string()),
});

export const scalingFitSchema = z.object({
  group: z.string().nullable(),
  n: z.number().int(),
  df: z.number().int().nullable(),
  method: fitMethodSchema,
  exponent: parameter.nullable(),
  log10Coefficient: parameter.nullable(),
  rSquared: nullableNumber,
  residualSd: nullableNumber,
  logLikelihood: nullableNumber,
  aic: nullableNumber,
  smearingFactor: nullableNumber,
  lambda: z.object({ estimate: z.number(), lower: nullableNumber, upper: nullableNumber, atBound: z.boolean() }).nullable(),
  bootstrap: z.object({ lower: z.number(), upper: z.number(), replicates: z.number(), seed: z.number() }).nullable(),
  /** `statistic` is t (least squares) or F on 1 and `df` (SMA); null with its p where nothing is left to test. */
  tests: z.array(z.object({ exponent: z.number(), statistic: nullableNumber, df: z.number(), p: nullableNumber })),
  /** Null where the method does not predict; `notes` says why. */
  predictions: z.array(z.object({ x: z.number(), estimate: nullableNumber, confidence: interval, prediction: interval, extrapolated: z.boolean().optional() })).nullable(),
  points: z.array(fitPointSchema),
  xRange: z.object({ lower: z.number(), upper: z.number() }).nullable(),
  leaveOneOut: z.object({ lower: z.number(), upper: z.number(), mostMoving: z.string() }).nullable(),
  unfit: z.object({ code: z.string(), message: z.string() }).nullable(),
  /** Why a field is null, and what else the reader should know of this fit. */
  notes: z.array(z.string()).optional(),
  /** What a figure needs to draw line and bands without refitting: log10 x. */
  design: z.object({ meanLog10X: z.number(), sxx: z.number(), tCritical: nullableNumber, level: z.number() }).nullable(),
});
export type ScalingFitAnswer = z.infer<typeof scalingFitSchema>;

export const fitsAnswerSchema = z.object({
  fits: z.array(scalingFitSchema),
  comparison: z.null(),
  match: z.null(),
});

export const fitsRequestSchema = z.object({
  points: z
    .array(z.object({ id: z.string().min(1).max(200), group: z.string().max(200).nullish(), x: z.number().positive(), y: z.number().positive() }))
    .min(1)
    .max(5000),
  method: z.enum(['ols', 'sma']).default('ols'),
  level: z.number().gt(0.5).lt(1).default(0.95),
  against: z.array(z.number()).max(20).default([]),
  predictAt: z.array(z.number().positive()).max(200).default([]),
});
export type FitsRequest = z.infer<typeof fitsRequestSchema>;

const slugList = z
  .string()
  .max(4000)
  .default('')
  .transform((text) => text.split(',').map((part) => part.trim()).filter((part) => part !== ''));

export const scalingQuerySchema = z.object({
  version: z.string().max(10).optional(),
  x: z.enum(variables).default('neurons'),
  xStructure: z.string().max(80).optional(),
  y: z.enum(variables).default('structureMassG'),
  yStructure: z.string().max(80).optional(),
  clades: slugList,
  method: z.enum(['ols', 'sma']).default('ols'),
  level: z.coerce.number().gt(0.5).lt(1).default(0.95),
  without: slugList,
});

/** One species mean as it entered the fit: which records, with which weights. */
export const speciesPointSchema = z.object({
  slug: z.string(),
  species: z.string(),
  clade: z.string(),
  x: z.number(),
  y: z.number(),
  n: z.number().int().nullable(),
  marks: z.array(z.string()),
  demonstration: z.boolean(),
  contributions: z.array(z.object({ record: z.string(), weight: z.number(), source: z.string() })),
  /** Reason, where the species is listed and drawn but left out of the fit. */
  setAside: z.string().nullable(),
});

export const scalingAnswerSchema = fitsAnswerSchema.extend({
  version: z.string(),
  question: z.object({
    y: z.enum(variables),
    yStructure: z.string().nullable(),
    x: z.enum(variables),
    xStructure: z.string().nullable(),
    method: fitMethodSchema,
    level: z.number(),
  }),
  /** Clades in the order asked, with a title and the standing slug; a fit's `group` is the clade's slug. */
  clades: z.array(z.object({ slug: z.string(), name: z.string(), species: z.number().int() })),
  /** Clades that can be chosen for this question, with the number of species that hold both values. */
  available: z.array(z.object({ slug: z.string(), name: z.string(), rank: z.string(), species: z.number().int(), standing: z.boolean() })),
  species: z.array(speciesPointSchema),
  /** Plain sentences, one or more a clade, that say what the exponents mean. */
  sentences: z.array(z.object({ clade: z.string(), text: z.string() })),
  /** Remarks on what is mixed or left out: mass states, delineations, methods, demonstration data. */
  remarks: z.array(z.string()),
  demonstration: z.boolean(),
});
export type ScalingAnswer = z.infer<typeof scalingAnswerSchema>;

/** Place of one species or record against its clade's line fitted without it. */
export const placeSchema = z.object({
  clade: z.string(),
  cladeName: z.string(),
  fit: z.string().meta({ description: 'Slug of the standing fit' }),
  y: z.enum(variables),
  yStructure: z.string().nullable(),
  x: z.enum(variables),
  xStructure: z.string().nullable(),
  n: z.number().int(),
  ratio: z.number(),
  lowerRatio: z.number(),
  upperRatio: z.number(),
  inside: z.boolean(),
  extrapolated: z.boolean(),
  level: z.number(),
  sentence: z.string(),
});
export type Place = z.infer<typeof placeSchema>;

export const flagViewSchema = z.object({
  id: z.string(),
  kind: z.enum(['watch', 'outlier', 'influential']),
  fit: z.string(),
  fitTitle: z.string(),
  set: z.enum(['working', 'version']),
  version: z.string().nullable(),
  studentised: nullableNumber,
  bonferroniP: nullableNumber,
  reasons: z.array(z.string()),
  record: z.string(),
  species: z.string(),
  structure: z.string(),
  at: z.string(),
});
export type FlagView = z.infer<typeof flagViewSchema>;
