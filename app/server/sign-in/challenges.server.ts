import { createHash, createHmac } from "node:crypto";
import type { Knex } from "knex";
import { env } from "#app/services/env.server.ts";
import { newId, newSecret } from "#app/services/ids.server.ts";

/** How long a mailed code or link is good. */
export const challengeMinutes = 10;

/** Guesses at one code. A million codes and five guesses leave a stranger one chance in 200,000 a letter. */
export const mostAttempts = 5;

/** A code has six digits, so its hash is keyed: a copy of the table alone does not give it away. */
function codeHash(id: string, code: string): string {
  return createHmac("sha256", env().SESSION_SECRETS[0] ?? "")
    .update(`${id} ${code}`)
    .digest("hex");
}

function linkHash(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}

/** Writes down that a code was sent to an address. @returns the challenge's id, for the browser that asked, and the secret of the mailed link. */
export async function openChallenge(
  db: Knex,
  email: string,
  code: string,
  now: Date,
): Promise<{ id: string; token: string }> {
  const id = newId();
  const token = newSecret();
  await db("sign_in_challenges")
    .where("expires_at", "<", new Date(now.getTime() - 86_400_000))
    .limit(200)
    .delete();
  await db("sign_in_challenges").insert({
    id,
    email,
    code_hash: codeHash(id, code),
    link_hash: linkHash(token),
    created_at: now,
    expires_at: new Date(now.getTime() + challengeMinutes * 60_000),
  });
  return { id, token };
}

function open(db: Knex, now: Date): Knex.QueryBuilder {
  return db("sign_in_challenges").whereNull("consumed_at").where("expires_at", ">", now);
}

/** Counts a guess before it is looked at, so that guesses made at once cannot slip past the limit. False: no guess is left. */
export async function countAttempt(db: Knex, id: string, now: Date): Promise<boolean> {
  return (await open(db, now).where({ id }).where("attempts", "<", mostAttempts).increment("attempts", 1)) === 1;
}

/** Uses a code up. Of two right submissions at once one gets true; the code is good for exactly the address it was mailed to. */
export async function consumeCode(
  db: Knex,
  challenge: { id: string; email: string; code: string },
  now: Date,
): Promise<boolean> {
  const { id, email, code } = challenge;
  return (
    (await open(db, now)
      .where({ id, email, code_hash: codeHash(id, code) })
      .update({ consumed_at: now })) === 1
  );
}

/** Whose link this is, while it is good. Looking does nothing: mail scanners open every link. */
export async function addressOfLink(db: Knex, token: string, now: Date): Promise<string | null> {
  const row = await open(db, now)
    .where({ link_hash: linkHash(token) })
    .first("email");
  return row?.email ?? null;
}

/** Uses a link up. @returns the address it was mailed to, once. */
export async function consumeLink(db: Knex, token: string, now: Date): Promise<string | null> {
  const email = await addressOfLink(db, token, now);
  if (!email) return null;
  const used = await open(db, now)
    .where({ link_hash: linkHash(token) })
    .update({ consumed_at: now });
  return used === 1 ? email : null;
}
