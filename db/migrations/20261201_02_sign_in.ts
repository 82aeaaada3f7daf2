import type { Knex } from "knex";
import { drop, id, options, run, stamp } from "../sql.ts";

export async function up(knex: Knex): Promise<void> {
  await run(knex, [
    // One row per mailed code. The row is the only judge of a code: who asked, until when, how often it was tried, and whether it was used.
    `CREATE TABLE sign_in_challenges (
      ${id("id")} PRIMARY KEY,
      email VARCHAR(254) NOT NULL,
      code_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      link_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      attempts TINYINT UNSIGNED NOT NULL DEFAULT 0,
      ${stamp("created_at")},
      expires_at DATETIME(3) NOT NULL,
      consumed_at DATETIME(3) NULL,
      UNIQUE KEY sign_in_challenges_link (link_hash),
      KEY sign_in_challenges_email (email, created_at),
      KEY sign_in_challenges_expiry (expires_at)
    ) ${options}`,
    `CREATE TABLE rate_limits (
      bucket VARCHAR(190) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      window_start DATETIME NOT NULL,
      hits INT UNSIGNED NOT NULL DEFAULT 0,
      PRIMARY KEY (bucket, window_start),
      KEY rate_limits_window (window_start)
    ) ${options}`,
    // The cookie holds a random secret; the row knows only its hash, so a copy of the database signs nobody in.
    `CREATE TABLE sessions (
      ${id("id")} PRIMARY KEY,
      secret_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      ${id("person_id")},
      ${id("shop_id", "null")},
      user_agent VARCHAR(255) NOT NULL DEFAULT '',
      ${stamp("created_at")},
      ${stamp("last_seen_at")},
      expires_at DATETIME(3) NOT NULL,
      UNIQUE KEY sessions_secret (secret_hash),
      KEY sessions_person (person_id),
      KEY sessions_expiry (expires_at),
      CONSTRAINT sessions_person FOREIGN KEY (person_id) REFERENCES people (id) ON DELETE CASCADE,
      CONSTRAINT sessions_shop FOREIGN KEY (shop_id) REFERENCES shops (id) ON DELETE SET NULL
    ) ${options}`,
  ]);
}

export async function down(knex: Knex): Promise<void> {
  await drop(knex, ["sessions", "rate_limits", "sign_in_challenges"]);
}
