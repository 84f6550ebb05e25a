import { readFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';
import { ageClasses, origins, roles, sexes } from '../../../shared/contracts/vocabulary';

const sampleSchema = z.object({
  id: z.string(),
  side: z.enum(['left', 'right', 'both']),
  tissueMass: z.string(),
  volumeMl: z.string(),
  dilution: z.string(),
  /** One side was counted and is scaled to both. */
  doubled: z.boolean(),
  squares: z.number().int(),
  /** Nuclei of each aliquot, parted by blanks. */
  counts: z.string(),
  /** NeuN-positive of all nuclei scored, a field each. */
  neun: z.string(),
});

const entrySchema = z.object({
  key: z.string(),
  by: z.string(),
  reviewer: z.string(),
  taxon: z.string(),
  code: z.string(),
  bodyMassG: z.string(),
  sex: z.enum(sexes).nullable(),
  origin: z.enum(origins).nullable(),
  ageClass: z.enum(ageClasses).nullable(),
  diedOn: z.string(),
  fixedOn: z.string(),
  countedOn: z.string(),
  note: z.string(),
  structures: z.array(z.object({ id: z.string(), structure: z.string(), mass: z.string(), samples: z.array(sampleSchema) })),
  /** How far the entry has come. `recheck`: approved, and a question about its first record is open. */
  outcome: z.enum(['draft', 'submitted', 'changes-requested', 'approved', 'recheck']),
  /** Name of the file with the raw counts. */
  evidence: z.string().optional(),
  /** The contributor's word on doubtful values, by check. */
  words: z.record(z.string(), z.string()).default({}),
  decision: z.string().default(''),
  comment: z.object({ fieldPath: z.string(), text: z.string() }).optional(),
  question: z.string().default(''),
});
export type DemoEntry = z.infer<typeof entrySchema>;

const demonstrationSchema = z.object({
  about: z.string(),
  labs: z.array(z.object({ key: z.string(), name: z.string(), place: z.string() })),
  people: z.array(z.object({ key: z.string(), name: z.string(), email: z.string(), roles: z.array(z.enum(roles)), lab: z.string().nullable() })),
  taxa: z.array(z.object({ name: z.string(), parent: z.string(), proposed: z.boolean().default(false) })),
  entries: z.array(entrySchema),
});
export type Demonstration = z.infer<typeof demonstrationSchema>;

/** Reads data/demo; like the migrations it is found from the working directory, since the bundle runs from elsewhere. */
export function readDemonstration(): Demonstration {
  const text = readFileSync(path.resolve(process.cwd(), 'data/demo/demonstration.json'), 'utf8');
  return demonstrationSchema.parse(JSON.parse(text));
}
