import { readdirSync } from "node:fs";
import { expect, test } from "vitest";
import { GRANTS } from "@/db/grants";
import { MIGRATIONS } from "@/db/migrations/all";
import { testDatabase } from "../support/database";
import { createAgreement, createMember, createOrganisation } from "../support/factories";

const { db, owner } = testDatabase();

test("the list of migrations holds every file of the folder, in order", () => {
  const files = readdirSync("db/migrations").filter((file) => /^\d{14}_/.test(file)).map((file) => file.replace(/\.ts$/, ""));
  expect(Object.keys(MIGRATIONS)).toEqual(files.sort());
});

test("every table says what the application's role may do with it, and it may do just that", async () => {
  const { rows: tables } = await owner().raw(
    `SELECT tablename FROM pg_tables WHERE schemaname = 'public' AND tablename NOT LIKE 'knex_%' ORDER BY 1`,
  );
  expect(Object.keys(GRANTS).sort()).toEqual(tables.map((row: { tablename: string }) => row.tablename));
  for (const [table, privileges] of Object.entries(GRANTS)) {
    for (const privilege of ["SELECT", "INSERT", "UPDATE", "DELETE", "TRUNCATE"]) {
      const { rows } = await db().raw(`SELECT has_table_privilege(?, ?) AS may`, [table, privilege]);
      expect(rows[0].may, `${privilege} on ${table}`).toBe((privileges as string[]).includes(privilege));
    }
  }
});

test.each(["module_revisions", "task_revisions", "answers", "ledger_entries", "sign_offs", "sign_off_changes"])(
  "%s refuses change even to the owner of the database",
  async (table) => {
    await expect(owner().raw(`UPDATE ?? SET organisation_id = organisation_id`, [table])).rejects.toThrow(/written once/);
    await expect(owner().raw(`DELETE FROM ??`, [table])).rejects.toThrow(/written once/);
    await expect(owner().raw(`TRUNCATE ?? CASCADE`, [table])).rejects.toThrow(/written once/);
  },
);

// RFC 9562, section 5.7: version 7 in bits 48–51, variant 10 in bits 64–65, Unix milliseconds in the first 48 bits.
test("keys are UUIDs of version 7 that carry the time", async () => {
  const { rows } = await db().raw(`SELECT uuid_v7()::text AS id, floor(extract(epoch FROM clock_timestamp()) * 1000) AS now`);
  expect(rows[0].id).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  const stamped = Number.parseInt(rows[0].id.replaceAll("-", "").slice(0, 12), 16);
  expect(Math.abs(stamped - Number(rows[0].now))).toBeLessThan(1000);
});

test("an apprentice has one training agreement at a time, and may change workshop the day after the last one ends", async () => {
  const [first, second, college] = [await createOrganisation(), await createOrganisation(), await createOrganisation("college")];
  const apprentice = await createMember(first, "apprentice");
  await createAgreement({ apprentice, workshop: first, college, startsOn: "2025-01-01", endsOn: "2025-06-30" });
  await expect(createAgreement({ apprentice, workshop: second, college, startsOn: "2025-06-30" })).rejects.toThrow(/one_at_a_time/);
  await createAgreement({ apprentice, workshop: second, college, startsOn: "2025-07-01" });
  expect(await db()("training_agreements").where({ apprentice_id: apprentice.personId })).toHaveLength(2);
});

test("a college can't stand in the workshop's place of an agreement", async () => {
  const college = await createOrganisation("college");
  const apprentice = await createMember(college, "apprentice");
  await expect(createAgreement({ apprentice, workshop: college, college })).rejects.toThrow(/foreign key/);
});

test("a recording can't borrow a vehicle of another organisation", async () => {
  const [ours, theirs] = [await createOrganisation(), await createOrganisation()];
  const mentor = await createMember(ours, "mentor");
  const [vehicle] = await db()("vehicles").insert({ organisation_id: theirs.id, label: "V1", model: "Demo" }).returning("id");
  const [file] = await db()("files")
    .insert({ organisation_id: ours.id, store_key: `k/${ours.slug}`, media_type: "video/mp4", size_bytes: 1 })
    .returning("id");
  const recording = { organisation_id: ours.id, title: "t", recorded_by: mentor.personId, source_file_id: file.id };
  await expect(db()("recordings").insert({ ...recording, vehicle_id: vehicle.id })).rejects.toThrow(/foreign key/);
  await db()("recordings").insert(recording);
  expect(await db()("recordings").where({ organisation_id: ours.id })).toHaveLength(1);
});
