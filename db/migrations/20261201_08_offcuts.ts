import type { Knex } from "knex";
import { drop, id, options, run } from "../sql.ts";

export async function up(knex: Knex): Promise<void> {
  await run(knex, [
    // Where on its parent an offcut lay; what it is stands on its own row of boards.
    `CREATE TABLE offcuts (
      ${id("board_id")} PRIMARY KEY,
      ${id("shop_id")},
      ${id("parent_board_id")},
      along_mm DECIMAL(12,6) NOT NULL,
      across_mm DECIMAL(12,6) NOT NULL,
      KEY offcuts_parent (parent_board_id),
      CONSTRAINT offcuts_place CHECK (along_mm >= 0 AND across_mm >= 0),
      CONSTRAINT offcuts_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT offcuts_board FOREIGN KEY (board_id) REFERENCES boards (id),
      CONSTRAINT offcuts_parent FOREIGN KEY (parent_board_id) REFERENCES boards (id)
    ) ${options}`,
  ]);
}

export async function down(knex: Knex): Promise<void> {
  await drop(knex, ["offcuts"]);
}
