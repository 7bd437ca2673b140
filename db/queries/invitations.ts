import type { Knex } from "knex";
import type { Db } from "@/db/client";
import type { Role } from "@/lib/core/roles";

export type NewInvitation = {
  organisationId: string;
  name: string;
  /** Lower case. */
  email: string;
  roles: Role[];
  /** Of the link's token; the token itself is in the letter and nowhere else. */
  tokenHash: string;
  /** Null for the first manager, who is invited by a command. */
  invitedBy: string | null;
  days: number;
};

/** Writes an invitation and returns its id. */
export async function insertInvitation(trx: Knex.Transaction, invitation: NewInvitation): Promise<string> {
  const [row] = await trx("invitations")
    .insert({
      organisation_id: invitation.organisationId,
      name: invitation.name,
      email: invitation.email,
      roles: invitation.roles,
      token_hash: invitation.tokenHash,
      invited_by: invitation.invitedBy,
      expires_at: trx.raw("now() + make_interval(days => ?)", [invitation.days]),
    })
    .returning<{ id: string }[]>("id");
  if (!row) throw new Error("The invitation's row did not come back.");
  return row.id;
}

export type InvitationState = "open" | "accepted" | "withdrawn" | "expired";

export type Invitation = {
  id: string;
  organisationId: string;
  name: string;
  email: string;
  roles: Role[];
  invitedBy: string | null;
  createdAt: Date;
  expiresAt: Date;
  acceptedBy: string | null;
  state: InvitationState;
};

type InvitationRow = {
  id: string;
  organisation_id: string;
  name: string;
  email: string;
  roles: Role[];
  invited_by: string | null;
  created_at: Date;
  expires_at: Date;
  accepted_by: string | null;
  state: InvitationState;
};

const invitationsWithState = (db: Db) =>
  db("invitations").select<InvitationRow[]>(
    ..."id organisation_id name email roles invited_by created_at expires_at accepted_by".split(" "),
    db.raw(
      `CASE WHEN accepted_at IS NOT NULL THEN 'accepted' WHEN withdrawn_at IS NOT NULL THEN 'withdrawn'
            WHEN expires_at <= now() THEN 'expired' ELSE 'open' END AS state`,
    ),
  );

const toInvitation = (row: InvitationRow): Invitation => ({
  id: row.id,
  organisationId: row.organisation_id,
  name: row.name,
  email: row.email,
  roles: row.roles,
  invitedBy: row.invited_by,
  createdAt: row.created_at,
  expiresAt: row.expires_at,
  acceptedBy: row.accepted_by,
  state: row.state,
});

export async function findInvitationByToken(db: Db, tokenHash: string): Promise<Invitation | undefined> {
  const row = await invitationsWithState(db).where({ token_hash: tokenHash }).first();
  return row && toInvitation(row);
}

/** Locks the invitation, so that two tabs can't both accept it. */
export async function lockInvitationByToken(trx: Knex.Transaction, tokenHash: string): Promise<Invitation | undefined> {
  const row = await invitationsWithState(trx).where({ token_hash: tokenHash }).forUpdate().first();
  return row && toInvitation(row);
}

export async function lockInvitation(trx: Knex.Transaction, organisationId: string, id: string): Promise<Invitation | undefined> {
  const row = await invitationsWithState(trx).where({ organisation_id: organisationId, id }).forUpdate().first();
  return row && toInvitation(row);
}

/** Invitations that are neither accepted nor withdrawn, newest first; those past their date among them, so that they can be sent again. */
export async function listPendingInvitations(db: Db, organisationId: string): Promise<Invitation[]> {
  const rows = await invitationsWithState(db)
    .where({ organisation_id: organisationId })
    .whereNull("accepted_at")
    .whereNull("withdrawn_at")
    .orderBy("created_at", "desc");
  return rows.map(toInvitation);
}

/** One writer at a time for one address at one organisation, until the transaction ends: two tabs can't both invite it. */
export async function lockInvitedAddress(trx: Knex.Transaction, organisationId: string, email: string): Promise<void> {
  await trx.raw(`SELECT pg_advisory_xact_lock(hashtextextended(?, 7260002))`, [`${organisationId} ${email}`]);
}

export async function markInvitationAccepted(trx: Knex.Transaction, id: string, personId: string): Promise<void> {
  await trx("invitations").where({ id }).update({ accepted_at: trx.fn.now(), accepted_by: personId });
}

export async function markInvitationWithdrawn(trx: Knex.Transaction, id: string): Promise<void> {
  await trx("invitations").where({ id }).update({ withdrawn_at: trx.fn.now() });
}

/** Gives an invitation a new link and a new end; the old link finds nothing from then on. */
export async function renewInvitation(trx: Knex.Transaction, id: string, of: { tokenHash: string; days: number }): Promise<void> {
  await trx("invitations")
    .where({ id })
    .update({ token_hash: of.tokenHash, expires_at: trx.raw("now() + make_interval(days => ?)", [of.days]) });
}
