import { createHash, randomUUID } from 'node:crypto';
import { access, mkdir, readFile, readdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { z } from 'zod';
import { writeDurably } from './durableFile';

/**
 * Objects in a folder. No name from outside becomes a file name: bucket and key are hashed. The content
 * is written under a new name first and the description that points to it last, so a kill between the
 * two leaves the earlier object whole.
 */

const descriptionSchema = z.object({ key: z.string(), file: z.string(), size: z.number(), etag: z.string(), contentType: z.string(), metadata: z.record(z.string(), z.string()), modifiedAt: z.string() });
export type StoredObject = z.infer<typeof descriptionSchema>;

const nameOf = (text: string) => createHash('sha256').update(text).digest('hex');
const isMissing = (error: unknown) => error instanceof Error && 'code' in error && error.code === 'ENOENT';

export function openObjectFolder(folder: string) {
  const bucketFolder = (bucket: string) => join(folder, nameOf(bucket));
  const description = (bucket: string, key: string) => join(bucketFolder(bucket), `${nameOf(key)}.json`);

  async function find(bucket: string, key: string): Promise<StoredObject | undefined> {
    try {
      return descriptionSchema.parse(JSON.parse(await readFile(description(bucket, key), 'utf8')));
    } catch (error) {
      if (isMissing(error)) return undefined;
      throw error;
    }
  }

  return {
    find,
    async hasBucket(bucket: string): Promise<boolean> {
      return await access(bucketFolder(bucket)).then(() => true, () => false);
    },
    async makeBucket(bucket: string): Promise<void> {
      await mkdir(bucketFolder(bucket), { recursive: true });
    },
    async put(bucket: string, key: string, content: Buffer, contentType: string, metadata: Record<string, string>): Promise<StoredObject> {
      const before = await find(bucket, key);
      const file = `${nameOf(key)}.${randomUUID()}.bin`;
      const stored = { key, file, size: content.length, etag: createHash('md5').update(content).digest('hex'), contentType, metadata, modifiedAt: new Date().toISOString() };
      await writeDurably(join(bucketFolder(bucket), file), content);
      await writeDurably(description(bucket, key), JSON.stringify(stored));
      if (before !== undefined) await rm(join(bucketFolder(bucket), before.file), { force: true });
      return stored;
    },
    async read(bucket: string, stored: StoredObject): Promise<Buffer> {
      return await readFile(join(bucketFolder(bucket), stored.file));
    },
    async remove(bucket: string, key: string): Promise<void> {
      const before = await find(bucket, key);
      if (before === undefined) return;
      await rm(description(bucket, key), { force: true });
      await rm(join(bucketFolder(bucket), before.file), { force: true });
    },
    async list(bucket: string): Promise<StoredObject[]> {
      const names = (await readdir(bucketFolder(bucket))).filter((name) => name.endsWith('.json'));
      const all = await Promise.all(names.map(async (name) => descriptionSchema.parse(JSON.parse(await readFile(join(bucketFolder(bucket), name), 'utf8')))));
      return all.sort((a, b) => (a.key < b.key ? -1 : 1));
    },
  };
}
