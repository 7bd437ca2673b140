import { getDb } from "@/db/client";
import { findFile, insertEvidence } from "@/db/queries/practice";
import { AppError } from "@/lib/core/errors";
import { pictureHeader, type PictureHeader } from "@/lib/core/evidence/picture-header";
import type { Actor } from "@/lib/core/roles";
import type { EvidenceInput } from "@/lib/schemas/tasks";
import { myTask } from "@/lib/services/practice/my-task";
import { getStore } from "@/storage/store";

/** Enough for the size to stand in it even behind a camera's long notes. */
const HEAD_BYTES = 256 * 1024;
const LARGEST_PIXELS = 60_000_000;
const LARGEST_BYTES = 40 * 1024 * 1024;

/**
 * Ties an uploaded photo of one's own to a task. The stored bytes say what it is, not its name.
 * @throws AppError("not_found" | "forbidden" | "invalid_input" for what is no picture, or too large a one | "conflict" for one used already)
 */
export async function addEvidence(actor: Actor, taskId: string, input: EvidenceInput): Promise<{ evidenceId: string }> {
  const organisationId = actor.organisation.id;
  await myTask(getDb(), actor, taskId);
  const file = await findFile(getDb(), organisationId, input.fileId);
  if (!file || file.createdBy !== actor.personId) throw new AppError("not_found", "That photo isn’t there. Add it again.");
  const header = await readHeader(file.storeKey, file.sizeBytes);
  return getDb().transaction(async (trx) => {
    const evidenceId = await insertEvidence(trx, {
      organisationId,
      apprenticeId: actor.personId,
      taskId,
      fileId: file.id,
      mediaType: header.mediaType,
      note: input.note,
    });
    if (!evidenceId) throw new AppError("conflict", "That photo is evidence already.");
    return { evidenceId };
  });
}

async function readHeader(storeKey: string, sizeBytes: number): Promise<PictureHeader> {
  if (sizeBytes > LARGEST_BYTES) throw new AppError("invalid_input", "That photo is larger than 40 MB. Take it again at a lower setting.");
  const { body } = await getStore().getObject(storeKey, { start: 0, end: Math.min(HEAD_BYTES, sizeBytes) - 1 });
  const chunks: Buffer[] = [];
  for await (const chunk of body) chunks.push(chunk as Buffer);
  const header = pictureHeader(Buffer.concat(chunks));
  if (!header) throw new AppError("invalid_input", "That file is not a photo (JPEG, PNG or WebP), whatever it is called.");
  if (header.width * header.height > LARGEST_PIXELS) {
    throw new AppError("invalid_input", `That picture claims ${header.width} × ${header.height} points, more than any camera here takes. It was refused.`);
  }
  return header;
}
