import type { Delivery } from "./delivery.ts";

/** Board feet in a cubic metre, from the definition of the foot (trade reference, section 1). */
const boardFeetPerM3 = 423.776;

/**
 * What a delivery costs in all, freight included, in minor units. A price by volume is charged on the supplier's claim, or on the shop's own measure
 * where nothing was claimed.
 *
 * @param measuredBf board feet as tallied.
 * @returns null when no price was given.
 */
export function deliveryTotalMinor(
  delivery: Pick<Delivery, "claimedVolume" | "claimedUnit" | "priceMinor" | "priceBasis" | "freightMinor">,
  measuredBf: number,
): number | null {
  const { priceMinor, priceBasis, freightMinor, claimedVolume, claimedUnit } = delivery;
  if (priceMinor === null) return null;
  if (priceBasis === "lump") return priceMinor + freightMinor;
  const claimedBf =
    claimedVolume === null ? measuredBf : claimedUnit === "bf" ? claimedVolume : claimedVolume * boardFeetPerM3;
  const volume = priceBasis === "bf" ? claimedBf : claimedBf / boardFeetPerM3;
  return Math.round(priceMinor * volume) + freightMinor;
}
