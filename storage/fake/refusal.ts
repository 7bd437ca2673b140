/** The S3 error codes that the store can answer with, and their HTTP status. Source: Amazon S3 API reference, "Error responses". */
const STATUS = {
  AccessDenied: 403,
  AccessForbidden: 403,
  AuthorizationHeaderMalformed: 400,
  AuthorizationQueryParametersError: 400,
  BadDigest: 400,
  BucketAlreadyOwnedByYou: 409,
  BucketNotEmpty: 409,
  EntityTooLarge: 400,
  EntityTooSmall: 400,
  IncompleteBody: 400,
  InternalError: 500,
  InvalidAccessKeyId: 403,
  InvalidArgument: 400,
  InvalidBucketName: 400,
  InvalidDigest: 400,
  InvalidPart: 400,
  InvalidPartOrder: 400,
  InvalidRange: 416,
  InvalidRequest: 400,
  InvalidURI: 400,
  KeyTooLongError: 400,
  MalformedTrailerError: 400,
  MalformedXML: 400,
  MethodNotAllowed: 405,
  MissingContentLength: 411,
  NoSuchBucket: 404,
  NoSuchKey: 404,
  NoSuchUpload: 404,
  NotImplemented: 501,
  NotModified: 304,
  PreconditionFailed: 412,
  RequestTimeTooSkewed: 403,
  SignatureDoesNotMatch: 403,
  XAmzContentSHA256Mismatch: 400,
} as const;

export type RefusalCode = keyof typeof STATUS;

/** A request that the store answers with an S3 error: code, sentence, and whatever elements or headers the code calls for. */
export class Refusal extends Error {
  readonly code: RefusalCode;
  readonly status: number;
  readonly details: Record<string, string>;
  readonly headers: Record<string, string>;

  constructor(
    code: RefusalCode,
    message: string,
    extra: { details?: Record<string, string>; headers?: Record<string, string> } = {},
  ) {
    super(message);
    this.name = "Refusal";
    this.code = code;
    this.status = STATUS[code];
    this.details = extra.details ?? {};
    this.headers = extra.headers ?? {};
  }
}
