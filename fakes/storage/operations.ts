// Which operation a request asks for, by method, path and query.
import {
  deleteObjects,
  dropBucket,
  headBucket,
  listBuckets,
  listObjects,
  locateBucket,
  makeBucket,
} from './bucket-operations';
import { StorageError } from './errors';
import { copyObject, deleteObject, getObject, putObject } from './object-operations';
import { headerOf, type StorageAnswer, type StorageRequest } from './request';

interface Operation {
  readonly name: string;
  run(request: StorageRequest): StorageAnswer | Promise<StorageAnswer>;
}

const operation = (name: string, run: Operation['run']): Operation => ({ name, run });

const unknown = (name: string): Operation =>
  operation(name, () => {
    throw new StorageError(
      'NotImplemented',
      'A header or query you provided implies functionality that is not implemented.',
    );
  });

/** Sub-resources that would change the meaning of a request if they were passed over. */
const UNKNOWN = [
  'uploads',
  'uploadId',
  'acl',
  'policy',
  'tagging',
  'versions',
  'cors',
  'lifecycle',
  'versioning',
];

function onBucket(method: string, query: URLSearchParams): Operation {
  if (method === 'PUT') return operation('CreateBucket', makeBucket);
  if (method === 'HEAD') return operation('HeadBucket', headBucket);
  if (method === 'DELETE') return operation('DeleteBucket', dropBucket);
  if (method === 'POST' && query.has('delete')) return operation('DeleteObjects', deleteObjects);
  if (method === 'GET' && query.has('location')) return operation('GetBucketLocation', locateBucket);
  if (method === 'GET') return operation('ListObjectsV2', listObjects);
  return unknown(`${method} bucket`);
}

function onObject(method: string, copySource: string | null): Operation {
  if (method === 'PUT' && copySource !== null)
    return operation('CopyObject', (request) => copyObject(request, copySource));
  if (method === 'PUT') return operation('PutObject', putObject);
  if (method === 'GET') return operation('GetObject', getObject);
  if (method === 'HEAD') return operation('HeadObject', getObject);
  if (method === 'DELETE') return operation('DeleteObject', deleteObject);
  return unknown(`${method} object`);
}

export function operationFor(request: Pick<StorageRequest, 'asked' | 'bucket' | 'key'>): Operation {
  const { asked, bucket, key } = request;
  const query = asked.url.searchParams;
  if (UNKNOWN.some((name) => query.has(name))) return unknown('sub-resource');
  if (bucket === '') return operation('ListBuckets', listBuckets);
  return key === ''
    ? onBucket(asked.method, query)
    : onObject(asked.method, headerOf(asked, 'x-amz-copy-source'));
}
