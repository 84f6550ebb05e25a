import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { mails } from '../../db/schema/index';
import { makePerson } from '../support/factories';
import { spawnServer } from '../support/spawnedServer';
import { startTestApp, type TestApp } from '../support/testApp';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ env: { KARYA_DEMO: 'off' } });
}, 120_000);
afterAll(() => app.close());

const env = () => ({ KARYA_DEMO: 'off', MAIL_API_URL: app.context.config.mail.apiUrl, MAIL_API_KEY: app.context.config.mail.apiKey, STORAGE_BUCKET: app.context.config.storage.bucket });

test('a worker killed between sending a mail and noting it sends it once all the same', async () => {
  const person = await makePerson(app.context.db);
  const mail = { userId: person.id, recipient: person.email, kind: 'test', subject: 'Once', body: 'Only once.', idempotencyKey: `once:${person.id}` };
  const [row] = await app.context.db.insert(mails).values(mail).returning({ id: mails.id });

  const first = await spawnServer(app.context.config.databaseUrl, env(), { killAt: 'mail:sent', awaitReady: false });
  expect(await first.ended).toBe('SIGKILL');
  expect(first.reached()).toEqual(['mail:sent']);
  const sentTo = async () => (await app.sentMails()).filter((sent) => sent.to.includes(person.email));
  expect(await sentTo()).toHaveLength(1);
  const read = async () => (await app.context.db.select().from(mails).where(eq(mails.id, row?.id ?? '')))[0];
  expect((await read())?.status).toBe('queued');

  const second = await spawnServer(app.context.config.databaseUrl, env(), {});
  await expect.poll(async () => (await read())?.status, { timeout: 60_000, interval: 100 }).toBe('sent');
  await second.stop();
  expect(await sentTo()).toHaveLength(1);
  expect((await read())?.providerId).toBe((await sentTo())[0]?.id);
}, 120_000);
