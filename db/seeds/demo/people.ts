import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { Role } from "#app/domain/shop/permissions.ts";
import { newId } from "#app/services/ids.server.ts";

const people: { name: string; email: string; role: Role }[] = [
  { name: "Ines Okafor", email: "ines@millrace.example", role: "owner" },
  { name: "Tomasz Brandt", email: "tomasz@millrace.example", role: "maker" },
  { name: "Priya Lund", email: "priya@millrace.example", role: "maker" },
  { name: "Joel Reyes", email: "joel@millrace.example", role: "helper" },
];

export interface DemoShop {
  shopId: string;
  owner: Actor;
  tomasz: Actor;
  priya: Actor;
  joel: Actor;
}

/** The shared workshop by the mill race and the four people in it. */
export async function openDemoShop(db: Knex, now: Date): Promise<DemoShop> {
  const shopId = newId();
  await db("shops").insert({
    id: shopId,
    name: "Millrace Workshop",
    units: "in",
    currency: "USD",
    target_humidity_pct: 40,
    label_sheet: "letter-10",
  });
  const actors: Actor[] = [];
  for (const [index, { name, email, role }] of people.entries()) {
    const personId = newId();
    await db("people").insert({ id: personId, name, email });
    await db("memberships").insert({
      shop_id: shopId,
      person_id: personId,
      role,
      created_at: new Date(now.getTime() + index),
    });
    actors.push({ personId, personName: name, shopId, role });
  }
  const [owner, tomasz, priya, joel] = actors as [Actor, Actor, Actor, Actor];
  return { shopId, owner, tomasz, priya, joel };
}
