import { BucketAlreadyOwnedByYou, CreateBucketCommand, DeleteObjectCommand, GetObjectCommand, HeadBucketCommand, HeadObjectCommand, NoSuchKey, NotFound, PutObjectCommand, S3Client } from '@aws-sdk/client-s3';

export interface StoredObject {
  content: Buffer;
  contentType: string;
}

export interface ObjectStore {
  put(key: string, content: Buffer, options: { contentType: string }): Promise<void>;
  /** Undefined when there is no object of that key. */
  get(key: string): Promise<StoredObject | undefined>;
  head(key: string): Promise<{ bytes: number; contentType: string } | undefined>;
  /** Deleting what is not there is no error. */
  delete(key: string): Promise<void>;
  /** Throws when the bucket cannot be used; makes it when `create` and it is absent. */
  checkBucket(options: { create: boolean }): Promise<void>;
  close(): void;
}

export interface StorageSettings {
  endpoint: string | undefined;
  region: string;
  bucket: string;
  accessKeyId: string;
  secretAccessKey: string;
}

const fallbackType = 'application/octet-stream';

async function orUndefined<T>(call: Promise<T>): Promise<T | undefined> {
  try {
    return await call;
  } catch (error) {
    if (error instanceof NoSuchKey || error instanceof NotFound) return undefined;
    throw error;
  }
}

/** Objects by the S3 client: AWS without `endpoint`, any S3 service or the local stand-in with it. */
export function connectStorage({ endpoint, region, bucket, accessKeyId, secretAccessKey }: StorageSettings): ObjectStore {
  const client = new S3Client({
    region,
    credentials: { accessKeyId, secretAccessKey },
    // Services at an address of their own rarely have a name per bucket; AWS itself wants one.
    ...(endpoint === undefined ? {} : { endpoint, forcePathStyle: true }),
  });
  return {
    async put(key, content, { contentType }) {
      await client.send(new PutObjectCommand({ Bucket: bucket, Key: key, Body: content, ContentType: contentType, ContentLength: content.length }));
    },
    async get(key) {
      const answer = await orUndefined(client.send(new GetObjectCommand({ Bucket: bucket, Key: key })));
      if (answer === undefined) return undefined;
      const bytes = (await answer.Body?.transformToByteArray()) ?? new Uint8Array();
      return { content: Buffer.from(bytes), contentType: answer.ContentType ?? fallbackType };
    },
    async head(key) {
      const answer = await orUndefined(client.send(new HeadObjectCommand({ Bucket: bucket, Key: key })));
      return answer === undefined ? undefined : { bytes: answer.ContentLength ?? 0, contentType: answer.ContentType ?? fallbackType };
    },
    async delete(key) {
      await client.send(new DeleteObjectCommand({ Bucket: bucket, Key: key }));
    },
    async checkBucket({ create }) {
      const found = await orUndefined(client.send(new HeadBucketCommand({ Bucket: bucket })));
      if (found !== undefined) return;
      if (!create) throw new Error(`The storage has no bucket "${bucket}".`);
      try {
        await client.send(new CreateBucketCommand({ Bucket: bucket }));
      } catch (error) {
        if (!(error instanceof BucketAlreadyOwnedByYou)) throw error;
      }
    },
    close: () => client.destroy(),
  };
}
