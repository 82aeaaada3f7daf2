import type { PointMm, RingField, RingStation } from "./ring-types.ts";

const samplesAcross = 7;
const samplesDown = 9;

/**
 * What rings centred on a pith do across a board's end: the mean over each slice of the width, sampled over its area.
 *
 * @param size of the end in millimetres.
 * @param pith from the end's top left corner, inside or outside.
 * @param ringsPerInch if known.
 * @param count of slices.
 */
export function fieldFromPith(
  size: { widthMm: number; thicknessMm: number },
  pith: PointMm,
  ringsPerInch: number | null = null,
  count = 9,
): RingField {
  const stations = Array.from({ length: count }, (_, i) => station(size, pith, (i + 0.5) / count, 1 / count));
  return { ...size, stations, pith, ringsPerInch };
}

function station(
  size: { widthMm: number; thicknessMm: number },
  pith: PointMm,
  position: number,
  share: number,
): RingStation {
  let acute = 0;
  let cosine = 0;
  let sine = 0;
  for (let i = 0; i < samplesAcross; i++)
    for (let j = 0; j < samplesDown; j++) {
      const dx = (position + ((i + 0.5) / samplesAcross - 0.5) * share) * size.widthMm - pith.xMm;
      const dy = ((j + 0.5) / samplesDown) * size.thicknessMm - pith.yMm;
      // The ring's tangent is square to the radius; y points down, so a falling tangent counts as positive.
      const signed = Math.atan2(-dx, dy);
      acute += Math.abs(Math.atan2(Math.abs(dx), Math.abs(dy)));
      cosine += Math.cos(2 * signed);
      sine += Math.sin(2 * signed);
    }
  const samples = samplesAcross * samplesDown;
  return {
    position,
    angleDeg: toDegrees(acute / samples),
    signedDeg: toDegrees(Math.atan2(sine, cosine) / 2),
    confidence: 1,
  };
}

function toDegrees(radians: number): number {
  return (radians * 180) / Math.PI;
}
