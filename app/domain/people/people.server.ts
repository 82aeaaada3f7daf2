import { createHash } from "node:crypto";
import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { Role } from "#app/domain/shop/permissions.ts";
import { withTransaction } from "#app/services/db.server.ts";
import { newId, newSecret } from "#app/services/ids.server.ts";

const invitationMs = 14 * 86_400_000;

function tokenHash(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}

/** Opens a shop; whoever opens it owns it. */
export async function openShop(
  db: Knex,
  personId: string,
  shop: { name: string; units: "in" | "mm"; currency: string },
): Promise<string> {
  return withTransaction(db, async (trx) => {
    const id = newId();
    await trx("shops").insert({ id, ...shop });
    await trx("memberships").insert({ shop_id: id, person_id: personId, role: "owner" });
    return id;
  });
}

export type Invited = { ok: true; token: string } | { ok: false; why: "member" };

/** Asks somebody into the shop by their address. Asking again replaces the earlier invitation, whose link then opens nothing. */
export async function invite(db: Knex, actor: Actor, email: string, role: Role, now: Date): Promise<Invited> {
  return withTransaction(db, async (trx) => {
    const member = await trx("memberships as m")
      .join("people as p", "p.id", "m.person_id")
      .where({ "m.shop_id": actor.shopId, "p.email": email })
      .first("p.id");
    if (member) return { ok: false, why: "member" };
    const token = newSecret();
    const fresh = {
      role,
      token_hash: tokenHash(token),
      invited_by: actor.personId,
      created_at: now,
      expires_at: new Date(now.getTime() + invitationMs),
      accepted_at: null,
    };
    await trx("invitations")
      .insert({ id: newId(), shop_id: actor.shopId, email, ...fresh })
      .onConflict(["shop_id", "email"])
      .merge(fresh);
    return { ok: true, token };
  });
}

/** Takes an invitation back. False when it is not this shop's. */
export async function revokeInvitation(db: Knex, actor: Actor, invitationId: string): Promise<boolean> {
  return (
    (await db("invitations").where({ id: invitationId, shop_id: actor.shopId }).whereNull("accepted_at").delete()) === 1
  );
}

export interface OpenInvitation {
  id: string;
  shopId: string;
  shopName: string;
  email: string;
  role: Role;
  invitedBy: string;
}

/** What a mailed invitation says, while it is good. */
export async function findInvitation(db: Knex, token: string, now: Date): Promise<OpenInvitation | null> {
  const row = await db("invitations as i")
    .join("shops as s", "s.id", "i.shop_id")
    .join("people as p", "p.id", "i.invited_by")
    .where("i.token_hash", tokenHash(token))
    .whereNull("i.accepted_at")
    .where("i.expires_at", ">", now)
    .first({ id: "i.id", shopId: "s.id", shopName: "s.name", email: "i.email", role: "i.role", invitedBy: "p.name" });
  return row ?? null;
}

/** Accepts an invitation, once, by the person whose address it was mailed to. @returns the shop, or null. */
export async function acceptInvitation(
  db: Knex,
  person: { personId: string; email: string },
  token: string,
  now: Date,
): Promise<string | null> {
  return withTransaction(db, async (trx) => {
    const found = await findInvitation(trx, token, now);
    if (!found || found.email !== person.email) return null;
    const accepted = await trx("invitations")
      .where({ id: found.id })
      .whereNull("accepted_at")
      .update({ accepted_at: now });
    if (accepted !== 1) return null;
    await trx("memberships")
      .insert({ shop_id: found.shopId, person_id: person.personId, role: found.role })
      .onConflict(["shop_id", "person_id"])
      .ignore();
    return found.shopId;
  });
}

export type MemberChange = { ok: true } | { ok: false; why: "missing" | "last owner" };

/** Gives a member another role, or null to part ways. A shop keeps at least one owner; owners are locked while that is decided. */
export async function changeMember(db: Knex, actor: Actor, personId: string, role: Role | null): Promise<MemberChange> {
  return withTransaction(db, async (trx) => {
    const owners: { person_id: string }[] = await trx("memberships")
      .where({ shop_id: actor.shopId, role: "owner" })
      .forUpdate()
      .select("person_id");
    const at = { shop_id: actor.shopId, person_id: personId };
    if (!(await trx("memberships").where(at).first("person_id"))) return { ok: false, why: "missing" };
    if (role !== "owner" && owners.length === 1 && owners[0]?.person_id === personId)
      return { ok: false, why: "last owner" };
    if (role) await trx("memberships").where(at).update({ role });
    else await trx("memberships").where(at).delete();
    return { ok: true };
  });
}
