import { DatabaseStateError } from '../db/migrate';
import { ConfigError, loadConfig } from '../server/config';
import { seedPublished } from '../server/seed/published';
import { seedVocabularies } from '../server/seed/vocabularies';
import { createContext, StartError } from '../server/startup';

/**
 * `npm run load:published`: the published tables into a register outside demo mode, as its first version where it has
 * none yet. What is loaded already is left as it is.
 */
async function load(): Promise<void> {
  const { context, close } = await createContext(loadConfig(process.env));
  try {
    await seedVocabularies(context);
    await seedPublished(context);
    console.log('The published tables are in the register.');
  } finally {
    await close();
  }
}

load().then(
  () => process.exit(0),
  (error: unknown) => {
    const isSentence = error instanceof ConfigError || error instanceof DatabaseStateError || error instanceof StartError;
    console.error(isSentence ? error.message : error);
    process.exit(isSentence ? 78 : 1);
  },
);
