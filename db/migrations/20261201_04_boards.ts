import type { Knex } from "knex";
import { drop, id, options, run, stamp } from "../sql.ts";

export async function up(knex: Knex): Promise<void> {
  await run(knex, [
    `CREATE TABLE bays (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      name VARCHAR(40) NOT NULL,
      sort SMALLINT UNSIGNED NOT NULL DEFAULT 0,
      note VARCHAR(120) NOT NULL DEFAULT '',
      UNIQUE KEY bays_name (shop_id, name),
      CONSTRAINT bays_shop FOREIGN KEY (shop_id) REFERENCES shops (id)
    ) ${options}`,
    // An arm is a cantilever level of a bay; level 1 is the lowest. The capacity is what the shop entered from its rack's maker.
    `CREATE TABLE arms (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      ${id("bay_id")},
      level TINYINT UNSIGNED NOT NULL,
      width_mm DECIMAL(12,6) NOT NULL DEFAULT 610,
      capacity_kg DECIMAL(7,1) NULL,
      UNIQUE KEY arms_level (bay_id, level),
      CONSTRAINT arms_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT arms_bay FOREIGN KEY (bay_id) REFERENCES bays (id)
    ) ${options}`,
    // ring_* and moisture_* repeat what the newest readings say, so that a list of boards filters and draws from one table.
    // claim_serial moves with every hold on the board: on a cluster of databases it makes two claims at once collide.
    `CREATE TABLE boards (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      tag_number INT UNSIGNED NOT NULL,
      tag VARCHAR(16) NOT NULL,
      ${id("delivery_id", "null")},
      ${id("parent_board_id", "null")},
      species VARCHAR(60) NOT NULL,
      quarters SMALLINT UNSIGNED NOT NULL,
      thickness_mm DECIMAL(12,6) NOT NULL,
      length_mm DECIMAL(12,6) NOT NULL,
      width_mm DECIMAL(12,6) NOT NULL,
      width_far_mm DECIMAL(12,6) NULL,
      edges VARCHAR(10) NOT NULL DEFAULT 'sawn',
      surface VARCHAR(10) NOT NULL DEFAULT 'rough',
      grade VARCHAR(40) NOT NULL DEFAULT '',
      figure_kind VARCHAR(40) NOT NULL DEFAULT '',
      figure_strength TINYINT UNSIGNED NOT NULL DEFAULT 0,
      figure_where VARCHAR(120) NOT NULL DEFAULT '',
      sap_share_pct TINYINT UNSIGNED NULL,
      colour_note VARCHAR(200) NOT NULL DEFAULT '',
      notes TEXT NOT NULL DEFAULT '',
      log_name VARCHAR(40) NOT NULL DEFAULT '',
      log_sequence SMALLINT UNSIGNED NULL,
      ${id("arm_id", "null")},
      arm_position SMALLINT UNSIGNED NOT NULL DEFAULT 0,
      state VARCHAR(8) NOT NULL DEFAULT 'racked',
      cost_minor BIGINT UNSIGNED NULL,
      ring_class VARCHAR(10) NULL,
      ring_min_deg DECIMAL(4,1) NULL,
      ring_max_deg DECIMAL(4,1) NULL,
      ring_mean_deg DECIMAL(4,1) NULL,
      ring_field JSON NULL,
      moisture_pct DECIMAL(4,1) NULL,
      moisture_at DATETIME(3) NULL,
      search_text VARCHAR(1000) NOT NULL DEFAULT '',
      claim_serial INT UNSIGNED NOT NULL DEFAULT 0,
      version INT UNSIGNED NOT NULL DEFAULT 1,
      ${stamp("created_at")},
      deleted_at DATETIME(3) NULL,
      UNIQUE KEY boards_tag (shop_id, tag_number),
      KEY boards_tag_text (shop_id, tag),
      KEY boards_stock (shop_id, deleted_at, state, tag_number),
      KEY boards_size (shop_id, deleted_at, species, quarters, length_mm),
      KEY boards_rings (shop_id, deleted_at, ring_class, species),
      KEY boards_arm (arm_id, arm_position),
      KEY boards_delivery (delivery_id),
      FULLTEXT KEY boards_search (search_text),
      CONSTRAINT boards_sizes CHECK (thickness_mm > 0 AND length_mm > 0 AND width_mm > 0 AND (width_far_mm IS NULL OR width_far_mm > 0)),
      CONSTRAINT boards_state CHECK (state IN ('racked', 'out', 'used', 'sold', 'lost')),
      CONSTRAINT boards_edges CHECK (edges IN ('sawn', 'one live', 'live')),
      CONSTRAINT boards_surface CHECK (surface IN ('rough', 'skip', 'S2S', 'S3S', 'S4S')),
      CONSTRAINT boards_ring_class CHECK (ring_class IS NULL OR ring_class IN ('flat', 'rift', 'quartered')),
      CONSTRAINT boards_figure CHECK (figure_strength <= 3),
      CONSTRAINT boards_sap CHECK (sap_share_pct IS NULL OR sap_share_pct <= 100),
      CONSTRAINT boards_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT boards_delivery FOREIGN KEY (delivery_id) REFERENCES deliveries (id),
      CONSTRAINT boards_parent FOREIGN KEY (parent_board_id) REFERENCES boards (id),
      CONSTRAINT boards_arm FOREIGN KEY (arm_id) REFERENCES arms (id)
    ) ${options}`,
    `CREATE TABLE board_defects (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      ${id("board_id")},
      kind VARCHAR(20) NOT NULL,
      face VARCHAR(8) NOT NULL DEFAULT 'both',
      along_mm DECIMAL(12,6) NOT NULL,
      across_mm DECIMAL(12,6) NOT NULL,
      length_mm DECIMAL(12,6) NOT NULL,
      width_mm DECIMAL(12,6) NOT NULL,
      note VARCHAR(200) NOT NULL DEFAULT '',
      ${stamp("created_at")},
      KEY board_defects_board (board_id),
      CONSTRAINT board_defects_face CHECK (face IN ('heart', 'bark', 'both')),
      CONSTRAINT board_defects_size CHECK (along_mm >= 0 AND across_mm >= 0 AND length_mm > 0 AND width_mm > 0),
      CONSTRAINT board_defects_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT board_defects_board FOREIGN KEY (board_id) REFERENCES boards (id)
    ) ${options}`,
    `CREATE TABLE moisture_readings (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      ${id("board_id")},
      moisture_pct DECIMAL(4,1) NOT NULL,
      meter_pct DECIMAL(4,1) NOT NULL,
      meter VARCHAR(10) NOT NULL DEFAULT 'pin',
      wood_temperature_c DECIMAL(4,1) NULL,
      place VARCHAR(80) NOT NULL DEFAULT '',
      ${id("read_by")},
      ${stamp("read_at")},
      KEY moisture_readings_board (board_id, read_at),
      CONSTRAINT moisture_readings_meter CHECK (meter IN ('pin', 'pinless', 'oven')),
      CONSTRAINT moisture_readings_range CHECK (moisture_pct BETWEEN 0 AND 200 AND meter_pct BETWEEN 0 AND 200),
      CONSTRAINT moisture_readings_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT moisture_readings_board FOREIGN KEY (board_id) REFERENCES boards (id),
      CONSTRAINT moisture_readings_by FOREIGN KEY (read_by) REFERENCES people (id)
    ) ${options}`,
    `CREATE TABLE board_events (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      ${id("board_id")},
      kind VARCHAR(30) NOT NULL,
      detail JSON NOT NULL,
      ${id("by_person_id", "null")},
      ${stamp("at")},
      KEY board_events_board (board_id, at),
      CONSTRAINT board_events_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT board_events_board FOREIGN KEY (board_id) REFERENCES boards (id),
      CONSTRAINT board_events_by FOREIGN KEY (by_person_id) REFERENCES people (id)
    ) ${options}`,
    // History is never edited: a wrong entry is corrected by a new one.
    `CREATE TRIGGER board_events_no_update BEFORE UPDATE ON board_events FOR EACH ROW
      SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'history is never edited'`,
    `CREATE TRIGGER board_events_no_delete BEFORE DELETE ON board_events FOR EACH ROW
      SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'history is never edited'`,
  ]);
}

export async function down(knex: Knex): Promise<void> {
  await drop(knex, ["board_events", "moisture_readings", "board_defects", "boards", "arms", "bays"]);
}
