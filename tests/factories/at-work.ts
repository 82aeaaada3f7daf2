import type { Knex } from "knex";
import { pino } from "pino";
import { RouterContextProvider } from "react-router";
import type { Actor } from "#app/domain/shop/actor.ts";
import { getShop } from "#app/domain/shop/shops.sql.server.ts";
import {
  atWorkContext,
  dbContext,
  logContext,
  mailerContext,
  storageContext,
  visitContext,
} from "#app/server/context.server.ts";
import type { Letter } from "#app/services/mail.server.ts";
import type { Storage } from "#app/services/storage.server.ts";

/** The context that a loader or action would get from the real middleware, for somebody at work. */
export async function contextFor(db: Knex, actor: Actor, storage?: Storage): Promise<RouterContextProvider> {
  const context = new RouterContextProvider();
  const shop = await getShop(db, actor.shopId);
  if (!shop) throw new Error("the actor's shop is not there");
  context.set(dbContext, db);
  context.set(logContext, pino({ level: "silent" }));
  context.set(atWorkContext, { actor, shop });
  context.set(visitContext, {
    sessionId: "s",
    personId: actor.personId,
    personName: actor.personName,
    email: "",
    shopId: actor.shopId,
  });
  if (storage) context.set(storageContext, storage);
  return context;
}

/** The context of somebody who is not signed in, with a mailer that keeps its letters. */
export function strangerContext(db: Knex): { context: RouterContextProvider; letters: Letter[] } {
  const context = new RouterContextProvider();
  const letters: Letter[] = [];
  context.set(dbContext, db);
  context.set(logContext, pino({ level: "silent" }));
  context.set(visitContext, null);
  context.set(mailerContext, { send: async (letter) => void letters.push(letter), close: () => {} });
  return { context, letters };
}

/** What a loader or action threw or returned, as a status: a redirect's, data()'s, or 200 for a plain object. */
export async function statusFrom(run: () => unknown): Promise<number> {
  try {
    return statusOf(await run());
  } catch (thrown) {
    return statusOf(thrown);
  }
}

function statusOf(answer: unknown): number {
  if (answer instanceof Response) return answer.status;
  const init = (answer as { init?: { status?: number } | null } | null)?.init;
  if (answer instanceof Error) throw answer;
  return init?.status ?? 200;
}
