import { requireWithin } from "#app/core/moisture/accepted-range.ts";
import { kilnAllowancePct, netFromGross } from "./kiln-allowance.ts";
import { convertVolume, type VolumeUnit } from "./volume-units.ts";

/** What the supplier says was delivered. */
export interface Claim {
  volume: number;
  unit: VolumeUnit;
  /** Tallied green, before the kiln: less is then expected to arrive. */
  isGross?: boolean;
}

/** A price in whole minor units of a currency: per board foot, per m3, or for the lot. */
export interface Price {
  minor: number;
  basis: VolumeUnit | "lump";
}

/** Claimed against measured. Differences are measured less expected: below zero, wood is missing. */
export interface ClaimCompared {
  /** The unit of the claim and of every volume here. */
  unit: VolumeUnit;
  claimedVolume: number;
  /** The claim, less the kiln allowance where it was tallied green. */
  expectedVolume: number;
  measuredVolume: number;
  differenceVolume: number;
  /** Percent of what was expected. */
  differencePct: number;
  /** What the supplier charges for the claim; null without a price. */
  chargedMinor: number | null;
  /** The difference at the price charged, in proportion; null without a price. Below zero: charged for wood not there. */
  differenceMinor: number | null;
}

const mostVolume = 1e9;

/**
 * Holds a supplier's claim against the shop's own tally. A claim in board feet is held against board feet, one in m3
 * against m3; neither is converted, since a rounded tally and a true volume do not convert.
 *
 * @param measured a tally's board feet and m3.
 * @param options.price left out or null where none was given.
 * @param options.allowancePct what the kiln takes of a gross claim.
 * @throws RangeError unless the claim is above zero and the price a whole number of minor units, zero or more.
 */
export function compareClaim(
  claim: Claim,
  measured: { boardFeet: number; volumeM3: number },
  { price = null, allowancePct = kilnAllowancePct.usual }: { price?: Price | null; allowancePct?: number } = {},
): ClaimCompared {
  const claimedVolume = requireWithin("A claimed volume", claim.volume, 1e-6, mostVolume, claim.unit);
  const expectedVolume = claim.isGross ? netFromGross(claimedVolume, allowancePct) : claimedVolume;
  const measuredVolume = requireWithin(
    "A measured volume",
    claim.unit === "bf" ? measured.boardFeet : measured.volumeM3,
    0,
    mostVolume,
    claim.unit,
  );
  const differenceVolume = measuredVolume - expectedVolume;
  const share = differenceVolume / expectedVolume;
  const chargedMinor = price === null ? null : chargeMinor(price, claimedVolume, claim.unit);
  return {
    unit: claim.unit,
    claimedVolume,
    expectedVolume,
    measuredVolume,
    differenceVolume,
    differencePct: share * 100,
    chargedMinor,
    differenceMinor: chargedMinor === null ? null : roundMoney(chargedMinor * share),
  };
}

/**
 * What a volume costs at a price, whole minor units. A price by the other unit is converted by definition.
 *
 * @throws RangeError unless the price is a whole number of minor units, zero or more.
 */
export function chargeMinor({ minor, basis }: Price, volume: number, unit: VolumeUnit): number {
  if (!Number.isSafeInteger(minor) || minor < 0)
    throw new RangeError(`A price must be a whole number of minor units, zero or more; got ${minor}.`);
  if (basis === "lump") return minor;
  return roundMoney(minor * convertVolume(requireWithin("A volume", volume, 0, mostVolume, unit), unit, basis));
}

/** To the nearest minor unit, halves away from zero, so that a shortage and a surplus of one size cost the same. */
function roundMoney(amount: number): number {
  const size = Math.round(Math.abs(amount));
  return amount < 0 && size > 0 ? -size : size;
}
