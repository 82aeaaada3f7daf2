import { createHash } from "node:crypto";
import type { Knex } from "knex";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { Role } from "#app/domain/shop/permissions.ts";
import { insertShop } from "#app/domain/shop/shops.sql.server.ts";
import { withTransaction } from "#app/services/db.server.ts";
import { newSecret } from "#app/services/ids.server.ts";
import {
  deleteInvitation,
  markAccepted,
  type OpenInvitation,
  openInvitation,
  putInvitation,
} from "./invitations.sql.server.ts";
import { addMember, isMember, lockOwners, membershipOf, removeMember, setRole } from "./people.sql.server.ts";

const invitationMs = 14 * 86_400_000;

function tokenHash(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}

/** Opens a shop; whoever opens it owns it. @returns the shop's id. */
export async function openShop(
  db: Knex,
  personId: string,
  shop: { name: string; units: LengthUnit; currency: string },
): Promise<string> {
  return withTransaction(db, async (trx) => {
    const shopId = await insertShop(trx, shop);
    await addMember(trx, shopId, personId, "owner");
    return shopId;
  });
}

export type Invited = { ok: true; token: string } | { ok: false; why: "member" };

/**
 * Asks somebody into the shop by their address. Asking again replaces the earlier invitation, whose link then opens nothing.
 *
 * @returns the secret of the link to mail; the table keeps its hash only.
 */
export async function invite(db: Knex, actor: Actor, email: string, role: Role, now: Date): Promise<Invited> {
  return withTransaction(db, async (trx) => {
    if (await isMember(trx, actor.shopId, email)) return { ok: false, why: "member" };
    const token = newSecret();
    const expiresAt = new Date(now.getTime() + invitationMs);
    await putInvitation(trx, actor, { email, role, tokenHash: tokenHash(token), now, expiresAt });
    return { ok: true, token };
  });
}

/** Takes an invitation back. False when it is not this shop's. */
export function revokeInvitation(db: Knex, actor: Actor, invitationId: string): Promise<boolean> {
  return deleteInvitation(db, actor, { id: invitationId });
}

/** Takes back an invitation whose letter could not be sent. */
export async function dropUnsentInvitation(db: Knex, actor: Actor, token: string): Promise<void> {
  await deleteInvitation(db, actor, { token_hash: tokenHash(token) });
}

/** What a mailed invitation says, while it is good. */
export function findInvitation(db: Knex, token: string, now: Date): Promise<OpenInvitation | null> {
  return openInvitation(db, tokenHash(token), now);
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
    if (!(await markAccepted(trx, found.id, now))) return null;
    await addMember(trx, found.shopId, person.personId, found.role);
    return found.shopId;
  });
}

export type MemberChange = { ok: true } | { ok: false; why: "missing" | "last owner" };

/** Gives a member another role, or null to part ways. A shop keeps at least one owner; owners are locked while that is decided. */
export async function changeMember(db: Knex, actor: Actor, personId: string, role: Role | null): Promise<MemberChange> {
  return withTransaction(db, async (trx) => {
    const owners = await lockOwners(trx, actor.shopId);
    if (!(await membershipOf(trx, personId, actor.shopId))) return { ok: false, why: "missing" };
    if (role !== "owner" && owners.length === 1 && owners[0] === personId) return { ok: false, why: "last owner" };
    if (role) await setRole(trx, actor.shopId, personId, role);
    else await removeMember(trx, actor.shopId, personId);
    return { ok: true };
  });
}
