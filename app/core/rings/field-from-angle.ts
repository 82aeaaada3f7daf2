import type { RingField } from "./ring-types.ts";
import { fieldFromPith } from "./stations.ts";

/** Rings set by an angle alone are drawn as if centred this many widths away: as good as straight. */
const awayWidths = 400;

/**
 * The rings of an end of which only the angle is known, the same all across the width.
 *
 * @param angleDeg between rings and wide face, 0 to 90.
 * @param falls whether a ring, followed to the right, falls or rises.
 * @throws RangeError for an angle outside 0 to 90.
 */
export function fieldFromAngle(
  size: { widthMm: number; thicknessMm: number },
  angleDeg: number,
  falls: "right" | "left",
): RingField {
  if (!(angleDeg >= 0 && angleDeg <= 90)) throw new RangeError(`A ring angle is 0 to 90 degrees; got ${angleDeg}.`);
  const signed = ((falls === "right" ? angleDeg : -angleDeg) * Math.PI) / 180;
  const away = awayWidths * size.widthMm;
  const pith = { xMm: size.widthMm / 2 - away * Math.sin(signed), yMm: size.thicknessMm / 2 + away * Math.cos(signed) };
  return { ...fieldFromPith(size, pith), pith: null };
}
