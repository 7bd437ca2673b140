import { connect } from "@/db/client";
import { DEMO_PASSWORD } from "@/db/seeds/demo/cast";
import { loadDemo } from "@/db/seeds/demo/load-demo";
import type { PutFile } from "@/db/seeds/demo/seed-work";
import { hashPassword } from "@/lib/auth/passwords";
import { today } from "@/lib/services/clock";
import { evidenceKey, renditionKey } from "@/storage/keys";
import { getStore } from "@/storage/store";

const KEY_OF = { "480p": "480p", "720p": "720p", poster: "poster", storyboard_sheet: "storyboard", storyboard_track: "storyboardTrack" } as const;

const putFile: PutFile = async ({ organisationId, subjectId, kind }, path, contentType) => {
  const storeKey =
    kind === "evidence" ? evidenceKey({ organisationId, evidenceId: subjectId }) : renditionKey({ organisationId, recordingId: subjectId }, KEY_OF[kind]);
  const { sizeBytes } = await getStore().uploadFromFile(storeKey, path, { contentType });
  return { storeKey, sizeBytes };
};

// Loads the invented people, films and months of history into an empty installation. Needs the owner's connection, since the demo's
// past is written with its own times.
async function main(): Promise<void> {
  const url = process.env.MIGRATION_DATABASE_URL ?? process.env.DATABASE_URL;
  if (!url) throw new Error("Set MIGRATION_DATABASE_URL (or DATABASE_URL).");
  const db = connect(url, 2);
  try {
    await getStore().ensureBucket();
    const loaded = await loadDemo(db, { day: today(), passwordHash: await hashPassword(DEMO_PASSWORD), putFile });
    console.log(loaded ? "loaded" : "loaded before");
  } finally {
    await db.destroy();
  }
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
});
