// Buckets and objects on disk: bytes in files named by a hash, never by the key; what is known of them in a journal.
import { createHash, randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { z } from 'zod';
import { openFiles } from '../files';
import { openJournal } from '../journal';
import { StorageError } from './errors';

const objectShape = z.object({
  bucket: z.string(),
  key: z.string(),
  file: z.string(),
  bytes: z.number().int(),
  etag: z.string(),
  modifiedAtMs: z.number(),
  /** Content-Type, Cache-Control and so on, by lower-case name. */
  headers: z.record(z.string(), z.string()),
  userMetadata: z.record(z.string(), z.string()),
  checksums: z.record(z.string(), z.string()),
});

const bucketShape = z.object({ name: z.string(), createdAtMs: z.number() });

export type StoredObject = z.output<typeof objectShape>;
type NewObject = Omit<StoredObject, 'file' | 'bytes' | 'modifiedAtMs'>;

export interface Objects {
  makeBucket(name: string): void;
  dropBucket(name: string): void;
  buckets(): { name: string; createdAtMs: number }[];
  /** @throws StorageError NoSuchBucket */
  needBucket(name: string): void;
  put(object: NewObject, data: Buffer): StoredObject;
  get(bucket: string, key: string): StoredObject | undefined;
  read(object: StoredObject): Promise<Buffer>;
  remove(bucket: string, key: string): void;
  /** The objects of a bucket in the byte order of their keys. */
  list(bucket: string): StoredObject[];
  close(): void;
}

const byBytes = (left: StoredObject, right: StoredObject): number =>
  Buffer.compare(Buffer.from(left.key), Buffer.from(right.key));

export function openObjects(directory: string | undefined, now: () => number): Objects {
  const journal = openJournal(directory);
  const buckets = journal.table('buckets', bucketShape);
  const objects = journal.table('objects', objectShape);
  const bytes = openFiles(
    directory === undefined ? undefined : join(directory, 'objects'),
    objects.all().map((object) => object.file),
  );
  const idOf = (bucket: string, key: string): string => `${bucket}/${key}`;
  const list = (bucket: string): StoredObject[] =>
    objects
      .all()
      .filter((object) => object.bucket === bucket)
      .sort(byBytes);
  return {
    buckets: () => buckets.all(),
    list,
    makeBucket: (name) => {
      if (!/^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/.test(name))
        throw new StorageError('InvalidBucketName', 'The specified bucket is not valid.');
      if (buckets.get(name) === undefined) buckets.put(name, { name, createdAtMs: now() });
      journal.flush();
    },
    dropBucket: (name) => {
      if (list(name).length > 0)
        throw new StorageError('BucketNotEmpty', 'The bucket you tried to delete is not empty');
      buckets.remove(name);
      journal.flush();
    },
    needBucket: (name) => {
      if (buckets.get(name) === undefined)
        throw new StorageError('NoSuchBucket', 'The specified bucket does not exist', { BucketName: name });
    },
    put: (object, data) => {
      const before = objects.get(idOf(object.bucket, object.key));
      const hash = createHash('sha256').update(idOf(object.bucket, object.key)).digest('hex');
      // A fresh name each time: whoever still reads the old bytes gets them whole.
      const file = `${hash}-${randomBytes(6).toString('hex')}`;
      bytes.write(file, data);
      const stored = { ...object, file, bytes: data.byteLength, modifiedAtMs: now() };
      objects.put(idOf(object.bucket, object.key), stored);
      journal.flush();
      if (before !== undefined) bytes.drop(before.file);
      return stored;
    },
    get: (bucket, key) => objects.get(idOf(bucket, key)),
    read: (object) => bytes.read(object.file),
    remove: (bucket, key) => {
      const object = objects.get(idOf(bucket, key));
      if (object === undefined) return;
      objects.remove(idOf(bucket, key));
      journal.flush();
      bytes.drop(object.file);
    },
    close: () => journal.close(),
  };
}
