/** S3 error codes this store answers with, and their HTTP status. */
const STATUS = {
  AccessDenied: 403,
  BadDigest: 400,
  BucketAlreadyOwnedByYou: 409,
  BucketNotEmpty: 409,
  EntityTooSmall: 400,
  IncompleteBody: 400,
  InternalError: 500,
  InvalidAccessKeyId: 403,
  InvalidArgument: 400,
  InvalidBucketName: 400,
  InvalidPart: 400,
  InvalidRange: 416,
  MalformedXML: 400,
  MethodNotAllowed: 405,
  MissingContentLength: 411,
  NoSuchBucket: 404,
  NoSuchKey: 404,
  NoSuchUpload: 404,
  NotImplemented: 501,
  PreconditionFailed: 412,
  RequestTimeTooSkewed: 403,
  SignatureDoesNotMatch: 403,
  SlowDown: 503,
  XAmzContentSHA256Mismatch: 400,
} as const;

export type StoreErrorCode = keyof typeof STATUS;

/** A refusal that becomes an S3 error document. */
export class StoreError extends Error {
  readonly status: number;

  constructor(
    readonly code: StoreErrorCode,
    message: string,
  ) {
    super(message);
    this.name = 'StoreError';
    this.status = STATUS[code];
  }
}
