import { axialMean, signedRingDeg } from "./angle.ts";
import type { PointMm, RingField, RingStation } from "./ring-types.ts";

/** A board's end, in millimetres. */
export interface EndSize {
  widthMm: number;
  thicknessMm: number;
}

/** Slices of the width that a reading is kept in, unless told otherwise. */
export const stationCount = 9;

/** Samples of a slice each way: halving them moves a station by under 0.05 degrees unless the pith lies in it. */
const samples = 24;

/**
 * What rings centred on a pith do across a board's end: for each slice of the width the mean over the slice's area of the acute ring angle, and
 * the axial mean of its direction.
 *
 * @param size of the end; RangeError unless both are above zero.
 * @param pith from the end's top left corner, inside the board or outside.
 * @param ringsPerInch if known.
 * @param count of slices.
 */
export function fieldFromPith(
  { widthMm, thicknessMm }: EndSize,
  pith: PointMm,
  ringsPerInch: number | null = null,
  count = stationCount,
): RingField {
  const size = requireEndSize({ widthMm, thicknessMm });
  const stations = Array.from({ length: count }, (_, i) => pithStation(size, pith, i, count).station);
  return { ...size, stations, pith: { xMm: pith.xMm, yMm: pith.yMm }, ringsPerInch };
}

/**
 * One slice of `fieldFromPith`. `strength` is 1 where all rings of the slice run one way and falls towards 0 where the pith lies in it, so that its
 * mean direction says little.
 */
export function pithStation(
  { widthMm, thicknessMm }: EndSize,
  pith: PointMm,
  index: number,
  count: number,
): { station: RingStation; strength: number } {
  const signed: number[] = [];
  for (let i = 0; i < samples; i++)
    for (let j = 0; j < samples; j++) {
      const xMm = ((index + (i + 0.5) / samples) / count) * widthMm;
      signed.push(signedRingDeg({ xMm, yMm: ((j + 0.5) / samples) * thicknessMm }, pith));
    }
  const { signedDeg, strength } = axialMean(signed);
  const angleDeg = signed.reduce((sum, deg) => sum + Math.abs(deg), 0) / signed.length;
  return { station: { position: (index + 0.5) / count, angleDeg, signedDeg, confidence: 1 }, strength };
}

/** The size back, or a RangeError unless both sides are above zero and under 100 m. */
export function requireEndSize(size: EndSize): EndSize {
  for (const [side, mm] of Object.entries(size))
    if (!(mm > 0 && mm <= 100_000))
      throw new RangeError(`${side} of a board's end must be above 0 and at most 100000; got ${mm}.`);
  return size;
}
