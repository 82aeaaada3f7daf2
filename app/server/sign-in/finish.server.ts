import type { Knex } from "knex";
import { redirect } from "react-router";
import { lastShopOf, personByEmail } from "#app/domain/people/people.sql.server.ts";
import { startSession } from "../session.server.ts";
import { localPath } from "./pending.server.ts";

/** Whoever proved an address is let in, with a session of their own; a person seen for the first time is written down. */
export async function finishSignIn(
  db: Knex,
  request: Request,
  email: string,
  to: string,
  now: Date,
): Promise<Response> {
  const personId = await personByEmail(db, email);
  const cookie = await startSession(db, request, { personId, shopId: await lastShopOf(db, personId) }, now);
  return redirect(localPath(to), { headers: { "Set-Cookie": cookie } });
}
