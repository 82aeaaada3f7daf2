import type { Explained } from "#app/core/endgrain/level-shift.ts";
import { type RingLevels, slopeAt } from "#app/core/endgrain/ring-levels.ts";
import type { ClassLimits, ClassShares } from "#app/core/rings/ring-types.ts";

const DEG = 180 / Math.PI;

/** The rings over one part of the width, from the bare field. `explained`: share of the picture there that the rings explain. */
export type FieldStation = {
  position: number;
  angleDeg: number;
  signedDeg: number;

  explained: number;
  /** Spread of the angle within the part, degrees: large near the pith. */
  spreadDeg: number;
};

const SAMPLES_ACROSS = 14;
const SAMPLES_DOWN = 18;

/**
 * Ring angles in equal parts across the width. `angleDeg` is the mean over the part's area of the acute angle between ring and
 * wide face (0 flat-sawn, 90 quartered); `signedDeg` the axial mean direction, positive when the ring falls to the right.
 */
export function readStations(
  levels: RingLevels,
  explained: Explained,
  count: number,
  limits: ClassLimits,
): { stations: FieldStation[]; shares: ClassShares; angleDeg: number } {
  const shares: ClassShares = { flat: 0, rift: 0, quartered: 0 };
  const each = 1 / (count * SAMPLES_ACROSS * SAMPLES_DOWN);
  const stations = Array.from({ length: count }, (_, s): FieldStation => {
    let sum = 0;
    let squares = 0;
    let cos2 = 0;
    let sin2 = 0;
    for (let i = 0; i < SAMPLES_ACROSS; i++) {
      const x = (levels.width * (s + (i + 0.5) / SAMPLES_ACROSS)) / count;
      for (let j = 0; j < SAMPLES_DOWN; j++) {
        const slope = slopeAt(levels, x, (levels.height * (j + 0.5)) / SAMPLES_DOWN);
        const signed = Math.atan2(slope.x, -slope.y);
        const acute = Math.atan2(Math.abs(slope.x), Math.abs(slope.y)) * DEG;
        sum += acute;
        squares += acute * acute;
        cos2 += Math.cos(2 * signed);
        sin2 += Math.sin(2 * signed);
        if (acute < limits.flatBelowDeg) shares.flat += each;
        else if (acute < limits.quarteredAboveDeg) shares.rift += each;
        else shares.quartered += each;
      }
    }
    const n = SAMPLES_ACROSS * SAMPLES_DOWN;
    return {
      position: (s + 0.5) / count,
      angleDeg: sum / n,
      signedDeg: (Math.atan2(sin2, cos2) / 2) * DEG,
      spreadDeg: Math.sqrt(Math.max(0, squares / n - (sum / n) ** 2)),
      explained: meanExplained(explained, s / count, (s + 1) / count),
    };
  });
  return { stations, shares, angleDeg: stations.reduce((sum, station) => sum + station.angleDeg, 0) / count };
}

function meanExplained(explained: Explained, from: number, to: number): number {
  const first = Math.floor(from * explained.columns);
  const last = Math.max(first, Math.ceil(to * explained.columns) - 1);
  const values: number[] = [];
  for (let row = 0; row < explained.rows; row++) {
    for (let column = first; column <= last; column++) {
      const value = explained.explained[row * explained.columns + column]!;
      values.push(Number.isNaN(value) ? 0 : Math.max(0, value));
    }
  }
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
