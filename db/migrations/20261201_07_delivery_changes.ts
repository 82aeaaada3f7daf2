import type { Knex } from "knex";
import { id, run } from "../sql.ts";

/** Who changed a delivery or a supplier last, for the person whose save comes second; and deliveries that were logged by mistake. */
export async function up(knex: Knex): Promise<void> {
  await run(knex, [
    `ALTER TABLE suppliers
      ADD COLUMN ${id("changed_by", "null")},
      ADD COLUMN changed_at DATETIME(3) NULL,
      ADD CONSTRAINT suppliers_changed_by FOREIGN KEY (changed_by) REFERENCES people (id)`,
    `ALTER TABLE deliveries
      ADD COLUMN ${id("changed_by", "null")},
      ADD COLUMN changed_at DATETIME(3) NULL,
      ADD COLUMN deleted_at DATETIME(3) NULL,
      ADD CONSTRAINT deliveries_changed_by FOREIGN KEY (changed_by) REFERENCES people (id)`,
  ]);
}

export async function down(knex: Knex): Promise<void> {
  await run(knex, [
    "ALTER TABLE deliveries DROP FOREIGN KEY deliveries_changed_by, DROP COLUMN changed_by, DROP COLUMN changed_at, DROP COLUMN deleted_at",
    "ALTER TABLE suppliers DROP FOREIGN KEY suppliers_changed_by, DROP COLUMN changed_by, DROP COLUMN changed_at",
  ]);
}
