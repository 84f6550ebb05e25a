import { z } from 'zod';
import { listenOnLoopback } from './listen';
import { buildMailFake } from './mail';
import { buildStorageFake } from './storage';

/**
 * `main.ts mail|storage`: one stand-in as a process of its own, for demo mode and tests.
 * It says its address in one line of JSON and, over the channel to its parent, as a message.
 */

const setting = z.string().min(1);
const common = { FAKE_FOLDER: setting, FAKE_PORT: z.coerce.number().int().min(0).max(65_535).default(0) };
const mailSettings = z.object({ ...common, MAIL_API_KEY: setting });
const storageSettings = z.object({ ...common, STORAGE_ACCESS_KEY_ID: setting, STORAGE_SECRET_ACCESS_KEY: setting });

async function start(kind: string | undefined) {
  if (kind === 'mail') {
    const settings = mailSettings.parse(process.env);
    return await listenOnLoopback(await buildMailFake({ folder: settings.FAKE_FOLDER, apiKey: settings.MAIL_API_KEY }), settings.FAKE_PORT);
  }
  if (kind === 'storage') {
    const settings = storageSettings.parse(process.env);
    const credentials = { accessKeyId: settings.STORAGE_ACCESS_KEY_ID, secretAccessKey: settings.STORAGE_SECRET_ACCESS_KEY };
    return await listenOnLoopback(await buildStorageFake({ folder: settings.FAKE_FOLDER, ...credentials }), settings.FAKE_PORT);
  }
  throw new Error(`"${kind ?? ''}" is neither mail nor storage.`);
}

const fake = await start(process.argv[2]);
let stopping = false;
const stop = () => {
  if (stopping) return;
  stopping = true;
  void fake.close().then(() => process.exit(0));
};
process.on('SIGINT', stop);
process.on('SIGTERM', stop);
process.stdout.write(`${JSON.stringify({ listening: fake.url })}\n`);
process.send?.({ listening: fake.url });
