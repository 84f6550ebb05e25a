import { createHash, randomBytes } from 'node:crypto';
import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { request as httpRequest } from 'node:http';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { CreateBucketCommand, GetObjectCommand, HeadObjectCommand, ListObjectsV2Command, PutObjectCommand, S3Client } from '@aws-sdk/client-s3';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { listenOnLoopback } from '../../server/fakes/listen';
import type { RunningFake } from '../../server/fakes/listen';
import { decodeChunks } from '../../server/fakes/payload';
import { buildStorageFake } from '../../server/fakes/storage';

const credentials = { accessKeyId: 'key-id', secretAccessKey: 'key-secret' };
const Bucket = 'attachments';
let folder: string;
let fake: RunningFake;
let client: S3Client;
const opened: S3Client[] = [];

function clientWith(changes: Partial<typeof credentials> = {}) {
  const made = new S3Client({ endpoint: fake.url, region: 'us-east-1', forcePathStyle: true, maxAttempts: 1, credentials: { ...credentials, ...changes } });
  opened.push(made);
  return made;
}

/** What the client would send, with something changed after it was signed. */
async function sendAltered(alter: (headers: Record<string, string>, body: Buffer) => { path?: string; body?: Buffer }, uploaded: Buffer | Readable = Buffer.from('the evidence')) {
  const signing = clientWith();
  return await new Promise<{ status: number; text: string }>((resolve, reject) => {
    signing.middlewareStack.add(
      () => async (args) => {
        const sent = args.request as { method: string; path: string; query: Record<string, string>; headers: Record<string, string>; body: Buffer | Readable };
        const headers = { ...sent.headers };
        const whole = Buffer.isBuffer(sent.body) ? sent.body : Buffer.concat(await sent.body.toArray());
        const altered = alter(headers, whole);
        const body = altered.body ?? whole;
        const outgoing = httpRequest(`${fake.url}${altered.path ?? sent.path}?${new URLSearchParams(sent.query).toString()}`, { method: sent.method, headers }, (answer) => {
          let text = '';
          answer.on('data', (part: Buffer) => (text += part.toString()));
          answer.on('end', () => resolve({ status: answer.statusCode ?? 0, text }));
        });
        outgoing.on('error', reject);
        outgoing.end(body);
        throw new Error('sent by the test itself');
      },
      { step: 'finalizeRequest', priority: 'low', name: 'altered' },
    );
    signing.send(new PutObjectCommand({ Bucket, Key: 'evidence.pdf', Body: uploaded, ContentLength: 12 })).catch((error: Error) => {
      if (error.message !== 'sent by the test itself') reject(error);
    });
  });
}

async function filesBelow(path: string): Promise<string[]> {
  return (await readdir(path, { recursive: true, withFileTypes: true })).filter((entry) => entry.isFile()).map((entry) => entry.name);
}

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'storage-'));
  fake = await listenOnLoopback(await buildStorageFake({ folder, ...credentials }), 0);
  client = clientWith();
  await client.send(new CreateBucketCommand({ Bucket }));
});
afterEach(async () => {
  for (const one of opened.splice(0)) one.destroy();
  await fake.close();
  await rm(folder, { recursive: true, force: true });
});

describe('the local object storage', () => {
  it('takes a request as the client signs it, and the test that alters nothing is accepted', async () => {
    expect((await sendAltered(() => ({}))).status).toBe(200);
  });

  it('refuses a signature with one digit changed', async () => {
    const answer = await sendAltered((headers) => {
      const before = headers['authorization'] ?? '';
      headers['authorization'] = before.slice(0, -1) + (before.endsWith('0') ? '1' : '0');
      return {};
    });
    expect(answer.status).toBe(403);
    expect(answer.text).toContain('<Code>SignatureDoesNotMatch</Code>');
  });

  it('refuses another path under the signature of the first', async () => {
    expect(await sendAltered(() => ({ path: '/attachments/other.pdf' }))).toMatchObject({ status: 403 });
  });

  it('refuses a body other than the one that was signed', async () => {
    const answer = await sendAltered((_headers, body) => ({ body: Buffer.from(body.toString().replace('evidence', 'Evidence')) }));
    expect(answer.status).toBe(400);
    expect(answer.text).toContain('XAmzContentSHA256Mismatch');
  });

  it('refuses a stream whose content does not fit the checksum behind it', async () => {
    const stream = () => Readable.from([Buffer.from('the '), Buffer.from('evidence')]);
    const declared: (string | undefined)[] = [];
    const untouched = await sendAltered((headers) => {
      declared.push(headers['x-amz-content-sha256']);
      return {};
    }, stream());
    expect([untouched.status, declared]).toEqual([200, ['STREAMING-UNSIGNED-PAYLOAD-TRAILER']]);
    const answer = await sendAltered((_headers, body) => ({ body: Buffer.from(body.toString('latin1').replace('evidence', 'Evidence'), 'latin1') }), stream());
    expect(answer.status).toBe(400);
    expect(answer.text).toContain('<Code>BadDigest</Code>');
  });

  it('refuses a request without a signature and one whose time is 16 minutes off', async () => {
    expect((await fetch(`${fake.url}/attachments/a`)).status).toBe(403);
    const later = await listenOnLoopback(await buildStorageFake({ folder, ...credentials, now: () => new Date(Date.now() + 16 * 60_000) }), 0);
    const late = new S3Client({ endpoint: later.url, region: 'us-east-1', forcePathStyle: true, maxAttempts: 1, credentials });
    opened.push(late);
    await expect(late.send(new ListObjectsV2Command({ Bucket }))).rejects.toMatchObject({ name: 'RequestTimeTooSkewed' });
    await later.close();
  });

  it('refuses a wrong secret and an unknown key id', async () => {
    await expect(clientWith({ secretAccessKey: 'wrong' }).send(new ListObjectsV2Command({ Bucket }))).rejects.toMatchObject({ name: 'SignatureDoesNotMatch' });
    await expect(clientWith({ accessKeyId: 'other' }).send(new ListObjectsV2Command({ Bucket }))).rejects.toMatchObject({ name: 'InvalidAccessKeyId' });
  });

  it('keeps 6 MB that come as a stream in chunks, byte for byte', async () => {
    const content = randomBytes(6 * 1024 * 1024);
    const parts = Array.from({ length: 60 }, (_, index) => content.subarray(Math.floor((index * content.length) / 60), Math.floor(((index + 1) * content.length) / 60)));
    await client.send(new PutObjectCommand({ Bucket, Key: 'scan.tiff', Body: Readable.from(parts), ContentLength: content.length, ContentType: 'image/tiff' }));
    const answer = await client.send(new GetObjectCommand({ Bucket, Key: 'scan.tiff' }));
    const read = Buffer.from((await answer.Body?.transformToByteArray()) ?? []);
    expect(read.equals(content)).toBe(true);
    expect(answer.ContentType).toBe('image/tiff');
    expect(answer.ETag).toBe(`"${createHash('md5').update(content).digest('hex')}"`);
  });

  it('keeps 6 MB given as a whole, and says the size without the content', async () => {
    const content = randomBytes(6 * 1024 * 1024);
    await client.send(new PutObjectCommand({ Bucket, Key: 'whole', Body: content }));
    expect(await client.send(new HeadObjectCommand({ Bucket, Key: 'whole' }))).toMatchObject({ ContentLength: content.length });
  });

  it('takes keys with spaces, accents and path names without leaving its folder', async () => {
    const keys = ['../../outside', 'a b/c+d (1)*.pdf', 'été/µ', "o'clock!"];
    for (const Key of keys) await client.send(new PutObjectCommand({ Bucket, Key, Body: Buffer.from(Key) }));
    const { Contents } = await client.send(new ListObjectsV2Command({ Bucket }));
    expect(new Set(Contents?.map(({ Key }) => Key))).toEqual(new Set(keys));
    for (const Key of keys) expect(await (await client.send(new GetObjectCommand({ Bucket, Key }))).Body?.transformToString()).toBe(Key);
    expect((await filesBelow(folder)).every((name) => /^[0-9a-f]{64}\.(json|[0-9a-f-]{36}\.bin)$/.test(name))).toBe(true);
  });

  it('lists in pages and by prefix', async () => {
    for (const Key of ['a/1', 'a/2', 'a/3', 'b/1']) await client.send(new PutObjectCommand({ Bucket, Key, Body: Key }));
    const first = await client.send(new ListObjectsV2Command({ Bucket, Prefix: 'a/', MaxKeys: 2 }));
    expect([first.Contents?.map(({ Key }) => Key), first.IsTruncated]).toEqual([['a/1', 'a/2'], true]);
    const second = await client.send(new ListObjectsV2Command({ Bucket, Prefix: 'a/', ContinuationToken: first.NextContinuationToken }));
    expect([second.Contents?.map(({ Key }) => Key), second.IsTruncated]).toEqual([['a/3'], false]);
  });

  it('replaces an object without leaving the old content behind', async () => {
    for (const Body of ['first', 'second']) await client.send(new PutObjectCommand({ Bucket, Key: 'k', Body }));
    expect(await (await client.send(new GetObjectCommand({ Bucket, Key: 'k' }))).Body?.transformToString()).toBe('second');
    expect(await filesBelow(folder)).toHaveLength(2);
  });
});

describe('chunked bodies', () => {
  it('are refused when they end early', () => {
    expect(() => decodeChunks(Buffer.from('5\r\nhel'))).toThrow('terminated unexpectedly');
  });

  it('give their content and their trailers', () => {
    const { content, trailers } = decodeChunks(Buffer.from('3\r\nabc\r\n2;x=1\r\n\r\n\r\n0\r\nx-amz-checksum-crc32:AAAA\r\n\r\n'));
    expect(content.toString()).toBe('abc\r\n');
    expect(trailers.get('x-amz-checksum-crc32')).toBe('AAAA');
  });
});
