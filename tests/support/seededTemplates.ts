import type { Context } from '../../server/context';
import { seedVocabularies } from '../../server/seed/vocabularies';

/** Fills a template database as the first start does, without the demonstration. */
export async function seedTemplate(seed: 'vocabularies' | 'published', context: Context, runJobs: () => Promise<void>): Promise<void> {
  await seedVocabularies(context);
  if (seed === 'vocabularies') return;
  const { seedPublished } = await import('../../server/seed/published');
  await seedPublished(context);
  await runJobs();
}
