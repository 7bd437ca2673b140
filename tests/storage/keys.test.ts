import { expect, test } from "vitest";
import { AppError } from "@/lib/core/errors";
import { RENDITIONS, evidenceKey, evidencePictureKey, organisationPrefix, recordingPrefix, renditionKey, sourceKey, type Rendition } from "@/storage/keys";

const organisationId = "0197f3a0-0000-7000-8000-000000000001";
const recordingId = "0197f3a0-0000-7000-8000-000000000002";
const evidenceId = "0197f3a0-0000-7000-8000-000000000003";

test("every key begins with its organisation, a recording's with the recording", () => {
  const ids = { organisationId, recordingId };
  const keys = [sourceKey(ids), ...(Object.keys(RENDITIONS) as Rendition[]).map((rendition) => renditionKey(ids, rendition))];
  for (const key of keys) expect(key.startsWith(recordingPrefix(ids))).toBe(true);
  const evidence = [evidenceKey({ organisationId, evidenceId }), evidencePictureKey({ organisationId, evidenceId })];
  for (const key of [...keys, ...evidence]) expect(key.startsWith(organisationPrefix(organisationId))).toBe(true);
  expect(new Set([...keys, ...evidence]).size).toBe(keys.length + evidence.length);
});

test.each(["", "..", "../0197f3a0-0000-7000-8000-000000000001", "north-bay", "0197F3A0-0000-7000-8000-000000000001", `${recordingId}/x`])(
  "nothing but an id goes into a key: %j",
  (bad) => {
    expect(() => sourceKey({ organisationId, recordingId: bad })).toThrow(AppError);
    expect(() => evidenceKey({ organisationId: bad, evidenceId })).toThrow(AppError);
  },
);
