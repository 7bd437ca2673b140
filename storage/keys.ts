import { AppError } from "@/lib/core/errors";

/** What a worker makes out of a recording, and the name and type of its file. */
export const RENDITIONS = {
  "480p": { file: "480p.mp4", contentType: "video/mp4" },
  "720p": { file: "720p.mp4", contentType: "video/mp4" },
  poster: { file: "poster.jpg", contentType: "image/jpeg" },
  storyboard: { file: "storyboard.jpg", contentType: "image/jpeg" },
  storyboardTrack: { file: "storyboard.vtt", contentType: "text/vtt" },
  peaks: { file: "peaks.json", contentType: "application/json" },
} as const;
export type Rendition = keyof typeof RENDITIONS;

export type RecordingIds = { organisationId: string; recordingId: string };
export type EvidenceIds = { organisationId: string; evidenceId: string };

// Only ids make up a key: it shows in addresses and logs, so no name, file name or other word of a person may stand in it.
const ID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;

function id(value: string): string {
  if (!ID.test(value)) throw new AppError("invalid_input", "A key is made of ids only.");
  return value;
}

/** Begins every key of an organisation, so that a policy, a bill or an erasure can take it whole. @throws AppError("invalid_input") */
export const organisationPrefix = (organisationId: string): string => `organisations/${id(organisationId)}/`;

/** Begins every key of a recording, its source and all renditions. @throws AppError("invalid_input") */
export const recordingPrefix = ({ organisationId, recordingId }: RecordingIds): string =>
  `${organisationPrefix(organisationId)}recordings/${id(recordingId)}/`;

/** The bytes as they were uploaded; they are never changed. @throws AppError("invalid_input") */
export const sourceKey = (ids: RecordingIds): string => `${recordingPrefix(ids)}source`;

/** A rendition's key, the same every time, so that a job that runs twice writes the same object. @throws AppError("invalid_input") */
export const renditionKey = (ids: RecordingIds, rendition: Rendition): string => `${recordingPrefix(ids)}${RENDITIONS[rendition].file}`;

/** A photo or clip attached to a task, as it was uploaded. @throws AppError("invalid_input") */
export const evidenceKey = ({ organisationId, evidenceId }: EvidenceIds): string =>
  `${organisationPrefix(organisationId)}evidence/${id(evidenceId)}/original`;

/** The picture that screens show of it: turned upright, made smaller, without the camera's data. @throws AppError("invalid_input") */
export const evidencePictureKey = ({ organisationId, evidenceId }: EvidenceIds): string =>
  `${organisationPrefix(organisationId)}evidence/${id(evidenceId)}/picture.jpg`;
