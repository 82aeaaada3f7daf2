import type { Knex } from "knex";

/** Every table: crash-safe, foreign keys, text compared without case. */
export const options = "ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci";

/** An identifier column (see app/services/ids.server.ts): 13 ascii characters, compared byte by byte. */
export function id(name: string, nullable: "not null" | "null" = "not null"): string {
  return `${name} CHAR(13) CHARACTER SET ascii COLLATE ascii_bin ${nullable.toUpperCase()}`;
}

/** A moment in UTC to the millisecond, set by the database when the row does not say. */
export function stamp(name: string): string {
  return `${name} DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3)`;
}

/** Runs statements one after another. MariaDB commits each at once, so a migration holds one change. */
export async function run(knex: Knex, statements: string[]): Promise<void> {
  for (const statement of statements) await knex.raw(statement);
}

/** Drops tables in the order given: children first. */
export async function drop(knex: Knex, tables: string[]): Promise<void> {
  for (const table of tables) await knex.schema.dropTableIfExists(table);
}
