import { createHash, createHmac, timingSafeEqual } from 'node:crypto';
import type { Request } from 'express';
import { StorageRefusal } from './storageRefusal';

/** Checks AWS Signature Version 4 in the Authorization header, as the storage services do. */

export interface Credentials {
  accessKeyId: string;
  secretAccessKey: string;
}

const hmac = (key: string | Buffer, text: string) => createHmac('sha256', key).update(text).digest();
const encode = (text: string) => encodeURIComponent(text).replace(/[!'()*]/g, (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`);
const authorizationForm = /^AWS4-HMAC-SHA256 Credential=([^/,]+)\/(\d{8})\/([^/,]+)\/s3\/aws4_request,\s*SignedHeaders=([a-z0-9;-]+),\s*Signature=([0-9a-f]{64})$/;
const longestSkewMs = 15 * 60 * 1000;

function canonicalQuery(query: string): string {
  return query
    .split('&')
    .filter((part) => part !== '')
    .map((part) => {
      const [name = '', value = ''] = part.split('=');
      return `${encode(decodeURIComponent(name))}=${encode(decodeURIComponent(value))}`;
    })
    .sort()
    .join('&');
}

function canonicalRequest(request: Request, signedHeaders: string, payloadHash: string): string {
  const [path = '/', query = ''] = request.url.split('?');
  const segments = path.split('/').map((segment) => encode(decodeURIComponent(segment)));
  const headers = signedHeaders.split(';').map((name) => {
    const value = request.headers[name];
    if (value === undefined) throw new StorageRefusal('SignatureDoesNotMatch', 403, `The signed header ${name} is absent.`);
    return `${name}:${String(value).trim().replace(/\s+/g, ' ')}\n`;
  });
  return [request.method, segments.join('/'), canonicalQuery(query), headers.join(''), signedHeaders, payloadHash].join('\n');
}

function timeOf(stamp: string): number {
  const parts = /^(\d{4})(\d\d)(\d\d)T(\d\d)(\d\d)(\d\d)Z$/.exec(stamp);
  return parts === null ? Number.NaN : Date.UTC(Number(parts[1]), Number(parts[2]) - 1, Number(parts[3]), Number(parts[4]), Number(parts[5]), Number(parts[6]));
}

/** Refuses a request whose signature is absent, old, by another key or over other content. */
export function checkSignature(request: Request, credentials: Credentials, now: Date): void {
  const authorization = request.get('authorization');
  if (authorization === undefined) throw new StorageRefusal('AccessDenied', 403, 'Access Denied');
  const parts = authorizationForm.exec(authorization);
  if (parts === null) throw new StorageRefusal('AuthorizationHeaderMalformed', 400, 'The authorization header is malformed.');
  const [, accessKeyId = '', day = '', region = '', signedHeaders = '', signature = ''] = parts;
  if (accessKeyId !== credentials.accessKeyId) throw new StorageRefusal('InvalidAccessKeyId', 403, 'The access key id does not exist in our records.');
  const stamp = request.get('x-amz-date') ?? '';
  const skewMs = Math.abs(now.getTime() - timeOf(stamp));
  if (!(skewMs <= longestSkewMs) || !stamp.startsWith(day)) throw new StorageRefusal('RequestTimeTooSkewed', 403, 'The difference between the request time and the current time is too large.');
  const unsigned = ['host', 'x-amz-date', 'x-amz-content-sha256'].filter((name) => !signedHeaders.split(';').includes(name));
  const payloadHash = request.get('x-amz-content-sha256');
  if (unsigned.length > 0 || payloadHash === undefined) throw new StorageRefusal('AccessDenied', 403, 'There were headers present in the request which were not signed.');
  const scope = `${day}/${region}/s3/aws4_request`;
  const hashed = createHash('sha256').update(canonicalRequest(request, signedHeaders, payloadHash)).digest('hex');
  const key = ['aws4_request', 's3', region, day].reduceRight<Buffer>((previous, part) => hmac(previous, part), Buffer.from(`AWS4${credentials.secretAccessKey}`));
  const expected = hmac(key, ['AWS4-HMAC-SHA256', stamp, scope, hashed].join('\n'));
  if (!timingSafeEqual(expected, Buffer.from(signature, 'hex'))) throw new StorageRefusal('SignatureDoesNotMatch', 403, 'The request signature we calculated does not match the signature you provided.');
}
