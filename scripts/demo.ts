import { createDb } from "#app/services/db.server.ts";
import type { Env } from "#app/services/env.server.ts";
import { createStorage } from "#app/services/storage.server.ts";

/** Somebody to sign in as. */
export interface DemoPerson {
  name: string;
  email: string;
  role: string;
  shop: string;
}

/**
 * Loads the demonstration shop into a database that has nobody in it yet.
 *
 * @param say is called when there is something to wait for.
 * @returns one person of each role in the oldest shop, owner first; empty when there is no shop.
 */
export async function loadDemoIfEmpty(env: Env, say: (line: string) => void): Promise<DemoPerson[]> {
  const db = createDb(env.DATABASE_URL, { poolMax: 4 });
  const storage = createStorage(env);
  try {
    if (!(await db("people").first("id"))) {
      say("Loading the demonstration shop…");
      // Only the first start needs what it takes to draw the pictures.
      const { loadDemo } = await import("#db/seeds/demo/load-demo.ts");
      // Whole or not at all, or the next start would find half a shop.
      await db.transaction((trx) => loadDemo(trx, storage));
    }
    const members: DemoPerson[] = await db("memberships")
      .join("people", "people.id", "memberships.person_id")
      .join("shops", "shops.id", "memberships.shop_id")
      .orderBy(["shops.created_at", "shops.id", "memberships.created_at", "people.email"])
      .select("people.name", "people.email", "memberships.role", { shop: "shops.name" });
    const roles = ["owner", "maker", "helper"];
    return roles.flatMap((role) => members.find((one) => one.role === role && one.shop === members[0]?.shop) ?? []);
  } finally {
    await db.destroy();
    storage.close();
  }
}
