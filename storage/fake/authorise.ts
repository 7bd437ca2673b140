import { timingSafeEqual } from "node:crypto";
import { Refusal } from "@/storage/fake/refusal";
import { param, type RequestFacts } from "@/storage/fake/request";
import {
  ALGORITHM, UNSIGNED_PAYLOAD, canonicalRequest, parseAmzDate, signText, signingKey, stringToSign, type Scope,
} from "@/storage/fake/signature";

export type Credentials = { accessKeyId: string; secretAccessKey: string };

/** A request whose signature holds, and what the signatures of its chunks are chained to. */
export type Authorised = { payloadHash: string; signature: string; date: string; scope: Scope; key: Buffer };

/** What a request claims about itself, from its header or its query. */
type Claim = { credential: string; signedHeaders: string[]; signature: string; date: string; payloadHash: string };

const SKEW_MS = 15 * 60_000;
const MAX_EXPIRES_SECONDS = 604_800;

function presignedClaim(request: RequestFacts, nowMs: number): Claim {
  const wrong = (message: string) => new Refusal("AuthorizationQueryParametersError", message);
  const read = (name: string) => {
    const value = param(request, name);
    if (value === undefined) throw wrong(`The query lacks ${name}.`);
    return value;
  };
  if (read("X-Amz-Algorithm") !== ALGORITHM) throw wrong(`X-Amz-Algorithm must be ${ALGORITHM}.`);
  const date = read("X-Amz-Date");
  const signedMs = parseAmzDate(date);
  if (signedMs === undefined) throw wrong("X-Amz-Date must have the form yyyymmddThhmmssZ.");
  const expires = Number(/^\d{1,7}$/.exec(read("X-Amz-Expires"))?.[0] ?? Number.NaN);
  if (!(expires >= 1 && expires <= MAX_EXPIRES_SECONDS)) throw wrong("X-Amz-Expires must be 1 to 604800 seconds.");
  if (signedMs > nowMs + SKEW_MS) throw new Refusal("AccessDenied", "Request is not yet valid");
  if (nowMs > signedMs + expires * 1000) throw new Refusal("AccessDenied", "Request has expired");
  return {
    date,
    credential: read("X-Amz-Credential"),
    signedHeaders: read("X-Amz-SignedHeaders").split(";"),
    signature: read("X-Amz-Signature"),
    payloadHash: request.headers["x-amz-content-sha256"] ?? param(request, "X-Amz-Content-Sha256") ?? UNSIGNED_PAYLOAD,
  };
}

function headerClaim(request: RequestFacts, authorization: string, nowMs: number): Claim {
  const fields = /^AWS4-HMAC-SHA256\s+Credential=([^,\s]+),\s*SignedHeaders=([^,\s]+),\s*Signature=([0-9a-f]{64})$/.exec(authorization);
  if (!fields) throw new Refusal("AuthorizationHeaderMalformed", "The authorization header is not of the form AWS4-HMAC-SHA256.");
  const [, credential = "", signedHeaders = "", signature = ""] = fields;
  const payloadHash = request.headers["x-amz-content-sha256"];
  if (payloadHash === undefined) throw new Refusal("InvalidRequest", "Missing required header for this request: x-amz-content-sha256");
  const date = request.headers["x-amz-date"] ?? "";
  const signedMs = parseAmzDate(date);
  if (signedMs === undefined) throw new Refusal("AccessDenied", "AWS authentication requires a valid x-amz-date header");
  if (Math.abs(nowMs - signedMs) > SKEW_MS) {
    throw new Refusal("RequestTimeTooSkewed", "The difference between the request time and the current time is too large.");
  }
  return { credential, signedHeaders: signedHeaders.split(";"), signature, date, payloadHash };
}

function readScope(claim: Claim, accessKeyId: string): Scope {
  const match = /^(.+)\/(\d{8})\/([^/]+)\/s3\/aws4_request$/.exec(claim.credential);
  if (!match) throw new Refusal("AuthorizationHeaderMalformed", "The credential must end in /s3/aws4_request.");
  const [, id, day = "", region = ""] = match;
  if (id !== accessKeyId) throw new Refusal("InvalidAccessKeyId", "The access key id does not exist in our records.");
  if (!claim.date.startsWith(day)) throw new Refusal("AuthorizationHeaderMalformed", "The credential's day is not that of the request.");
  return { day, region, service: "s3" };
}

/** The host and every x-amz- header must be covered, else a header could be added to a signed request on its way. */
function refuseUnsigned(request: RequestFacts, signedHeaders: readonly string[]): void {
  const mustSign = Object.keys(request.headers).filter((name) => name === "host" || name.startsWith("x-amz-"));
  const unsigned = mustSign.filter((name) => !signedHeaders.includes(name));
  if (unsigned.length === 0) return;
  throw new Refusal("AccessDenied", "There were headers present in the request which were not signed", {
    details: { HeadersNotSigned: unsigned.join(", ") },
  });
}

/**
 * Checks the SigV4 signature of a request, in its header or in its query.
 * @param nowMs the store's clock.
 * @throws Refusal with S3's own code for each way to fail.
 * @source Amazon S3 API reference, "Authenticating requests (AWS Signature Version 4)".
 */
export function authorise(request: RequestFacts, credentials: Credentials, nowMs: number): Authorised {
  const { authorization } = request.headers;
  const presigned = param(request, "X-Amz-Signature") !== undefined;
  if (authorization === undefined && !presigned) throw new Refusal("AccessDenied", "Access Denied");
  if (authorization !== undefined && presigned) {
    throw new Refusal("InvalidArgument", "Only one auth mechanism allowed; only the query or the header may carry a signature.");
  }
  const claim = authorization === undefined ? presignedClaim(request, nowMs) : headerClaim(request, authorization, nowMs);
  const scope = readScope(claim, credentials.accessKeyId);
  refuseUnsigned(request, claim.signedHeaders);

  const query = request.query.filter(([name]) => name !== "X-Amz-Signature");
  const canonical = canonicalRequest({ ...request, ...claim, query });
  const text = stringToSign(claim.date, scope, canonical);
  const key = signingKey(credentials.secretAccessKey, scope);
  const expected = Buffer.from(signText(key, text));
  const given = Buffer.from(claim.signature);
  if (expected.length !== given.length || !timingSafeEqual(expected, given)) {
    throw new Refusal("SignatureDoesNotMatch", "The request signature we calculated does not match the signature you provided.", {
      details: { StringToSign: text, CanonicalRequest: canonical },
    });
  }
  return { payloadHash: claim.payloadHash, signature: claim.signature, date: claim.date, scope, key };
}
