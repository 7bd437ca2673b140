import type { Upload } from "@/db/queries/uploads";
import type { UploadView } from "@/lib/schemas/uploads";
import { getStore } from "@/storage/store";

/** An upload with the parts that the store has of it. @throws AppError("unavailable"; "gone" if the store has dropped an open one) */
export async function describeUpload(upload: Upload): Promise<UploadView> {
  const parts = upload.state === "open" ? await getStore().listParts(upload.storeKey, upload.storeUploadId) : [];
  return {
    uploadId: upload.id,
    purpose: upload.purpose,
    fileName: upload.fileName,
    sizeBytes: upload.sizeBytes,
    modifiedMs: upload.modifiedMs,
    partSizeBytes: upload.partSizeBytes,
    state: upload.state,
    receivedParts: parts.map((part) => part.partNumber),
    receivedBytes: parts.reduce((sum, part) => sum + part.sizeBytes, 0),
  };
}
