import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { connectMailer } from '../../server/integrations/mail';
import { connectStorage } from '../../server/integrations/storage';

/** The real clients of both services against the local processes: only the addresses differ. */

const mailer = (apiKey = inject('mailApiKey'), apiUrl = inject('mailApiUrl')) => connectMailer({ apiUrl, apiKey, from: 'Register <register@demo.example>' });

describe('mail', () => {
  it('is sent once for one key, and can be read', async () => {
    const to = `${randomUUID()}@demo.example`;
    const mail = { to, subject: 'A re-check was asked', text: 'Please answer.', idempotencyKey: `notice-${to}` };
    const first = await mailer().send(mail);
    expect(await mailer().send(mail)).toEqual(first);
    const mine = (await mailer().listSent(100)).filter((sent) => sent.to.includes(to));
    expect(mine).toMatchObject([{ id: first.id, subject: 'A re-check was asked', text: 'Please answer.' }]);
    expect(Number.isNaN(Date.parse(mine[0]?.sentAt ?? ''))).toBe(false);
  });

  it('fails for good with a wrong key or a bad recipient', async () => {
    const mail = { to: 'a@demo.example', subject: 's', text: 't', idempotencyKey: randomUUID() };
    await expect(mailer('re_wrong').send(mail)).rejects.toMatchObject({ name: 'MailError', code: 'invalid_api_key', retriable: false });
    await expect(mailer().send({ ...mail, to: 'nobody' })).rejects.toMatchObject({ name: 'MailError', status: 422, retriable: false });
  });

  it('may be tried again when the service cannot be reached', async () => {
    const mail = { to: 'a@demo.example', subject: 's', text: 't', idempotencyKey: randomUUID() };
    await expect(mailer('re_any', 'http://127.0.0.1:9').send(mail)).rejects.toMatchObject({ name: 'MailError', retriable: true });
  });
});

describe('storage', () => {
  const settings = () => ({ endpoint: inject('storageEndpoint'), region: 'us-east-1', bucket: `b-${randomUUID()}`, accessKeyId: inject('storageAccessKeyId'), secretAccessKey: inject('storageSecretAccessKey') });
  let store: ReturnType<typeof connectStorage>;
  beforeAll(async () => {
    store = connectStorage(settings());
    await store.checkBucket({ create: true });
  });
  afterAll(() => store.close());

  it('gives back what was put, with its type, until it is deleted', async () => {
    const content = Buffer.from([0, 255, 13, 10, 128]);
    await store.put('submissions/1/evidence.pdf', content, { contentType: 'application/pdf' });
    expect(await store.get('submissions/1/evidence.pdf')).toEqual({ content, contentType: 'application/pdf' });
    expect(await store.head('submissions/1/evidence.pdf')).toEqual({ bytes: 5, contentType: 'application/pdf' });
    await store.delete('submissions/1/evidence.pdf');
    expect(await store.get('submissions/1/evidence.pdf')).toBeUndefined();
    expect(await store.head('submissions/1/evidence.pdf')).toBeUndefined();
    await store.delete('submissions/1/evidence.pdf');
  });

  it('keeps an empty object', async () => {
    await store.put('empty', Buffer.alloc(0), { contentType: 'text/csv' });
    expect((await store.get('empty'))?.content).toHaveLength(0);
  });

  it('makes its bucket only where it may, and twice is no error', async () => {
    await store.checkBucket({ create: true });
    const other = connectStorage(settings());
    await expect(other.checkBucket({ create: false })).rejects.toThrow(/has no bucket/);
    await other.checkBucket({ create: true });
    await other.checkBucket({ create: false });
    other.close();
  });

  it('is refused with a wrong secret instead of answering "absent"', async () => {
    const wrong = connectStorage({ ...settings(), secretAccessKey: 'wrong' });
    await expect(wrong.get('anything')).rejects.toMatchObject({ name: 'SignatureDoesNotMatch' });
    await expect(wrong.checkBucket({ create: true })).rejects.toThrow();
    wrong.close();
  });
});
