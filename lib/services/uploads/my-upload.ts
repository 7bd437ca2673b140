import type { Upload } from "@/db/queries/uploads";
import { AppError } from "@/lib/core/errors";
import type { Actor } from "@/lib/core/roles";

/** Holds an upload to be the actor's own: to anybody else there is none. @throws AppError("not_found") */
export function myUpload(actor: Actor, upload: Upload | undefined): Upload {
  if (!upload || upload.personId !== actor.personId) throw new AppError("not_found", "There is no such upload of yours.");
  return upload;
}
