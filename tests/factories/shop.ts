import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { Role } from "#app/domain/shop/permissions.ts";
import { newId } from "#app/services/ids.server.ts";

let serial = 0;
/** A name nobody else in the test has. */
const unique = (word: string) => `${word} ${++serial}`;

/** A person with an address of their own. */
export async function aPerson(
  db: Knex,
  given: { name?: string; email?: string } = {},
): Promise<{ id: string; name: string; email: string }> {
  const person = {
    id: newId(),
    name: given.name ?? unique("Person"),
    email: given.email ?? `person${++serial}@shop.example`,
  };
  await db("people").insert(person);
  return person;
}

/** An empty shop. */
export async function aShop(db: Knex, given: { name?: string; units?: "in" | "mm" } = {}): Promise<string> {
  const id = newId();
  await db("shops").insert({ id, name: given.name ?? unique("Shop"), units: given.units ?? "in" });
  return id;
}

/** Somebody at work in a shop; in a new shop unless one is given. */
export async function anActor(
  db: Knex,
  role: Role = "maker",
  given: { shopId?: string; name?: string } = {},
): Promise<Actor> {
  const person = await aPerson(db, { name: given.name });
  const shopId = given.shopId ?? (await aShop(db));
  await db("memberships").insert({ shop_id: shopId, person_id: person.id, role });
  return { personId: person.id, personName: person.name, shopId, role };
}
