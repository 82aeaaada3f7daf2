import type { Knex } from "knex";

/** Copies tables, rows that migrations put there, and triggers: many times faster than to migrate again. */
export async function copySchema(db: Knex, from: string, to: string): Promise<void> {
  await db.raw("CREATE DATABASE ?? CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci", [to]);
  await db.raw("USE ??", [to]);
  await db.raw("SET SESSION foreign_key_checks = 0");
  const [tables] = await db.raw("SHOW FULL TABLES FROM ?? WHERE Table_type = 'BASE TABLE'", [from]);
  for (const row of tables) {
    const table = Object.values(row)[0] as string;
    const [[created]] = await db.raw("SHOW CREATE TABLE ??.??", [from, table]);
    await db.raw(escaped(created["Create Table"]));
    await db.raw("INSERT INTO ?? SELECT * FROM ??.??", [table, from, table]);
  }
  const [triggers] = await db.raw("SHOW TRIGGERS FROM ??", [from]);
  for (const { Trigger } of triggers) {
    const [[created]] = await db.raw("SHOW CREATE TRIGGER ??.??", [from, Trigger]);
    await db.raw(escaped(created["SQL Original Statement"]));
  }
}

/** Knex reads ? as a place for a value. */
function escaped(sql: string): string {
  return sql.replaceAll("?", "\\?");
}
