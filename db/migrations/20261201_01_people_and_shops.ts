import type { Knex } from "knex";
import { drop, id, options, run, stamp } from "../sql.ts";

export async function up(knex: Knex): Promise<void> {
  await run(knex, [
    `CREATE TABLE people (
      ${id("id")} PRIMARY KEY,
      email VARCHAR(254) NOT NULL,
      name VARCHAR(120) NOT NULL DEFAULT '',
      ${stamp("created_at")},
      UNIQUE KEY people_email (email),
      CONSTRAINT people_email_shape CHECK (email = LOWER(email) AND email LIKE '_%@_%')
    ) ${options}`,
    // Lengths are millimetres to a millionth: 1/64 in is 0.396875 mm, and nothing typed is ever rounded away.
    `CREATE TABLE shops (
      ${id("id")} PRIMARY KEY,
      name VARCHAR(120) NOT NULL,
      units CHAR(2) NOT NULL DEFAULT 'in',
      currency CHAR(3) NOT NULL DEFAULT 'USD',
      tag_next INT UNSIGNED NOT NULL DEFAULT 1,
      target_temperature_c DECIMAL(4,1) NOT NULL DEFAULT 20,
      target_humidity_pct DECIMAL(4,1) NOT NULL DEFAULT 40,
      kerf_mm DECIMAL(12,6) NOT NULL DEFAULT 3.175,
      end_trim_mm DECIMAL(12,6) NOT NULL DEFAULT 25.4,
      allowance_length_mm DECIMAL(12,6) NOT NULL DEFAULT 25.4,
      allowance_width_mm DECIMAL(12,6) NOT NULL DEFAULT 6.35,
      allowance_thickness_mm DECIMAL(12,6) NOT NULL DEFAULT 6.35,
      joint_per_face_mm DECIMAL(12,6) NOT NULL DEFAULT 1.5875,
      offcut_min_length_mm DECIMAL(12,6) NOT NULL DEFAULT 304.8,
      offcut_min_width_mm DECIMAL(12,6) NOT NULL DEFAULT 63.5,
      hold_days SMALLINT UNSIGNED NOT NULL DEFAULT 14,
      saw_max_height_mm DECIMAL(12,6) NOT NULL DEFAULT 79.375,
      jointer_max_width_mm DECIMAL(12,6) NOT NULL DEFAULT 203.2,
      jointer_min_length_mm DECIMAL(12,6) NOT NULL DEFAULT 304.8,
      planer_max_width_mm DECIMAL(12,6) NOT NULL DEFAULT 330.2,
      planer_min_length_mm DECIMAL(12,6) NOT NULL DEFAULT 355.6,
      clamps SMALLINT UNSIGNED NOT NULL DEFAULT 12,
      clamp_force_n DECIMAL(8,1) NOT NULL DEFAULT 4448.2,
      flat_below_deg DECIMAL(4,1) NOT NULL DEFAULT 30,
      quartered_above_deg DECIMAL(4,1) NOT NULL DEFAULT 60,
      label_sheet VARCHAR(40) NOT NULL DEFAULT 'roll-62x29',
      version INT UNSIGNED NOT NULL DEFAULT 1,
      ${stamp("created_at")},
      CONSTRAINT shops_units CHECK (units IN ('in', 'mm')),
      CONSTRAINT shops_ring_limits CHECK (0 < flat_below_deg AND flat_below_deg <= quartered_above_deg AND quartered_above_deg < 90),
      CONSTRAINT shops_hold_days CHECK (hold_days BETWEEN 1 AND 365),
      CONSTRAINT shops_sizes CHECK (kerf_mm >= 0 AND end_trim_mm >= 0 AND offcut_min_length_mm >= 0 AND offcut_min_width_mm >= 0)
    ) ${options}`,
    `CREATE TABLE memberships (
      ${id("shop_id")},
      ${id("person_id")},
      role VARCHAR(10) NOT NULL,
      ${stamp("created_at")},
      PRIMARY KEY (shop_id, person_id),
      KEY memberships_person (person_id),
      CONSTRAINT memberships_role CHECK (role IN ('owner', 'maker', 'helper')),
      CONSTRAINT memberships_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT memberships_person FOREIGN KEY (person_id) REFERENCES people (id)
    ) ${options}`,
    `CREATE TABLE invitations (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      email VARCHAR(254) NOT NULL,
      role VARCHAR(10) NOT NULL,
      token_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      ${id("invited_by")},
      ${stamp("created_at")},
      expires_at DATETIME(3) NOT NULL,
      accepted_at DATETIME(3) NULL,
      UNIQUE KEY invitations_token (token_hash),
      UNIQUE KEY invitations_once (shop_id, email),
      CONSTRAINT invitations_role CHECK (role IN ('owner', 'maker', 'helper')),
      CONSTRAINT invitations_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT invitations_by FOREIGN KEY (invited_by) REFERENCES people (id)
    ) ${options}`,
  ]);
}

export async function down(knex: Knex): Promise<void> {
  await drop(knex, ["invitations", "memberships", "shops", "people"]);
}
