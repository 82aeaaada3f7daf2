import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { Role } from "#app/domain/shop/permissions.ts";
import { newId } from "#app/services/ids.server.ts";

export interface Invitation {
  id: string;
  email: string;
  role: Role;
  expiresAt: Date;
}

/** Invitations not yet accepted nor out of date, by address. */
export async function listInvitations(db: Knex, actor: Pick<Actor, "shopId">, now: Date): Promise<Invitation[]> {
  return db("invitations")
    .where({ shop_id: actor.shopId })
    .whereNull("accepted_at")
    .where("expires_at", ">", now)
    .orderBy("email")
    .select({ id: "id", email: "email", role: "role", expiresAt: "expires_at" });
}

interface NewInvitation {
  email: string;
  role: Role;
  tokenHash: string;
  now: Date;
  expiresAt: Date;
}

/** Writes down an invitation into the actor's shop. An earlier one to the same address gives way to it. */
export async function putInvitation(db: Knex, actor: Actor, invitation: NewInvitation): Promise<void> {
  const { email, role, tokenHash, now, expiresAt } = invitation;
  const fresh = {
    role,
    token_hash: tokenHash,
    invited_by: actor.personId,
    created_at: now,
    expires_at: expiresAt,
    accepted_at: null,
  };
  await db("invitations")
    .insert({ id: newId(), shop_id: actor.shopId, email, ...fresh })
    .onConflict(["shop_id", "email"])
    .merge(fresh);
}

export interface OpenInvitation {
  id: string;
  shopId: string;
  shopName: string;
  email: string;
  role: Role;
  invitedBy: string;
}

/** The invitation whose secret has this hash, while it is good. */
export async function openInvitation(db: Knex, tokenHash: string, now: Date): Promise<OpenInvitation | null> {
  const row = await db("invitations as i")
    .join("shops as s", "s.id", "i.shop_id")
    .join("people as p", "p.id", "i.invited_by")
    .where("i.token_hash", tokenHash)
    .whereNull("i.accepted_at")
    .where("i.expires_at", ">", now)
    .first({ id: "i.id", shopId: "s.id", shopName: "s.name", email: "i.email", role: "i.role", invitedBy: "p.name" });
  return row ?? null;
}

/** Uses an invitation up. Of two at once one gets true. */
export async function markAccepted(db: Knex, invitationId: string, now: Date): Promise<boolean> {
  return (
    (await db("invitations").where({ id: invitationId }).whereNull("accepted_at").update({ accepted_at: now })) === 1
  );
}

/** Takes an invitation of the actor's shop back. False when there is none such, or it is accepted. */
export async function deleteInvitation(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  which: { id: string } | { token_hash: string },
): Promise<boolean> {
  return (
    (await db("invitations")
      .where({ ...which, shop_id: actor.shopId })
      .whereNull("accepted_at")
      .delete()) === 1
  );
}
