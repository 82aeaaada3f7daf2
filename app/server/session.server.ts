import { createHash } from "node:crypto";
import type { Knex } from "knex";
import { createCookie } from "react-router";
import { env } from "#app/services/env.server.ts";
import { newId, newSecret } from "#app/services/ids.server.ts";
import type { Visit } from "./context.server.ts";

/** How long a session lasts unused: a shop's phone stays signed in for a season. */
const lifetimeMs = 60 * 86_400_000;

/** last_seen_at moves at most this often: a page view is not worth a write. */
const seenEveryMs = 5 * 60_000;

/** The cookie holds a random secret, signed, and nothing else. Secure as soon as the shop is reached by https. */
function cookie() {
  return createCookie("session", {
    path: "/",
    httpOnly: true,
    sameSite: "lax",
    secure: env().PUBLIC_URL.startsWith("https:"),
    maxAge: lifetimeMs / 1000,
    secrets: env().SESSION_SECRETS,
  });
}

function hash(secret: string): string {
  return createHash("sha256").update(secret).digest("hex");
}

async function secretOf(request: Request): Promise<string | null> {
  const value: unknown = await cookie().parse(request.headers.get("Cookie"));
  return typeof value === "string" && value !== "" ? value : null;
}

/** Who this request comes from, or null: no cookie, a forged one, or a session that ended. */
export async function readVisit(db: Knex, request: Request, now: Date): Promise<Visit | null> {
  const secret = await secretOf(request);
  if (!secret) return null;
  const row = await db("sessions as s")
    .join("people as p", "p.id", "s.person_id")
    .where("s.secret_hash", hash(secret))
    .where("s.expires_at", ">", now)
    .first({
      sessionId: "s.id",
      personId: "p.id",
      personName: "p.name",
      email: "p.email",
      shopId: "s.shop_id",
      lastSeenAt: "s.last_seen_at",
    });
  if (!row) return null;
  const { lastSeenAt, ...visit } = row;
  if (now.getTime() - lastSeenAt.getTime() > seenEveryMs)
    await db("sessions")
      .where({ id: visit.sessionId })
      .update({ last_seen_at: now, expires_at: new Date(now.getTime() + lifetimeMs) });
  return visit;
}

/**
 * Begins a session with a new secret; the one the request came with, if any, ends. So a secret known before sign-in is worth nothing after it.
 *
 * @returns the Set-Cookie header.
 */
export async function startSession(
  db: Knex,
  request: Request,
  session: { personId: string; shopId: string | null },
  now: Date,
): Promise<string> {
  await endSession(db, request);
  const secret = newSecret();
  await db("sessions").insert({
    id: newId(),
    secret_hash: hash(secret),
    person_id: session.personId,
    shop_id: session.shopId,
    user_agent: (request.headers.get("User-Agent") ?? "").slice(0, 255),
    created_at: now,
    last_seen_at: now,
    expires_at: new Date(now.getTime() + lifetimeMs),
  });
  return cookie().serialize(secret);
}

/** Ends the session of this request. @returns the Set-Cookie header that forgets it. */
export async function endSession(db: Knex, request: Request): Promise<string> {
  const secret = await secretOf(request);
  if (secret)
    await db("sessions")
      .where({ secret_hash: hash(secret) })
      .delete();
  return cookie().serialize("", { maxAge: 0 });
}

/** Which shop this session is in. */
export async function chooseShop(db: Knex, visit: Visit, shopId: string): Promise<void> {
  await db("sessions").where({ id: visit.sessionId, person_id: visit.personId }).update({ shop_id: shopId });
}
