// The only importer of the object store's SDK: put, get, delete and presigned links by key.
import {
  CreateBucketCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  PutObjectCommand,
  S3Client,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';

export interface StorageGateway {
  put(key: string, bytes: Buffer, contentType: string): Promise<void>;
  /** Null when there is no such object. */
  get(key: string): Promise<Buffer | null>;
  exists(key: string): Promise<boolean>;
  remove(key: string): Promise<void>;
  link(key: string, seconds: number): Promise<string>;
  /** Makes the bucket where it is missing. */
  prepare(): Promise<void>;
  ready(): Promise<void>;
  close(): void;
}

interface StorageSettings {
  readonly endpoint: string | undefined;
  readonly region: string;
  readonly bucket: string;
  readonly accessKeyId: string;
  readonly secretAccessKey: string;
}

const isMissing = (error: unknown): boolean =>
  error instanceof Error && ['NoSuchKey', 'NotFound', 'NoSuchBucket'].includes(error.name);

export function createStorageGateway(settings: StorageSettings): StorageGateway {
  const client = new S3Client({
    region: settings.region,
    ...(settings.endpoint ? { endpoint: settings.endpoint, forcePathStyle: true } : {}),
    credentials: { accessKeyId: settings.accessKeyId, secretAccessKey: settings.secretAccessKey },
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    maxAttempts: 3,
  });
  const Bucket = settings.bucket;
  const ready = async (): Promise<void> => {
    await client.send(new HeadBucketCommand({ Bucket }));
  };
  return {
    ready,
    put: async (Key, Body, ContentType) => {
      await client.send(
        new PutObjectCommand({ Bucket, Key, Body, ContentType, ContentLength: Body.byteLength }),
      );
    },
    get: async (Key) => {
      try {
        const answer = await client.send(new GetObjectCommand({ Bucket, Key }));
        return answer.Body ? Buffer.from(await answer.Body.transformToByteArray()) : null;
      } catch (error) {
        if (isMissing(error)) return null;
        throw error;
      }
    },
    exists: async (Key) => {
      try {
        await client.send(new HeadObjectCommand({ Bucket, Key }));
        return true;
      } catch (error) {
        if (isMissing(error)) return false;
        throw error;
      }
    },
    remove: async (Key) => {
      await client.send(new DeleteObjectCommand({ Bucket, Key }));
    },
    link: (Key, seconds) =>
      getSignedUrl(client, new GetObjectCommand({ Bucket, Key }), { expiresIn: seconds }),
    prepare: async () => {
      try {
        await ready();
      } catch (error) {
        if (!isMissing(error)) throw error;
        await client.send(new CreateBucketCommand({ Bucket }));
      }
    },
    close: () => client.destroy(),
  };
}
