import { createHash } from "node:crypto";
import type { Knex } from "knex";

export interface Limit {
  /** What is limited: "sign-in mail to". */
  name: string;
  most: number;
  windowMinutes: number;
}

/**
 * Counts one use of something limited, for one subject (an e-mail, an address), in a window of time. Rows in the database, so that all processes count
 * together; the subject is kept as a hash only.
 *
 * @returns false once the limit is passed.
 */
export async function takeOne(db: Knex, limit: Limit, subject: string, now: Date): Promise<boolean> {
  const span = limit.windowMinutes * 60_000;
  const windowStart = new Date(Math.floor(now.getTime() / span) * span);
  const bucket = `${limit.name} ${createHash("sha256").update(subject).digest("hex").slice(0, 40)}`;
  await db.raw(
    "INSERT INTO rate_limits (bucket, window_start, hits) VALUES (?, ?, 1) ON DUPLICATE KEY UPDATE hits = hits + 1",
    [bucket, windowStart],
  );
  const row = await db("rate_limits").where({ bucket, window_start: windowStart }).first("hits");
  if (row.hits === 1)
    await db("rate_limits")
      .where("window_start", "<", new Date(now.getTime() - 2 * 86_400_000))
      .limit(500)
      .delete();
  return row.hits <= limit.most;
}
