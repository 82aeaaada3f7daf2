import type { ShopForCalculators } from "./ask.ts";

/** A shop as it is when it opens, for tests that need no database. */
export function aShopLike(given: Partial<ShopForCalculators> = {}): ShopForCalculators {
  return {
    id: "shop",
    name: "Shop",
    units: "in",
    currency: "USD",
    targetTemperatureC: 20,
    targetHumidityPct: 40,
    kerfMm: 3.175,
    endTrimMm: 25.4,
    allowanceLengthMm: 25.4,
    allowanceWidthMm: 6.35,
    allowanceThicknessMm: 6.35,
    jointPerFaceMm: 1.5875,
    offcutMinLengthMm: 304.8,
    offcutMinWidthMm: 63.5,
    holdDays: 14,
    sawMaxHeightMm: 79.375,
    jointerMaxWidthMm: 203.2,
    jointerMinLengthMm: 304.8,
    planerMaxWidthMm: 330.2,
    planerMinLengthMm: 355.6,
    clamps: 12,
    clampForceN: 4448.2,
    classLimits: { flatBelowDeg: 30, quarteredAboveDeg: 60 },
    labelSheet: "roll-62x29",
    version: 1,
    ...given,
  };
}

/** An address's boxes. */
export function boxes(given: Record<string, string>): URLSearchParams {
  return new URLSearchParams(given);
}
