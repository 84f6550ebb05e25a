import { z } from 'zod';
import { checkLevelSchema } from './vocabulary';

/** One quality check with its figure and limit, as shown in a check list. */
export const checkResultSchema = z.object({
  /** Stable kebab-case name of the check. */
  code: z.string(),
  level: checkLevelSchema,
  /** Field path in the content, for example `structures.0.samples.1.aliquots.2.nuclei`; empty for the whole. */
  path: z.string().default(''),
  message: z.string(),
  figure: z.string().nullable(),
  limit: z.string().nullable(),
});
export type CheckResult = z.infer<typeof checkResultSchema>;
