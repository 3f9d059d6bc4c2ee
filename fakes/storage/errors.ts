// The errors of the object store's API: a code, a status, and a sentence, sent as XML.

const STATUS = {
  AccessDenied: 403,
  AuthorizationHeaderMalformed: 400,
  AuthorizationQueryParametersError: 400,
  BadDigest: 400,
  BucketAlreadyOwnedByYou: 409,
  BucketNotEmpty: 409,
  EntityTooLarge: 400,
  IncompleteBody: 400,
  InternalError: 500,
  InvalidAccessKeyId: 403,
  InvalidArgument: 400,
  InvalidBucketName: 400,
  InvalidDigest: 400,
  InvalidRange: 416,
  InvalidRequest: 400,
  InvalidURI: 400,
  KeyTooLongError: 400,
  MalformedXML: 400,
  MethodNotAllowed: 405,
  MissingContentLength: 411,
  NoSuchBucket: 404,
  NoSuchKey: 404,
  NotImplemented: 501,
  NotModified: 304,
  PreconditionFailed: 412,
  RequestTimeTooSkewed: 403,
  SignatureDoesNotMatch: 403,
  SlowDown: 503,
  XAmzContentSHA256Mismatch: 400,
} as const;

export type StorageErrorCode = keyof typeof STATUS;

export class StorageError extends Error {
  readonly code: StorageErrorCode;
  readonly status: number;
  /** Further elements of the XML, by name. */
  readonly details: Readonly<Record<string, string>>;
  constructor(code: StorageErrorCode, message: string, details: Readonly<Record<string, string>> = {}) {
    super(message);
    this.name = 'StorageError';
    this.code = code;
    this.status = STATUS[code];
    this.details = details;
  }
}
