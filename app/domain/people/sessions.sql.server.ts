import type { Knex } from "knex";
import { newId } from "#app/services/ids.server.ts";

export interface SessionRow {
  id: string;
  personId: string;
  personName: string;
  email: string;
  shopId: string | null;
  lastSeenAt: Date;
  expiresAt: Date;
}

/** The session whose secret has this hash, with its person; null when it ended or never was. */
export async function findSession(db: Knex, secretHash: string, now: Date): Promise<SessionRow | null> {
  const row = await db("sessions as s")
    .join("people as p", "p.id", "s.person_id")
    .where("s.secret_hash", secretHash)
    .where("s.expires_at", ">", now)
    .first({
      id: "s.id",
      personId: "p.id",
      personName: "p.name",
      email: "p.email",
      shopId: "s.shop_id",
      lastSeenAt: "s.last_seen_at",
      expiresAt: "s.expires_at",
    });
  return row ?? null;
}

interface NewSession {
  secretHash: string;
  personId: string;
  shopId: string | null;
  /** What the browser says of itself. */
  userAgent: string;
  now: Date;
  expiresAt: Date;
}

/** Writes down a session, and sweeps out some that are over. */
export async function insertSession(db: Knex, session: NewSession): Promise<void> {
  const { secretHash, personId, shopId, userAgent, now, expiresAt } = session;
  await db("sessions").where("expires_at", "<", now).limit(200).delete();
  await db("sessions").insert({
    id: newId(),
    secret_hash: secretHash,
    person_id: personId,
    shop_id: shopId,
    user_agent: userAgent.slice(0, 255),
    created_at: now,
    last_seen_at: now,
    expires_at: expiresAt,
  });
}

/** Notes that a session was used. */
export async function touchSession(db: Knex, sessionId: string, now: Date): Promise<void> {
  await db("sessions").where({ id: sessionId }).update({ last_seen_at: now });
}

/** Lets a session last longer. */
export async function extendSession(db: Knex, sessionId: string, expiresAt: Date): Promise<void> {
  await db("sessions").where({ id: sessionId }).update({ expires_at: expiresAt });
}

/** Ends the session whose secret has this hash. */
export async function endSessionBySecret(db: Knex, secretHash: string): Promise<void> {
  await db("sessions").where({ secret_hash: secretHash }).delete();
}

/** Which shop a session of a person is in. */
export async function setSessionShop(db: Knex, personId: string, sessionId: string, shopId: string): Promise<void> {
  await db("sessions").where({ id: sessionId, person_id: personId }).update({ shop_id: shopId });
}

export interface OwnSession {
  id: string;
  userAgent: string;
  createdAt: Date;
  lastSeenAt: Date;
}

/** Where somebody is signed in, newest use first. */
export async function sessionsOf(db: Knex, personId: string, now: Date): Promise<OwnSession[]> {
  return db("sessions")
    .where({ person_id: personId })
    .where("expires_at", ">", now)
    .orderBy("last_seen_at", "desc")
    .select({ id: "id", userAgent: "user_agent", createdAt: "created_at", lastSeenAt: "last_seen_at" });
}

/** Ends one of a person's own sessions; a stranger's is left alone. */
export async function endSessionOf(db: Knex, personId: string, sessionId: string): Promise<boolean> {
  return (await db("sessions").where({ id: sessionId, person_id: personId }).delete()) === 1;
}

/** Ends all of a person's sessions but one. */
export async function endOtherSessions(db: Knex, personId: string, keepId: string): Promise<number> {
  return db("sessions").where({ person_id: personId }).whereNot({ id: keepId }).delete();
}
