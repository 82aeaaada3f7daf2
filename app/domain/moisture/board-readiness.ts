import { equilibriumMoistureC } from "#app/core/moisture/emc.ts";
import type { Meter } from "#app/core/moisture/meter.ts";
import type { ShopSettings } from "#app/domain/shop/shop.ts";
import { correctedReading } from "./corrected-reading.ts";
import type { MoistureReading } from "./moisture.sql.server.ts";
import type { Place } from "./places.ts";
import { type ReadyView, readyView } from "./ready.ts";

/** When a board will be ready for a place, as its page shows it. */
export interface BoardReadiness {
  place: Place;
  view: ReadyView;
  /** Today on the plot's scale of days. */
  today: number | null;
  /** What the newest reading cannot be trusted for, in a sentence. */
  newestOutside: string | null;
}

const msPerDay = 86_400_000;

/** The board's readiness in the shop's own air, for the place where its piece will live. Null before the first reading. */
export function boardReadiness(
  readings: readonly MoistureReading[],
  shop: Pick<ShopSettings, "targetHumidityPct" | "targetTemperatureC">,
  place: Place,
  now: Date,
): BoardReadiness | null {
  const newest = readings.at(-1);
  if (!newest) return null;
  const { targetPct, tolerancePct } = place.target;
  const view = readyView({
    readings: readings.map(({ readAt, moisturePct }) => ({ at: readAt, moisturePct })),
    emcPct: equilibriumMoistureC(shop.targetHumidityPct, shop.targetTemperatureC).moisturePct,
    targetPct,
    tolerancePct,
  });
  return {
    place,
    view,
    today: view.startsAt && (now.getTime() - view.startsAt.getTime()) / msPerDay,
    newestOutside: correctedReading({ ...newest, meter: newest.meter as Meter }).outsideRange,
  };
}
