import { Readable } from 'node:stream';
import yazl from 'yazl';
import { findVersionFiles, type VersionFileRow } from '../../../db/queries/versions';
import type { z } from 'zod';
import type { verifyAnswerSchema } from '../../../shared/contracts/versions';
import type { Context } from '../../context';
import { AppError, notFound } from '../../errors';
import { manifestName, sha256Of } from './buildFiles';
import type { FrozenVersion } from './readVersions';

type VerifyAnswer = z.infer<typeof verifyAnswerSchema>;

/** The stored bytes of a file, refused where they are no longer what was frozen: a wrong byte is never served as right. */
async function readStored(context: Context, { name, storageKey, sha256 }: VersionFileRow): Promise<Buffer> {
  const found = await context.storage.get(storageKey);
  if (found !== undefined && sha256Of(found.content) === sha256) return found.content;
  context.logger.error({ file: name, storageKey, missing: found === undefined }, 'a stored file of a version does not agree with its checksum');
  throw new AppError('unavailable', `The stored file ${name} does not agree with its checksum and is not served. The curators must restore it.`);
}

/**
 * One file of a version, byte for byte as frozen.
 * @throws not-found for a name that the version does not hold · unavailable where the stored bytes have changed
 */
export async function loadVersionFile(context: Context, version: FrozenVersion, name: string): Promise<{ file: VersionFileRow; content: Buffer }> {
  const file = (await findVersionFiles(context.db, version.row.id)).find((one) => one.name === name);
  if (file === undefined) throw notFound(`The file ${name.slice(0, 80)}`);
  return { file, content: await readStored(context, file) };
}

const manifestLine = /^([0-9a-f]{64}) {2}(.+)$/;

/** Checksums that the stored manifest itself states, by file name. */
function statedBy(manifest: Buffer | undefined): Map<string, string> {
  const lines = (manifest ?? Buffer.alloc(0)).toString('utf8').split('\n');
  return new Map(lines.flatMap((line) => {
    const match = manifestLine.exec(line);
    return match === null ? [] : [[match[2] ?? '', match[1] ?? ''] as const];
  }));
}

/**
 * Reads every stored object of a version again and compares size and SHA-256: the manifest with the version's own
 * checksum, every other file with the line of the stored manifest and with what was noted when it was frozen.
 */
export async function verifyVersion(context: Context, version: FrozenVersion): Promise<VerifyAnswer> {
  const files = await findVersionFiles(context.db, version.row.id);
  const manifestFile = files.find(({ name }) => name === manifestName);
  const manifest = manifestFile === undefined ? undefined : await context.storage.get(manifestFile.storageKey);
  const stated = statedBy(manifest?.content);
  const answers: VerifyAnswer['files'] = [];
  for (const { name, storageKey, sha256, bytes } of files) {
    const expectedSha256 = name === manifestName ? version.sha256 : (stated.get(name) ?? sha256);
    const found = name === manifestName ? manifest : await context.storage.get(storageKey);
    const foundSha256 = found === undefined ? null : sha256Of(found.content);
    const foundBytes = found?.content.length ?? null;
    const isStated = name === manifestName || stated.get(name) === sha256;
    answers.push({ name, ok: isStated && foundSha256 === expectedSha256 && foundSha256 === sha256 && foundBytes === bytes, expectedSha256, foundSha256, expectedBytes: bytes, foundBytes });
  }
  return { version: String(version.row.number), ok: answers.length > 0 && answers.every(({ ok }) => ok), files: answers };
}

/** Midday of the day on which a version was frozen, in the fields of local time: a zip holds those, without a zone. */
function zipTime(frozenAt: Date): Date {
  return new Date(frozenAt.getUTCFullYear(), frozenAt.getUTCMonth(), frozenAt.getUTCDate(), 12);
}

/**
 * All files of a version as a zip, stored and not compressed, in their order and with one fixed time, so that its
 * bytes are the same on each download. Objects are read one after the other while the zip is sent.
 */
export async function bundleVersion(context: Context, version: FrozenVersion): Promise<NodeJS.ReadableStream> {
  const zip = new yazl.ZipFile();
  const options = { mtime: zipTime(version.frozenAt), mode: 0o100644, compress: false, forceDosTimestamp: true };
  for (const file of await findVersionFiles(context.db, version.row.id)) {
    zip.addReadStreamLazy(`allokarya-version-${version.row.number}/${file.name}`, { ...options, size: file.bytes }, (give) => {
      readStored(context, file).then((content) => give(null, Readable.from([content])), (error: unknown) => give(error, Readable.from([])));
    });
  }
  zip.end();
  return zip.outputStream;
}
