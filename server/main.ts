import { createServer } from 'node:http';
import { DatabaseStateError } from '../db/migrate';
import { buildApp } from './app';
import { createAuth } from './auth';
import { ConfigError, loadConfig } from './config';
import { createJobHandlers } from './jobs/handlers';
import { seedRegister } from './seed/seedRegister';
import { createContext, StartError } from './startup';

/** Exit code for a start stopped by a sentence on standard error; `npm start` shows the sentence and nothing else. */
const stoppedByCause = 78;
/** How long open requests may take to end before the server closes them. */
const graceMs = 8_000;

async function start(): Promise<void> {
  const config = loadConfig(process.env);
  const { context, close } = await createContext(config);
  const auth = createAuth(context);
  const server = createServer(buildApp(context, auth));
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(config.port, config.host, resolve);
  });
  await seedRegister(context, auth);
  await context.jobs.start(createJobHandlers(context));
  context.logger.info({ port: config.port, demo: context.demo }, 'ready');

  let stopping = false;
  const stop = (): void => {
    if (stopping) return;
    stopping = true;
    const force = setTimeout(() => server.closeAllConnections(), graceMs);
    server.closeIdleConnections();
    server.close(() => {
      clearTimeout(force);
      close().then(
        () => process.exit(0),
        (error: unknown) => {
          context.logger.error({ err: error }, 'stopping failed');
          process.exit(1);
        },
      );
    });
  };
  process.on('SIGINT', stop);
  process.on('SIGTERM', stop);
}

function sentenceOf(error: unknown): string | null {
  if (error instanceof ConfigError || error instanceof DatabaseStateError || error instanceof StartError) return error.message;
  const code: unknown = error instanceof Error ? Reflect.get(error, 'code') : null;
  if (code === 'EADDRINUSE') return `Port ${process.env['PORT'] ?? '4680'} is in use. Stop what uses it, or start with another PORT.`;
  if (code === 'ECONNREFUSED') return 'The database, mail or storage address does not answer. Check DATABASE_URL, MAIL_API_URL and STORAGE_ENDPOINT.';
  return null;
}

start().catch((error: unknown) => {
  const sentence = sentenceOf(error);
  console.error(sentence ?? error);
  process.exit(sentence === null ? 1 : stoppedByCause);
});
