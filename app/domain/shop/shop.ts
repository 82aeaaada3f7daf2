import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import type { ClassLimits } from "#app/core/rings/ring-types.ts";

/** What every screen of a shop needs to know: how it writes sizes, money and ring classes. */
export interface ShopSettings {
  id: string;
  name: string;
  units: LengthUnit;
  /** ISO 4217. */
  currency: string;
  targetTemperatureC: number;
  targetHumidityPct: number;
  kerfMm: number;
  endTrimMm: number;
  allowanceLengthMm: number;
  allowanceWidthMm: number;
  allowanceThicknessMm: number;
  jointPerFaceMm: number;
  offcutMinLengthMm: number;
  offcutMinWidthMm: number;
  /** How long a hold lasts when nobody says otherwise. */
  holdDays: number;
  sawMaxHeightMm: number;
  jointerMaxWidthMm: number;
  jointerMinLengthMm: number;
  planerMaxWidthMm: number;
  planerMinLengthMm: number;
  clamps: number;
  clampForceN: number;
  classLimits: ClassLimits;
  labelSheet: string;
  version: number;
}
