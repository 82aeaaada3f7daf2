import type { Knex } from "knex";
import { drop, id, options, run, stamp } from "../sql.ts";

export async function up(knex: Knex): Promise<void> {
  await run(knex, [
    `CREATE TABLE projects (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      name VARCHAR(120) NOT NULL,
      client VARCHAR(120) NOT NULL DEFAULT '',
      due_on DATE NULL,
      crayon VARCHAR(8) NOT NULL,
      state VARCHAR(8) NOT NULL DEFAULT 'planned',
      notes TEXT NOT NULL DEFAULT '',
      version INT UNSIGNED NOT NULL DEFAULT 1,
      ${id("created_by")},
      ${stamp("created_at")},
      UNIQUE KEY projects_name (shop_id, name),
      KEY projects_state (shop_id, state, due_on),
      CONSTRAINT projects_crayon CHECK (crayon IN ('blue', 'red', 'ochre', 'green', 'black', 'violet')),
      CONSTRAINT projects_state CHECK (state IN ('planned', 'underway', 'done', 'dropped')),
      CONSTRAINT projects_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT projects_by FOREIGN KEY (created_by) REFERENCES people (id)
    ) ${options}`,
    `CREATE TABLE parts (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      ${id("project_id")},
      sort SMALLINT UNSIGNED NOT NULL DEFAULT 0,
      name VARCHAR(80) NOT NULL,
      quantity SMALLINT UNSIGNED NOT NULL,
      thickness_mm DECIMAL(12,6) NOT NULL,
      width_mm DECIMAL(12,6) NOT NULL,
      length_mm DECIMAL(12,6) NOT NULL,
      species VARCHAR(60) NOT NULL,
      ring_min_deg DECIMAL(4,1) NOT NULL DEFAULT 0,
      ring_max_deg DECIMAL(4,1) NOT NULL DEFAULT 90,
      version INT UNSIGNED NOT NULL DEFAULT 1,
      KEY parts_project (project_id, sort),
      CONSTRAINT parts_sizes CHECK (quantity > 0 AND thickness_mm > 0 AND width_mm > 0 AND length_mm > 0),
      CONSTRAINT parts_rings CHECK (0 <= ring_min_deg AND ring_min_deg <= ring_max_deg AND ring_max_deg <= 90),
      CONSTRAINT parts_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT parts_project FOREIGN KEY (project_id) REFERENCES projects (id)
    ) ${options}`,
    `CREATE TABLE holds (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      ${id("board_id")},
      ${id("project_id")},
      from_mm DECIMAL(12,6) NOT NULL,
      to_mm DECIMAL(12,6) NOT NULL,
      state VARCHAR(6) NOT NULL DEFAULT 'held',
      note VARCHAR(300) NOT NULL DEFAULT '',
      ${id("placed_by")},
      ${stamp("placed_at")},
      expires_at DATETIME(3) NOT NULL,
      ended_at DATETIME(3) NULL,
      KEY holds_board (board_id, state),
      KEY holds_project (project_id, state),
      KEY holds_expiry (state, expires_at),
      CONSTRAINT holds_state CHECK (state IN ('held', 'out', 'used', 'let go', 'lapsed')),
      CONSTRAINT holds_length CHECK (0 <= from_mm AND from_mm < to_mm),
      CONSTRAINT holds_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT holds_board FOREIGN KEY (board_id) REFERENCES boards (id),
      CONSTRAINT holds_project FOREIGN KEY (project_id) REFERENCES projects (id),
      CONSTRAINT holds_by FOREIGN KEY (placed_by) REFERENCES people (id)
    ) ${options}`,
    // A length of board that a live hold claims; the row goes when the hold ends. MariaDB can refuse overlapping periods of one board, but
    // only of time, so a millimetre along the board is written as a second after 2000-01-01. Two claims on one place cannot both exist,
    // whatever the program does.
    `CREATE TABLE hold_spans (
      ${id("hold_id")} PRIMARY KEY,
      ${id("board_id")},
      starts DATETIME(6) NOT NULL,
      ends DATETIME(6) NOT NULL,
      PERIOD FOR span (starts, ends),
      UNIQUE KEY hold_spans_one_claim (board_id, span WITHOUT OVERLAPS),
      CONSTRAINT hold_spans_hold FOREIGN KEY (hold_id) REFERENCES holds (id) ON DELETE CASCADE,
      CONSTRAINT hold_spans_board FOREIGN KEY (board_id) REFERENCES boards (id)
    ) ${options}`,
  ]);
}

export async function down(knex: Knex): Promise<void> {
  await drop(knex, ["hold_spans", "holds", "parts", "projects"]);
}
