// Starting points for the tests of the object store's stand-in, through the vendor's own SDK.
import { S3Client, S3ServiceException, type S3ClientConfig } from '@aws-sdk/client-s3';
import { startStorageFake, type StorageFake, type StorageFakeOptions } from '../../fakes/storage/start';

export const BUCKET = 'yard-photos';
export const CREDENTIALS = { accessKeyId: 'TESTKEY', secretAccessKey: 'test/secret+key' };

export const clientFor = (fake: Pick<StorageFake, 'url'>, settings: S3ClientConfig = {}): S3Client =>
  new S3Client({
    endpoint: fake.url,
    region: 'us-east-1',
    forcePathStyle: true,
    credentials: CREDENTIALS,
    maxAttempts: 1,
    ...settings,
  });

export const givenStorage = (options: StorageFakeOptions = {}): Promise<StorageFake> =>
  startStorageFake({ ...CREDENTIALS, bucket: BUCKET, ...options });

/** What a call was refused with. */
export async function refusal(call: Promise<unknown>): Promise<{ name: string; status: number | undefined }> {
  try {
    await call;
  } catch (error) {
    if (error instanceof S3ServiceException)
      return { name: error.name, status: error.$metadata.httpStatusCode };
    throw error;
  }
  throw new Error('the call went through');
}
