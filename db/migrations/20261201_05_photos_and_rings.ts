import type { Knex } from "knex";
import { drop, id, options, run, stamp } from "../sql.ts";

export async function up(knex: Knex): Promise<void> {
  await run(knex, [
    `CREATE TABLE photos (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      ${id("board_id")},
      kind VARCHAR(10) NOT NULL,
      state VARCHAR(8) NOT NULL DEFAULT 'waiting',
      original_key VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      screen_key VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NULL,
      small_key VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NULL,
      content_type VARCHAR(40) NOT NULL DEFAULT '',
      bytes INT UNSIGNED NOT NULL DEFAULT 0,
      width_px INT UNSIGNED NULL,
      height_px INT UNSIGNED NULL,
      generated TINYINT(1) NOT NULL DEFAULT 0,
      ${id("added_by")},
      ${stamp("created_at")},
      UNIQUE KEY photos_original (original_key),
      KEY photos_board (board_id, state, created_at),
      KEY photos_waiting (state, created_at),
      CONSTRAINT photos_kind CHECK (kind IN ('near end', 'far end', 'heart face', 'bark face', 'edge')),
      CONSTRAINT photos_state CHECK (state IN ('waiting', 'ready')),
      CONSTRAINT photos_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT photos_board FOREIGN KEY (board_id) REFERENCES boards (id),
      CONSTRAINT photos_by FOREIGN KEY (added_by) REFERENCES people (id)
    ) ${options}`,
    // A reading keeps what it was made from (photo, corners, strokes), how (source, method version) and by whom. The newest per end counts.
    `CREATE TABLE ring_readings (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      ${id("board_id")},
      board_end VARCHAR(4) NOT NULL,
      source VARCHAR(10) NOT NULL,
      method_version VARCHAR(20) NOT NULL,
      ${id("photo_id", "null")},
      inputs JSON NOT NULL,
      width_mm DECIMAL(12,6) NOT NULL,
      thickness_mm DECIMAL(12,6) NOT NULL,
      field JSON NOT NULL,
      confidence DECIMAL(4,3) NOT NULL,
      ${id("read_by")},
      ${stamp("read_at")},
      KEY ring_readings_board (board_id, board_end, read_at),
      CONSTRAINT ring_readings_end CHECK (board_end IN ('near', 'far')),
      CONSTRAINT ring_readings_source CHECK (source IN ('strokes', 'angle', 'photo', 'parent')),
      CONSTRAINT ring_readings_confidence CHECK (confidence BETWEEN 0 AND 1),
      CONSTRAINT ring_readings_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT ring_readings_board FOREIGN KEY (board_id) REFERENCES boards (id),
      CONSTRAINT ring_readings_photo FOREIGN KEY (photo_id) REFERENCES photos (id),
      CONSTRAINT ring_readings_by FOREIGN KEY (read_by) REFERENCES people (id)
    ) ${options}`,
  ]);
}

export async function down(knex: Knex): Promise<void> {
  await drop(knex, ["ring_readings", "photos"]);
}
