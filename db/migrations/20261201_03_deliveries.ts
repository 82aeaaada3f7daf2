import type { Knex } from "knex";
import { drop, id, options, run, stamp } from "../sql.ts";

export async function up(knex: Knex): Promise<void> {
  await run(knex, [
    `CREATE TABLE suppliers (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      name VARCHAR(120) NOT NULL,
      email VARCHAR(254) NOT NULL DEFAULT '',
      phone VARCHAR(40) NOT NULL DEFAULT '',
      notes TEXT NOT NULL DEFAULT '',
      version INT UNSIGNED NOT NULL DEFAULT 1,
      ${stamp("created_at")},
      UNIQUE KEY suppliers_name (shop_id, name),
      CONSTRAINT suppliers_shop FOREIGN KEY (shop_id) REFERENCES shops (id)
    ) ${options}`,
    // The boards of one delivery are a lot. Money in minor units of the shop's currency; the claim is kept as the supplier wrote it.
    `CREATE TABLE deliveries (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      ${id("supplier_id")},
      received_on DATE NOT NULL,
      reference VARCHAR(80) NOT NULL DEFAULT '',
      species VARCHAR(60) NOT NULL,
      quarters SMALLINT UNSIGNED NOT NULL,
      drying VARCHAR(12) NOT NULL DEFAULT 'kiln',
      grade VARCHAR(40) NOT NULL DEFAULT '',
      claimed_volume DECIMAL(12,4) NULL,
      claimed_unit CHAR(2) NOT NULL DEFAULT 'bf',
      price_minor BIGINT UNSIGNED NULL,
      price_basis VARCHAR(4) NOT NULL DEFAULT 'bf',
      freight_minor BIGINT UNSIGNED NOT NULL DEFAULT 0,
      origin VARCHAR(120) NOT NULL DEFAULT '',
      certificate VARCHAR(120) NOT NULL DEFAULT '',
      notes TEXT NOT NULL DEFAULT '',
      tally_draft JSON NULL,
      tally_draft_version INT UNSIGNED NOT NULL DEFAULT 0,
      tallied_at DATETIME(3) NULL,
      version INT UNSIGNED NOT NULL DEFAULT 1,
      ${id("created_by")},
      ${stamp("created_at")},
      KEY deliveries_recent (shop_id, received_on),
      KEY deliveries_supplier (supplier_id),
      CONSTRAINT deliveries_drying CHECK (drying IN ('green', 'air', 'kiln')),
      CONSTRAINT deliveries_claimed_unit CHECK (claimed_unit IN ('bf', 'm3')),
      CONSTRAINT deliveries_price_basis CHECK (price_basis IN ('bf', 'm3', 'lump')),
      CONSTRAINT deliveries_claimed CHECK (claimed_volume IS NULL OR claimed_volume > 0),
      CONSTRAINT deliveries_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT deliveries_supplier FOREIGN KEY (supplier_id) REFERENCES suppliers (id),
      CONSTRAINT deliveries_by FOREIGN KEY (created_by) REFERENCES people (id)
    ) ${options}`,
    `CREATE TABLE delivery_documents (
      ${id("id")} PRIMARY KEY,
      ${id("shop_id")},
      ${id("delivery_id")},
      state VARCHAR(8) NOT NULL DEFAULT 'waiting',
      name VARCHAR(200) NOT NULL,
      object_key VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      content_type VARCHAR(60) NOT NULL DEFAULT '',
      bytes INT UNSIGNED NOT NULL DEFAULT 0,
      ${id("created_by")},
      ${stamp("created_at")},
      UNIQUE KEY delivery_documents_key (object_key),
      KEY delivery_documents_delivery (delivery_id),
      CONSTRAINT delivery_documents_state CHECK (state IN ('waiting', 'ready')),
      CONSTRAINT delivery_documents_shop FOREIGN KEY (shop_id) REFERENCES shops (id),
      CONSTRAINT delivery_documents_delivery FOREIGN KEY (delivery_id) REFERENCES deliveries (id),
      CONSTRAINT delivery_documents_by FOREIGN KEY (created_by) REFERENCES people (id)
    ) ${options}`,
  ]);
}

export async function down(knex: Knex): Promise<void> {
  await drop(knex, ["delivery_documents", "deliveries", "suppliers"]);
}
