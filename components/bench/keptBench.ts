import { z } from 'zod';
import { sampleEntrySchema } from '../../shared/contracts/content';
import type { BenchEntry } from './benchEntry';

const KEY = 'allokarya.bench';
const READ_KEY = 'allokarya.bench.cautionsRead';
const keptSchema = z.object({ entry: z.object({ sample: sampleEntrySchema, targetCv: z.string().max(20) }), at: z.string() });

export interface KeptBench {
  entry: BenchEntry;
  /** ISO time. */
  at: string;
}

/** What was typed on this device before, or null. Storage can be forbidden by the browser. */
export function recallBench(): KeptBench | null {
  try {
    const stored = globalThis.localStorage?.getItem(KEY) ?? null;
    if (stored === null) return null;
    const parsed = keptSchema.safeParse(JSON.parse(stored));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** Keeps the entry on this device; false where the browser does not allow it. */
export function keepBench(entry: BenchEntry, at: string): boolean {
  try {
    globalThis.localStorage?.setItem(KEY, JSON.stringify({ entry, at }));
    return true;
  } catch {
    return false;
  }
}

export function forgetBench(): void {
  try {
    globalThis.localStorage?.removeItem(KEY);
  } catch {
    // Nothing was kept where storage is forbidden.
  }
}

/** Whether the cautions were read on this device. */
export function recallCautionsRead(): boolean {
  try {
    return globalThis.localStorage?.getItem(READ_KEY) === 'yes';
  } catch {
    return false;
  }
}

export function rememberCautionsRead(): void {
  try {
    globalThis.localStorage?.setItem(READ_KEY, 'yes');
  } catch {
    // They are then shown in full again at the next visit.
  }
}
