import { createHash } from "node:crypto";
import type { Knex } from "knex";
import { createCookie } from "react-router";
import {
  endSessionBySecret,
  extendSession,
  findSession,
  insertSession,
  setSessionShop,
  touchSession,
} from "#app/domain/people/sessions.sql.server.ts";
import { env } from "#app/services/env.server.ts";
import { newSecret } from "#app/services/ids.server.ts";
import type { Visit } from "./context.server.ts";

/** How long a session lasts unused: a shop's phone stays signed in for a season. */
const lifetimeMs = 60 * 86_400_000;

/** last_seen_at moves at most this often: a page view is not worth a write. */
const seenEveryMs = 5 * 60_000;

/** A session in use is made to last longer at most this often, row and cookie together. */
const extendEveryMs = 86_400_000;

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

function endOf(now: Date): Date {
  return new Date(now.getTime() + lifetimeMs);
}

async function secretOf(request: Request): Promise<string | null> {
  const value: unknown = await cookie().parse(request.headers.get("Cookie"));
  return typeof value === "string" && value !== "" ? value : null;
}

export interface FoundSession {
  visit: Visit;
  /** Has it been in use for so long that it should be made to last longer? */
  dueToExtend: boolean;
}

/** The session of a request, or null: no cookie, a forged one, or a session that ended. Notes that it was used. */
export async function readSession(db: Knex, request: Request, now: Date): Promise<FoundSession | null> {
  const secret = await secretOf(request);
  const row = secret ? await findSession(db, hash(secret), now) : null;
  if (!row) return null;
  if (now.getTime() - row.lastSeenAt.getTime() > seenEveryMs) await touchSession(db, row.id, now);
  const { id: sessionId, personId, personName, email, shopId, expiresAt } = row;
  return {
    visit: { sessionId, personId, personName, email, shopId },
    dueToExtend: endOf(now).getTime() - expiresAt.getTime() > extendEveryMs,
  };
}

/** Who this request comes from, or null for a stranger. */
export async function readVisit(db: Knex, request: Request, now: Date): Promise<Visit | null> {
  return (await readSession(db, request, now))?.visit ?? null;
}

/**
 * Lets a session last its whole time again from now on. The cookie is signed anew with the first secret, so that an old one can be dropped after a season.
 *
 * @returns the Set-Cookie header; null without a session.
 */
export async function keepSession(db: Knex, request: Request, visit: Visit, now: Date): Promise<string | null> {
  const secret = await secretOf(request);
  if (!secret) return null;
  await extendSession(db, visit.sessionId, endOf(now));
  return cookie().serialize(secret);
}

/** Does an answer say already what the browser's session is: one begun, or ended? */
export function setsSession(headers: Headers): boolean {
  const { name } = cookie();
  return headers.getSetCookie().some((line) => line.startsWith(`${name}=`));
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
  const userAgent = request.headers.get("User-Agent") ?? "";
  await insertSession(db, { ...session, secretHash: hash(secret), userAgent, now, expiresAt: endOf(now) });
  return cookie().serialize(secret);
}

/** Ends the session of this request. @returns the Set-Cookie header that forgets it. */
export async function endSession(db: Knex, request: Request): Promise<string> {
  const secret = await secretOf(request);
  if (secret) await endSessionBySecret(db, hash(secret));
  return cookie().serialize("", { maxAge: 0 });
}

/** Which shop this session is in. */
export function chooseShop(db: Knex, visit: Visit, shopId: string): Promise<void> {
  return setSessionShop(db, visit.personId, visit.sessionId, shopId);
}
