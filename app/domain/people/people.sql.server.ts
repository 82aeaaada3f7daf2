import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { Role } from "#app/domain/shop/permissions.ts";
import { newId } from "#app/services/ids.server.ts";

/** What a person is in a shop, or null when they have no business there. */
export async function membershipOf(
  db: Knex,
  personId: string,
  shopId: string,
): Promise<{ shopId: string; role: Role } | null> {
  const row = await db("memberships")
    .where({ person_id: personId, shop_id: shopId })
    .first({ shopId: "shop_id", role: "role" });
  return row ?? null;
}

/** Brings a person into a shop. Whoever is in it already keeps the role they have. */
export async function addMember(db: Knex, shopId: string, personId: string, role: Role): Promise<void> {
  await db("memberships")
    .insert({ shop_id: shopId, person_id: personId, role })
    .onConflict(["shop_id", "person_id"])
    .ignore();
}

/** Who owns a shop, locked: while one transaction decides about its owners, no other does. */
export async function lockOwners(trx: Knex, shopId: string): Promise<string[]> {
  return trx("memberships").where({ shop_id: shopId, role: "owner" }).forUpdate().pluck("person_id");
}

/** Gives a member another role. */
export async function setRole(db: Knex, shopId: string, personId: string, role: Role): Promise<void> {
  await db("memberships").where({ shop_id: shopId, person_id: personId }).update({ role });
}

/** Takes a member out of a shop. */
export async function removeMember(db: Knex, shopId: string, personId: string): Promise<void> {
  await db("memberships").where({ shop_id: shopId, person_id: personId }).delete();
}

/** Is somebody with this address in the shop? */
export async function isMember(db: Knex, shopId: string, email: string): Promise<boolean> {
  const row = await db("memberships as m")
    .join("people as p", "p.id", "m.person_id")
    .where({ "m.shop_id": shopId, "p.email": email })
    .first("p.id");
  return row !== undefined;
}

/** The person with this address, lower-cased, written down if new. Two first sign-ins at once give one person. */
export async function personByEmail(db: Knex, email: string): Promise<string> {
  await db("people").insert({ id: newId(), email }).onConflict("email").ignore();
  const row = await db("people").where({ email }).first("id");
  return row.id;
}

/** What a person is called. */
export async function renamePerson(db: Knex, personId: string, name: string): Promise<void> {
  await db("people").where({ id: personId }).update({ name });
}

export interface ShopOfPerson {
  id: string;
  name: string;
  role: Role;
}

/** The shops somebody works in, by name. */
export async function shopsOf(db: Knex, personId: string): Promise<ShopOfPerson[]> {
  return db("memberships as m")
    .join("shops as s", "s.id", "m.shop_id")
    .where("m.person_id", personId)
    .orderBy("s.name")
    .select({ id: "s.id", name: "s.name", role: "m.role" });
}

/** The shop to begin in: the one of the newest other session, else the first joined; null without any. */
export async function lastShopOf(db: Knex, personId: string): Promise<string | null> {
  const row = await db("memberships as m")
    .leftJoin("sessions as s", (join) => join.on("s.shop_id", "m.shop_id").andOn("s.person_id", "m.person_id"))
    .where("m.person_id", personId)
    .orderByRaw("s.last_seen_at IS NULL, s.last_seen_at DESC, m.created_at")
    .first("m.shop_id");
  return row?.shop_id ?? null;
}

export interface Member {
  personId: string;
  name: string;
  email: string;
  role: Role;
  joinedAt: Date;
}

/** Who works in the actor's shop, owners first. */
export async function listMembers(db: Knex, actor: Pick<Actor, "shopId">): Promise<Member[]> {
  return db("memberships as m")
    .join("people as p", "p.id", "m.person_id")
    .where("m.shop_id", actor.shopId)
    .orderByRaw("FIELD(m.role, 'owner', 'maker', 'helper'), p.name, p.email")
    .select({ personId: "p.id", name: "p.name", email: "p.email", role: "m.role", joinedAt: "m.created_at" });
}
