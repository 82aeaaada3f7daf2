import type { Knex } from "knex";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import { newId } from "#app/services/ids.server.ts";
import type { ShopForm } from "./shop.schema.ts";
import type { ShopSettings } from "./shop.ts";

const columns = {
  id: "id",
  name: "name",
  units: "units",
  currency: "currency",
  targetTemperatureC: "target_temperature_c",
  targetHumidityPct: "target_humidity_pct",
  kerfMm: "kerf_mm",
  endTrimMm: "end_trim_mm",
  allowanceLengthMm: "allowance_length_mm",
  allowanceWidthMm: "allowance_width_mm",
  allowanceThicknessMm: "allowance_thickness_mm",
  jointPerFaceMm: "joint_per_face_mm",
  offcutMinLengthMm: "offcut_min_length_mm",
  offcutMinWidthMm: "offcut_min_width_mm",
  holdDays: "hold_days",
  sawMaxHeightMm: "saw_max_height_mm",
  jointerMaxWidthMm: "jointer_max_width_mm",
  jointerMinLengthMm: "jointer_min_length_mm",
  planerMaxWidthMm: "planer_max_width_mm",
  planerMinLengthMm: "planer_min_length_mm",
  clamps: "clamps",
  clampForceN: "clamp_force_n",
  flatBelowDeg: "flat_below_deg",
  quarteredAboveDeg: "quartered_above_deg",
  labelSheet: "label_sheet",
  version: "version",
} as const;

/** Writes down a new shop, with the table's own settings for all that is not given. @returns its id. */
export async function insertShop(
  db: Knex,
  shop: { name: string; units: LengthUnit; currency: string },
): Promise<string> {
  const id = newId();
  await db("shops").insert({ id, ...shop });
  return id;
}

/** A shop's settings, or null. */
export async function getShop(db: Knex, shopId: string): Promise<ShopSettings | null> {
  const row = await db("shops").where({ id: shopId }).first(columns);
  if (!row) return null;
  const { flatBelowDeg, quarteredAboveDeg, ...rest } = row;
  return { ...rest, classLimits: { flatBelowDeg, quarteredAboveDeg } };
}

/** Saves settings made from the given version; false when they have changed since. */
export async function updateShop(db: Knex, shopId: string, version: number, form: ShopForm): Promise<boolean> {
  const row = Object.fromEntries(
    (Object.keys(form) as (keyof ShopForm)[]).map((field) => [columns[field], form[field]]),
  );
  return (
    (await db("shops")
      .where({ id: shopId, version })
      .update({ ...row, version: version + 1 })) === 1
  );
}
