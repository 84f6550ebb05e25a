import { z } from 'zod';
import { checkResultSchema } from './checks';
import { estimateSchema } from './common';
import { scaleUpKinds } from './vocabulary';

const positive = z.number().positive();

export const estimateRequestSchema = z.object({
  tissueMassG: positive.nullish().meta({ description: 'Mass of what was dissociated, g' }),
  suspensionVolumeMl: positive.meta({ description: 'Suspension volume, mL' }),
  suspensionVolumeSe: z.number().nonnegative().optional(),
  dilution: z.number().min(1).default(1).meta({ description: 'Final ÷ original volume' }),
  dilutionSe: z.number().nonnegative().optional(),
  scaleUp: z
    .object({ kind: z.enum(scaleUpKinds), factor: positive.default(1), factorSe: z.number().nonnegative().default(0) })
    .default({ kind: 'none', factor: 1, factorSe: 0 }),
  aliquots: z
    .array(
      z.object({
        nuclei: z.number().int().nonnegative(),
        volumeMl: positive,
        volumeSe: z.number().nonnegative().optional(),
        excluded: z.string().max(200).nullish(),
      }),
    )
    .min(1)
    .max(200),
  neun: z
    .union([
      z
        .object({ positive: z.number().int().nonnegative(), total: z.number().int().positive() })
        .refine((count) => count.positive <= count.total, { message: 'NeuN-positive nuclei cannot be more than the nuclei scored', path: ['positive'] }),
      z.object({
        fields: z
          .array(
            z
              .object({ positive: z.number().int().nonnegative(), total: z.number().int().positive() })
              .refine((count) => count.positive <= count.total, { message: 'NeuN-positive nuclei cannot be more than the nuclei scored', path: ['positive'] }),
          )
          .min(1)
          .max(500),
      }),
    ])
    .nullish(),
  targetCv: z.number().positive().max(1).default(0.05),
});
export type EstimateRequest = z.infer<typeof estimateRequestSchema>;

export const estimateAnswerSchema = z.object({
  structureMassG: z.number().nullable(),
  cells: estimateSchema,
  neurons: estimateSchema,
  otherCells: estimateSchema,
  cellsPerMg: estimateSchema,
  neuronsPerMg: estimateSchema,
  neuronFraction: z.object({ value: z.number().nullable(), lower: z.number().nullable(), upper: z.number().nullable() }),
  aliquotCv: z.number().nullable(),
  poissonCv: z.number().nullable(),
  dispersion: z.object({ statistic: z.number(), df: z.number().int(), p: z.number() }).nullable(),
  /** Null where no aliquot is left to count. */
  standardErrorKind: z.enum(['between-aliquots', 'counting']).nullable(),
  aliquotsForTargetCv: z.number().int().nullable(),
  aliquotsStillNeeded: z.number().int().nullable(),
  checks: z.array(checkResultSchema),
});
export type EstimateAnswer = z.infer<typeof estimateAnswerSchema>;
