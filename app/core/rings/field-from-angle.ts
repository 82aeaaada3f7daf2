import type { RingField } from "./ring-types.ts";
import { type EndSize, requireEndSize, stationCount } from "./stations.ts";

/** How far an angle that somebody judged by eye is to be trusted: good to some ten degrees, our own estimate. */
const byEyeConfidence = 0.5;

/**
 * The rings of an end of which only the angle is known, the same all across the width: for an angle chosen on a drawn end, without a photo.
 *
 * @param angleDeg between rings and wide face, 0 to 90.
 * @param falls the side to which a ring falls, looking at the end; flat and quartered rings fall to neither.
 * @throws RangeError for an angle outside 0 to 90 or a size that is none.
 */
export function fieldFromAngle(
  { widthMm, thicknessMm }: EndSize,
  angleDeg: number,
  falls: "right" | "left",
  ringsPerInch: number | null = null,
): RingField {
  if (!(angleDeg >= 0 && angleDeg <= 90)) throw new RangeError(`A ring angle is 0 to 90 degrees; got ${angleDeg}.`);
  const signedDeg = falls === "right" || angleDeg === 0 ? angleDeg : -angleDeg;
  const stations = Array.from({ length: stationCount }, (_, i) => ({
    position: (i + 0.5) / stationCount,
    angleDeg,
    signedDeg,
    confidence: byEyeConfidence,
  }));
  return { ...requireEndSize({ widthMm, thicknessMm }), stations, pith: null, ringsPerInch };
}
