import { api } from "@/components/api/client";
import type { CompletedUpload, StartUploadInput, UploadView } from "@/lib/schemas/uploads";

/** What an uploader asks of the server; the bytes don't go there. */
export type UploadDoors = {
  start(input: StartUploadInput): Promise<UploadView>;
  status(uploadId: string): Promise<UploadView>;
  addresses(uploadId: string, partNumbers: number[]): Promise<{ partNumber: number; url: string }[]>;
  complete(uploadId: string): Promise<CompletedUpload>;
  cancel(uploadId: string): Promise<unknown>;
};

/** The doors of an organisation. */
export const uploadDoors = (org: string): UploadDoors => ({
  start: (body) => api("POST /orgs/{org}/uploads", { params: { org }, body }),
  status: (uploadId) => api("GET /orgs/{org}/uploads/{uploadId}", { params: { org, uploadId } }),
  addresses: async (uploadId, partNumbers) =>
    (await api("POST /orgs/{org}/uploads/{uploadId}/part-addresses", { params: { org, uploadId }, body: { partNumbers } })).parts,
  complete: (uploadId) => api("POST /orgs/{org}/uploads/{uploadId}/completion", { params: { org, uploadId } }),
  cancel: (uploadId) => api("DELETE /orgs/{org}/uploads/{uploadId}", { params: { org, uploadId } }),
});
