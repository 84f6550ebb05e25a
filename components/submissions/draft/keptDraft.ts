import { z } from 'zod';
import { submissionContentSchema } from '../../../shared/contracts/content';

const keptSchema = z.object({
  content: submissionContentSchema,
  /** State of the server that the content was typed over. */
  etag: z.string(),
  keptAt: z.string(),
});
export type KeptDraft = z.infer<typeof keptSchema>;

const keyOf = (submissionId: string) => `allokarya.draft.${submissionId}`;

/** What was typed on this device and not yet sent, or null. */
export function recallDraft(submissionId: string): KeptDraft | null {
  try {
    const stored = globalThis.localStorage?.getItem(keyOf(submissionId)) ?? null;
    if (stored === null) return null;
    const parsed = keptSchema.safeParse(JSON.parse(stored));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** Keeps a copy on this device until the register has it. Returns whether the device took it. */
export function keepDraft(submissionId: string, kept: KeptDraft): boolean {
  try {
    globalThis.localStorage?.setItem(keyOf(submissionId), JSON.stringify(kept));
    return true;
  } catch {
    // A full or forbidden storage: the copy then lives as long as the page.
    return false;
  }
}

export function forgetDraft(submissionId: string): void {
  try {
    globalThis.localStorage?.removeItem(keyOf(submissionId));
  } catch {
    // Nothing could be kept, so nothing is left.
  }
}
