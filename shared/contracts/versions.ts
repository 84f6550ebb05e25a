import { z } from 'zod';
import { timeSchema } from './common';
import { flagViewSchema } from './fits';
import { setAsideScopeSchema } from './records';
import { standingExponentSchema } from './register';

export const versionItemSchema = z.object({
  label: z.string(),
  title: z.string(),
  doi: z.string().nullable(),
  frozenAt: timeSchema,
  records: z.number().int(),
  species: z.number().int(),
  current: z.boolean(),
  sha256: z.string(),
  demonstration: z.boolean(),
});
export type VersionItem = z.infer<typeof versionItemSchema>;
export const versionListSchema = z.object({ items: z.array(versionItemSchema), nextCursor: z.string().nullable(), preparing: z.object({ label: z.string(), by: z.string(), since: timeSchema }).nullable() });

export const versionFileSchema = z.object({ name: z.string(), bytes: z.number().int(), sha256: z.string(), mediaType: z.string(), rows: z.number().int().nullable() });

/** What came, changed and went between two versions. */
export const versionChangesSchema = z.object({
  previous: z.string().nullable(),
  came: z.array(z.object({ number: z.string(), species: z.string(), structure: z.string() })),
  revised: z.array(z.object({ number: z.string(), species: z.string(), structure: z.string(), from: z.number().int(), to: z.number().int() })),
  went: z.array(z.object({ number: z.string(), species: z.string(), structure: z.string(), reason: z.string() })),
  setAside: z.array(z.object({ number: z.string(), species: z.string(), structure: z.string(), reason: z.string() })),
  speciesCame: z.number().int(),
});
export type VersionChanges = z.infer<typeof versionChangesSchema>;

export const versionPageSchema = versionItemSchema.extend({
  licence: z.string(),
  note: z.string(),
  counts: z.object({ species: z.number().int(), records: z.number().int(), specimens: z.number().int(), structures: z.number().int(), sources: z.number().int() }),
  files: z.array(versionFileSchema),
  standingFits: z.array(standingExponentSchema),
  citation: z.object({ text: z.string(), bibtex: z.string() }),
  previous: z.string().nullable(),
  labels: z.array(z.string()),
  changes: versionChangesSchema,
  contributors: z.array(z.object({ name: z.string(), orcid: z.string().nullable(), records: z.number().int() })),
  setAside: z.array(z.object({ number: z.string(), species: z.string(), structure: z.string(), scope: setAsideScopeSchema, reason: z.string() })),
});
export type VersionPage = z.infer<typeof versionPageSchema>;

export const verifyAnswerSchema = z.object({
  version: z.string(),
  ok: z.boolean(),
  files: z.array(z.object({ name: z.string(), ok: z.boolean(), expectedSha256: z.string(), foundSha256: z.string().nullable(), expectedBytes: z.number().int(), foundBytes: z.number().int().nullable() })),
});

/** What a freeze would do now. */
export const freezePreviewSchema = z.object({
  label: z.string(),
  title: z.string(),
  demonstration: z.boolean(),
  records: z.number().int(),
  species: z.number().int(),
  changes: versionChangesSchema,
  embargoed: z.array(z.object({ number: z.string(), species: z.string(), structure: z.string(), until: z.string() })),
  openRechecks: z.array(z.object({ number: z.string(), species: z.string(), structure: z.string() })),
  exponents: z.array(standingExponentSchema),
  warnings: z.array(z.string()),
  underWay: z.object({ label: z.string(), by: z.string(), since: timeSchema }).nullable(),
});
export type FreezePreview = z.infer<typeof freezePreviewSchema>;

export const freezeRequestSchema = z.object({
  /** The number the curator was shown and types to confirm. */
  label: z.string().regex(/^[1-9][0-9]{0,5}$/, 'Type the number of the version'),
  note: z.string().trim().max(4000).default(''),
});
export const freezeProgressSchema = z.object({ label: z.string(), status: z.enum(['preparing', 'frozen']), steps: z.array(z.object({ step: z.string(), detail: z.string(), at: timeSchema })) });
export type FreezeProgress = z.infer<typeof freezeProgressSchema>;

export const citationQuerySchema = z.object({ style: z.enum(['bibtex', 'text']).default('text'), records: z.string().max(8000).optional() });

export const waitsSchema = z.object({
  toFreeze: z.array(z.object({ number: z.string(), species: z.string(), structure: z.string(), approvedAt: timeSchema, demonstration: z.boolean() })),
  openRechecks: z.array(z.object({ id: z.string(), record: z.string(), species: z.string(), structure: z.string(), status: z.string(), at: timeSchema })),
  flags: z.array(flagViewSchema),
  proposedTaxa: z.number().int(),
});
export type Waits = z.infer<typeof waitsSchema>;
export const setAsideRequestSchema = z.object({ scope: setAsideScopeSchema, reason: z.string().trim().min(1, 'Give the reason that everyone will see').max(2000) });
export const setAsideViewSchema = z.object({ id: z.string(), record: z.string(), species: z.string(), structure: z.string(), scope: setAsideScopeSchema, reason: z.string(), by: z.string(), at: timeSchema, liftedAt: timeSchema.nullable() });
export type SetAsideView = z.infer<typeof setAsideViewSchema>;
