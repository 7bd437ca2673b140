import { door } from "@/lib/http/door";
import { importMarking } from "@/lib/services/marking/import-marking";

export const POST = door("POST /orgs/{org}/recordings/{recordingId}/marking/imports", ({ actor, params, body }) =>
  importMarking(actor, params.recordingId, body),
);
