import type { Authorised } from "@/storage/fake/authorise";
import { receiveBody, receiveText } from "@/storage/fake/body";
import { keyTurn, uploadTurn, type Bucket, type OpenUpload } from "@/storage/fake/bucket";
import {
  checksumElementName, checksumHeaderName, checksumTypeFor, joinChecksums, multipartEtag, readAlgorithm,
} from "@/storage/fake/checksums";
import { checkWriteConditions } from "@/storage/fake/conditions";
import { checksumElements, checksumHeaders, keptHeaders } from "@/storage/fake/object-requests";
import type { PartRecord } from "@/storage/fake/records";
import { Refusal } from "@/storage/fake/refusal";
import { amzHeader, numberParam, param, type StoreRequest } from "@/storage/fake/request";
import { isoTime, type Reply } from "@/storage/fake/reply";
import { childText, readXml } from "@/storage/fake/xml";

// Source: Amazon S3 user guide, "Amazon S3 multipart upload limits".
const MIN_PART_BYTES = 5 * 1024 * 1024;
const MAX_PARTS = 10_000;
const PAGE = 1000;
const MAX_LIST_BYTES = 4 * 1024 * 1024;

function findUpload(bucket: Bucket, request: StoreRequest): OpenUpload {
  const upload = bucket.uploads.get(param(request, "uploadId") ?? "");
  if (!upload || upload.key !== request.key) {
    throw new Refusal("NoSuchUpload", "The specified upload does not exist. It may have been aborted or completed.");
  }
  return upload;
}

export async function startUpload(bucket: Bucket, request: StoreRequest): Promise<Reply> {
  const asked = amzHeader(request, "x-amz-checksum-algorithm");
  const algorithm = asked === undefined ? undefined : readAlgorithm(asked);
  const checksum = algorithm && { algorithm, type: checksumTypeFor(algorithm, amzHeader(request, "x-amz-checksum-type")) };
  const id = await bucket.startUpload({ key: request.key, startedMs: Date.now(), headers: keptHeaders(request), checksum });
  const headers: Record<string, string> = checksum
    ? { "x-amz-checksum-algorithm": checksum.algorithm, "x-amz-checksum-type": checksum.type }
    : {};
  const content = { Bucket: request.bucket, Key: request.key, UploadId: id };
  return { status: 200, headers, xml: { name: "InitiateMultipartUploadResult", content } };
}

export async function putPart(bucket: Bucket, request: StoreRequest, auth: Authorised): Promise<Reply> {
  const number = numberParam(request, "partNumber", Number.NaN, 1, MAX_PARTS);
  if (Number.isNaN(number)) throw new Refusal("InvalidArgument", "This request needs a partNumber.");
  if (amzHeader(request, "x-amz-copy-source") !== undefined) throw new Refusal("NotImplemented", "Parts can't be copied here.");
  const { checksum: agreed } = findUpload(bucket, request);
  const body = receiveBody(request, auth, agreed?.algorithm);
  const piece = await bucket.data.write(body.chunks);
  try {
    const checksum = body.checksum();
    if (agreed && checksum?.algorithm !== agreed.algorithm) {
      throw new Refusal("InvalidRequest", `Checksum Type mismatch occurred, expected checksum Type: ${agreed.algorithm}.`);
    }
    const etag = body.md5();
    await bucket.inTurn(uploadTurn(param(request, "uploadId") ?? ""), () =>
      bucket.putPart(findUpload(bucket, request), { number, etag, modifiedMs: Date.now(), piece, checksum: agreed && checksum?.value }),
    );
    const headers: Record<string, string> = checksum ? { [checksumHeaderName(checksum.algorithm)]: checksum.value } : {};
    return { status: 200, headers: { etag: `"${etag}"`, ...headers } };
  } catch (error) {
    await bucket.data.remove([piece.file]);
    throw error;
  }
}

const sorted = (upload: OpenUpload): PartRecord[] => [...upload.parts.values()].sort((a, b) => a.number - b.number);

export function listParts(bucket: Bucket, request: StoreRequest): Reply {
  const upload = findUpload(bucket, request);
  const marker = numberParam(request, "part-number-marker", 0, 0, MAX_PARTS);
  const max = Math.min(numberParam(request, "max-parts", PAGE, 1, 999_999_999), PAGE);
  const rest = sorted(upload).filter((part) => part.number > marker);
  const page = rest.slice(0, max);
  const algorithm = upload.checksum?.algorithm;
  const content = {
    Bucket: request.bucket,
    Key: upload.key,
    UploadId: upload.id,
    PartNumberMarker: marker,
    NextPartNumberMarker: page.at(-1)?.number ?? 0,
    MaxParts: max,
    IsTruncated: rest.length > page.length,
    ChecksumAlgorithm: algorithm,
    ChecksumType: upload.checksum?.type,
    Part: page.map((part) => ({
      PartNumber: part.number,
      LastModified: isoTime(part.modifiedMs),
      ETag: `"${part.etag}"`,
      Size: part.piece.sizeBytes,
      ...(algorithm ? { [checksumElementName(algorithm)]: part.checksum } : {}),
    })),
  };
  return { status: 200, xml: { name: "ListPartsResult", content } };
}

/** The parts that the client names, in its order, held against those that arrived. */
function chooseParts(upload: OpenUpload, text: string): PartRecord[] {
  const document = readXml(text);
  const named = document.children.filter((child) => child.name === "Part");
  if (document.name !== "CompleteMultipartUpload" || named.length === 0) {
    throw new Refusal("MalformedXML", "The XML must name at least one part.");
  }
  let before = 0;
  const parts = named.map((element) => {
    const number = Number(childText(element, "PartNumber"));
    const etag = childText(element, "ETag")?.trim().replace(/^"|"$/g, "");
    const part = upload.parts.get(number);
    const checksum = upload.checksum && childText(element, checksumElementName(upload.checksum.algorithm));
    if (!part || part.etag !== etag || (checksum !== undefined && checksum !== part.checksum)) {
      throw new Refusal("InvalidPart", "One or more of the specified parts could not be found, or its ETag did not match.", {
        details: { PartNumber: String(number) },
      });
    }
    if (number <= before) throw new Refusal("InvalidPartOrder", "The list of parts was not in ascending order.");
    before = number;
    return part;
  });
  const small = parts.slice(0, -1).find((part) => part.piece.sizeBytes < MIN_PART_BYTES);
  if (small) {
    throw new Refusal("EntityTooSmall", "Your proposed upload is smaller than the minimum allowed size", {
      details: { PartNumber: String(small.number), ProposedSize: String(small.piece.sizeBytes), MinSizeAllowed: String(MIN_PART_BYTES) },
    });
  }
  return parts;
}

/** Makes the object out of the parts where they lie: nothing is copied, so it takes as long for gigabytes as for bytes. */
export async function completeUpload(bucket: Bucket, request: StoreRequest, auth: Authorised): Promise<Reply> {
  const id = findUpload(bucket, request).id;
  const text = await receiveText(request, auth, MAX_LIST_BYTES);
  return bucket.inTurn(uploadTurn(id), async () => {
    const upload = findUpload(bucket, request);
    const parts = chooseParts(upload, text);
    const pieces = parts.map((part) => part.piece).filter((piece) => piece.sizeBytes > 0);
    const sizeBytes = pieces.reduce((sum, piece) => sum + piece.sizeBytes, 0);
    const expected = amzHeader(request, "x-amz-mp-object-size");
    if (expected !== undefined && Number(expected) !== sizeBytes) {
      throw new Refusal("InvalidRequest", "The provided x-amz-mp-object-size is not the size of the parts together.");
    }
    const { algorithm, type } = upload.checksum ?? {};
    const checksum = algorithm && type
      ? joinChecksums(algorithm, type, parts.map((part) => ({ checksum: part.checksum ?? "", sizeBytes: part.piece.sizeBytes })))
      : undefined;
    const claimed = algorithm && amzHeader(request, checksumHeaderName(algorithm));
    if (claimed !== undefined && checksum && claimed !== checksum.value) {
      throw new Refusal("BadDigest", `The ${checksum.algorithm} you specified did not match the calculated checksum.`);
    }
    const etag = multipartEtag(parts.map((part) => part.etag));
    await bucket.inTurn(keyTurn(upload.key), async () => {
      checkWriteConditions(request.headers, bucket.find(upload.key));
      await bucket.put({ key: upload.key, etag, sizeBytes, modifiedMs: Date.now(), headers: upload.headers, pieces, checksum });
    });
    await bucket.endUpload(upload, new Set(pieces.map((piece) => piece.file)));
    const content = {
      Location: `/${request.bucket}/${upload.key}`,
      Bucket: request.bucket,
      Key: upload.key,
      ETag: `"${etag}"`,
      ...checksumElements(checksum),
    };
    return { status: 200, headers: checksumHeaders(checksum), xml: { name: "CompleteMultipartUploadResult", content } };
  });
}

export async function abortUpload(bucket: Bucket, request: StoreRequest): Promise<Reply> {
  const { id } = findUpload(bucket, request);
  return bucket.inTurn(uploadTurn(id), async () => {
    await bucket.endUpload(findUpload(bucket, request), new Set());
    return { status: 204 };
  });
}

export function listUploads(bucket: Bucket, request: StoreRequest): Reply {
  const prefix = param(request, "prefix") ?? "";
  const max = Math.min(numberParam(request, "max-uploads", PAGE, 1, 999_999_999), PAGE);
  const keyMarker = param(request, "key-marker") ?? "";
  const idMarker = param(request, "upload-id-marker") ?? "";
  const order = (upload: { key: string; id: string }) => Buffer.from(`${upload.key}\u0000${upload.id}`);
  // Without an upload id the marker means all uploads of that key.
  const marker = order({ key: keyMarker, id: idMarker === "" ? "\uffff" : idMarker });
  const rest = [...bucket.uploads.values()]
    .filter((upload) => upload.key.startsWith(prefix) && (keyMarker === "" || Buffer.compare(order(upload), marker) > 0))
    .sort((a, b) => Buffer.compare(order(a), order(b)));
  const page = rest.slice(0, max);
  const isTruncated = rest.length > page.length;
  const content = {
    Bucket: request.bucket,
    KeyMarker: keyMarker,
    UploadIdMarker: idMarker,
    NextKeyMarker: isTruncated ? page.at(-1)?.key : undefined,
    NextUploadIdMarker: isTruncated ? page.at(-1)?.id : undefined,
    Prefix: prefix,
    MaxUploads: max,
    IsTruncated: isTruncated,
    Upload: page.map((upload) => ({ Key: upload.key, UploadId: upload.id, Initiated: isoTime(upload.startedMs), StorageClass: "STANDARD" })),
  };
  return { status: 200, xml: { name: "ListMultipartUploadsResult", content } };
}
