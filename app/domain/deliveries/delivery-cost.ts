import { type ClaimCompared, chargeMinor, compareClaim } from "#app/core/measure/claim.ts";
import type { MeasuredBoard } from "#app/core/measure/measured-board.ts";
import { type Tally, tally } from "#app/core/measure/tally.ts";
import type { VolumeUnit } from "#app/core/measure/volume-units.ts";
import type { Delivery } from "./delivery.ts";
import { shareOut } from "./share-cost.ts";

type Priced = Pick<Delivery, "claimedVolume" | "claimedUnit" | "priceMinor" | "priceBasis" | "freightMinor">;
type Measured = Pick<Tally, "boardFeet" | "volumeM3">;

/**
 * What a delivery costs in all, freight included, in minor units. A price by volume is charged on the supplier's claim, or on the shop's own measure
 * where nothing was claimed.
 *
 * @param measured the tally; null before there is one.
 * @returns null when no price was given, or it depends on a tally not yet made.
 */
export function deliveryTotalMinor(delivery: Priced, measured: Measured | null): number | null {
  const { priceMinor, priceBasis: basis, freightMinor, claimedVolume, claimedUnit } = delivery;
  if (priceMinor === null) return null;
  const price = { minor: priceMinor, basis };
  if (basis === "lump") return priceMinor + freightMinor;
  if (claimedVolume !== null) return chargeMinor(price, claimedVolume, claimedUnit) + freightMinor;
  return measured && chargeMinor(price, basis === "bf" ? measured.boardFeet : measured.volumeM3, basis) + freightMinor;
}

/**
 * What each board of a delivery is charged with: its share of the whole, freight included, by board feet as measured, so that the sum is exact.
 *
 * @param boards all boards of the delivery, one by one.
 * @returns null when the whole is not known.
 */
export function boardCostsMinor(delivery: Priced, boards: readonly MeasuredBoard[]): number[] | null {
  const measured = tally(
    boards.map(({ quarters, widthMm, widthFarMm, lengthMm }) => ({ quarters, widthMm, widthFarMm, lengthMm })),
  );
  const total = deliveryTotalMinor(delivery, measured);
  const weights = measured.lines.map((line) => line.unroundedBoardFeet);
  return total === null ? null : shareOut(total, weights);
}

/** The supplier's claim against the shop's own tally, freight apart; null where nothing was claimed. */
export function checkClaim(delivery: Priced, measured: Measured): ClaimCompared | null {
  const { claimedVolume, claimedUnit, priceMinor, priceBasis } = delivery;
  if (claimedVolume === null) return null;
  const price = priceMinor === null ? null : { minor: priceMinor, basis: priceBasis };
  return compareClaim({ volume: claimedVolume, unit: claimedUnit }, measured, { price });
}

/** "1,212.5 bf", "0.500 m³". */
export function printVolume(volume: number, unit: VolumeUnit): string {
  return unit === "bf" ? `${volume.toLocaleString("en", { maximumFractionDigits: 2 })} bf` : `${volume.toFixed(3)} m³`;
}
