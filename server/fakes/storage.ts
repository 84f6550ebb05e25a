import { randomUUID } from 'node:crypto';
import { mkdir } from 'node:fs/promises';
import express from 'express';
import type { Express, NextFunction, Request, Response } from 'express';
import { openObjectFolder } from './objectFolder';
import type { StoredObject } from './objectFolder';
import { readPayload } from './payload';
import { checkSignature } from './signature';
import type { Credentials } from './signature';
import { StorageRefusal } from './storageRefusal';

/**
 * A local stand-in for S3 storage, path-style: put, get, head, delete and list objects, make and head a
 * bucket. It checks signatures and checksums as the real service does and keeps the objects in a folder.
 */

export interface StorageFakeOptions extends Credentials {
  folder: string;
  now?: () => Date;
}

const bucketName = /^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/;
const escapeXml = (text: string) => text.replace(/[<>&'"]/g, (sign) => `&#${sign.charCodeAt(0)};`);
const xml = (response: Response, status: number, body: string) => void response.status(status).type('application/xml').send(`<?xml version="1.0" encoding="UTF-8"?>\n${body}`);

function placeOf(request: Request): { bucket: string; key: string } {
  const [path = ''] = request.url.split('?');
  const [bucket = '', ...rest] = path.slice(1).split('/').map(decodeURIComponent);
  if (!bucketName.test(bucket)) throw new StorageRefusal('InvalidBucketName', 400, 'The specified bucket is not valid.');
  return { bucket, key: rest.join('/') };
}

function describe(response: Response, stored: StoredObject): void {
  response.set({ ETag: `"${stored.etag}"`, 'Last-Modified': new Date(stored.modifiedAt).toUTCString(), 'Content-Type': stored.contentType, 'Content-Length': String(stored.size) });
  for (const [name, value] of Object.entries(stored.metadata)) response.set(name, value);
}

function listing(bucket: string, all: StoredObject[], request: Request): string {
  const parameter = (name: string) => (typeof request.query[name] === 'string' ? request.query[name] : undefined);
  const prefix = parameter('prefix') ?? '';
  const after = parameter('continuation-token') ?? parameter('start-after') ?? '';
  const limit = Math.min(Number(parameter('max-keys') ?? 1000), 1000);
  const matching = all.filter(({ key }) => key.startsWith(prefix) && key > after);
  const page = matching.slice(0, limit);
  const next = matching.length > page.length ? `<NextContinuationToken>${escapeXml(page.at(-1)?.key ?? '')}</NextContinuationToken>` : '';
  const contents = page.map((stored) => `<Contents><Key>${escapeXml(stored.key)}</Key><LastModified>${stored.modifiedAt}</LastModified><ETag>&quot;${stored.etag}&quot;</ETag><Size>${stored.size}</Size><StorageClass>STANDARD</StorageClass></Contents>`);
  return `<ListBucketResult xmlns="http://s3.amazonaws.com/doc/2006-03-01/"><Name>${bucket}</Name><Prefix>${escapeXml(prefix)}</Prefix><KeyCount>${page.length}</KeyCount><MaxKeys>${limit}</MaxKeys><IsTruncated>${next !== ''}</IsTruncated>${next}${contents.join('')}</ListBucketResult>`;
}

export async function buildStorageFake({ folder, now = () => new Date(), ...credentials }: StorageFakeOptions): Promise<Express> {
  await mkdir(folder, { recursive: true });
  const objects = openObjectFolder(folder);

  async function onBucket(bucket: string, request: Request, response: Response): Promise<void> {
    const exists = await objects.hasBucket(bucket);
    if (request.method === 'PUT') {
      if (exists) throw new StorageRefusal('BucketAlreadyOwnedByYou', 409, 'The bucket already exists and you own it.');
      await objects.makeBucket(bucket);
      response.set('Location', `/${bucket}`).end();
      return;
    }
    if (!exists) throw new StorageRefusal('NoSuchBucket', 404, 'The specified bucket does not exist.');
    if (request.method === 'HEAD') return void response.end();
    if (request.method === 'GET') return xml(response, 200, listing(bucket, await objects.list(bucket), request));
    throw new StorageRefusal('NotImplemented', 501, 'This is not kept here.');
  }

  async function onObject(bucket: string, key: string, request: Request, response: Response): Promise<void> {
    if (!(await objects.hasBucket(bucket))) throw new StorageRefusal('NoSuchBucket', 404, 'The specified bucket does not exist.');
    if (request.method === 'PUT') {
      const content = await readPayload(request);
      const metadata = Object.fromEntries(Object.entries(request.headers).filter(([name]) => name.startsWith('x-amz-meta-')).map(([name, value]) => [name, String(value)]));
      const stored = await objects.put(bucket, key, content, request.get('content-type') ?? 'application/octet-stream', metadata);
      response.set('ETag', `"${stored.etag}"`).end();
      return;
    }
    if (request.method === 'DELETE') {
      await objects.remove(bucket, key);
      return void response.status(204).end();
    }
    const stored = await objects.find(bucket, key);
    if (stored === undefined) throw new StorageRefusal('NoSuchKey', 404, 'The specified key does not exist.');
    describe(response, stored);
    if (request.method === 'HEAD') return void response.end();
    response.end(await objects.read(bucket, stored));
  }

  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.all('/{*path}', async (request, response) => {
    response.set('x-amz-request-id', randomUUID());
    checkSignature(request, credentials, now());
    const { bucket, key } = placeOf(request);
    await (key === '' ? onBucket(bucket, request, response) : onObject(bucket, key, request, response));
  });
  app.use((error: unknown, request: Request, response: Response, _next: NextFunction) => {
    const known = error instanceof StorageRefusal ? error : error instanceof URIError ? new StorageRefusal('InvalidURI', 400, 'The address cannot be decoded.') : undefined;
    if (known === undefined) console.error(error);
    const refusal = known ?? new StorageRefusal('InternalError', 500, 'We encountered an internal error.');
    // A refused upload may still be on its way: without reading it the client would see a broken connection.
    request.resume();
    xml(response, refusal.status, `<Error><Code>${refusal.code}</Code><Message>${escapeXml(refusal.message)}</Message></Error>`);
  });
  return app;
}
