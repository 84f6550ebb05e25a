import { createHash } from 'node:crypto';
import { crc32 } from 'node:zlib';
import type { Request } from 'express';
import { StorageRefusal } from './storageRefusal';

/** Reads what was uploaded, out of aws-chunked framing where it is used, and checks every checksum that came with it. */

const largestBodyBytes = 64 * 1024 * 1024;

async function readAll(request: Request): Promise<Buffer> {
  const parts: Buffer[] = [];
  let bytes = 0;
  for await (const part of request as AsyncIterable<Buffer>) {
    bytes += part.length;
    if (bytes > largestBodyBytes) throw new StorageRefusal('EntityTooLarge', 400, 'Your proposed upload exceeds the maximum allowed size.');
    parts.push(part);
  }
  return Buffer.concat(parts);
}

/** aws-chunked: "<size in hex>[;extension]\r\n<bytes>\r\n" … "0\r\n", then trailer lines up to an empty one. */
export function decodeChunks(body: Buffer): { content: Buffer; trailers: Map<string, string> } {
  const broken = () => new StorageRefusal('IncompleteBody', 400, 'The request body terminated unexpectedly.');
  const parts: Buffer[] = [];
  let at = 0;
  const nextLine = () => {
    const end = body.indexOf('\r\n', at);
    if (end < 0) throw broken();
    const line = body.toString('latin1', at, end);
    at = end + 2;
    return line;
  };
  for (;;) {
    const size = /^([0-9a-fA-F]+)(?:;.*)?$/.exec(nextLine());
    if (size === null) throw broken();
    const bytes = Number.parseInt(size[1] ?? '', 16);
    if (bytes === 0) break;
    if (body.toString('latin1', at + bytes, at + bytes + 2) !== '\r\n') throw broken();
    parts.push(body.subarray(at, at + bytes));
    at += bytes + 2;
  }
  const trailers = new Map<string, string>();
  for (let line = at < body.length ? nextLine() : ''; line !== ''; line = at < body.length ? nextLine() : '') {
    const colon = line.indexOf(':');
    trailers.set(line.slice(0, colon).trim().toLowerCase(), line.slice(colon + 1).trim());
  }
  return { content: Buffer.concat(parts), trailers };
}

function crc32Base64(content: Buffer): string {
  const bytes = Buffer.alloc(4);
  bytes.writeUInt32BE(crc32(content));
  return bytes.toString('base64');
}

const checksums = new Map<string, (content: Buffer) => string>([
  ['x-amz-checksum-crc32', crc32Base64],
  ['x-amz-checksum-sha1', (content) => createHash('sha1').update(content).digest('base64')],
  ['x-amz-checksum-sha256', (content) => createHash('sha256').update(content).digest('base64')],
  ['content-md5', (content) => createHash('md5').update(content).digest('base64')],
]);

function checkChecksums(content: Buffer, sent: Map<string, string>): void {
  for (const [name, value] of sent) {
    const calculate = checksums.get(name);
    if (calculate === undefined && /^x-amz-checksum-(crc32c|crc64nvme)$/.test(name)) throw new StorageRefusal('NotImplemented', 501, `The checksum ${name} is not kept here.`);
    if (calculate !== undefined && calculate(content) !== value) throw new StorageRefusal('BadDigest', 400, `The ${name} you specified did not match what we received.`);
  }
}

/** The bytes of the object, proved to be what the sender meant. */
export async function readPayload(request: Request): Promise<Buffer> {
  const raw = await readAll(request);
  const declared = request.get('x-amz-content-sha256') ?? '';
  const headers = new Map(Object.entries(request.headers).flatMap(([name, value]) => (typeof value === 'string' ? [[name, value] as const] : [])));
  if (declared === 'STREAMING-UNSIGNED-PAYLOAD-TRAILER') {
    const { content, trailers } = decodeChunks(raw);
    if (String(content.length) !== request.get('x-amz-decoded-content-length')) throw new StorageRefusal('IncompleteBody', 400, 'You did not provide the number of bytes specified by x-amz-decoded-content-length.');
    const announced = request.get('x-amz-trailer')?.toLowerCase();
    if (announced !== undefined && !trailers.has(announced)) throw new StorageRefusal('MalformedTrailerError', 400, 'The request contained trailing data that was not well-formed.');
    checkChecksums(content, new Map([...headers, ...trailers]));
    return content;
  }
  if (declared.startsWith('STREAMING-')) throw new StorageRefusal('NotImplemented', 501, 'Chunk signatures are not checked here, so they are not accepted.');
  if (declared !== 'UNSIGNED-PAYLOAD' && declared !== createHash('sha256').update(raw).digest('hex'))
    throw new StorageRefusal('XAmzContentSHA256Mismatch', 400, "The provided 'x-amz-content-sha256' header does not match what was computed.");
  checkChecksums(raw, headers);
  return raw;
}
