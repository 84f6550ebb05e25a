import type { Auth } from '../auth';
import type { Context } from '../context';
import { offerFirstAccount } from '../services/account/firstAccount';
import { seedDemo } from './demo/seedDemo';
import { seedPublished } from './published';
import { seedVocabularies } from './vocabularies';

/**
 * What a register starts with. In demo mode: vocabularies, the published tables as version 1, and the demonstration.
 * Outside it: the vocabularies, and a one-time link for the first account while nobody administers the register. Every
 * step looks at what is there first, so it runs at every start and takes up an interrupted one.
 */
export async function seedRegister(context: Context, _auth: Auth): Promise<void> {
  await seedVocabularies(context);
  if (context.demo) {
    await seedPublished(context);
    await seedDemo(context);
    return;
  }
  if ((await offerFirstAccount(context)) !== null) context.logger.info('no administrator yet: a one-time link for the first account is ready');
}
