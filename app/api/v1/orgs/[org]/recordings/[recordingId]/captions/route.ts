import { door } from "@/lib/http/door";
import { importCaptions } from "@/lib/services/recordings/import-captions";

export const PUT = door("PUT /orgs/{org}/recordings/{recordingId}/captions", ({ actor, params, body }) =>
  importCaptions(actor, params.recordingId, body),
);
