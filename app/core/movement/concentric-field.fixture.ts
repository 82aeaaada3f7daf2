import type { PointMm, RingField } from "#app/core/rings/ring-types.ts";

/** For tests: the stations that rings centred on `pith` give at mid thickness, in `count` slices of the width. */
export function concentricField(widthMm: number, thicknessMm: number, pith: PointMm, count = 9): RingField {
  const stations = Array.from({ length: count }, (_, i) => {
    const position = (i + 0.5) / count;
    const across = position * widthMm - pith.xMm;
    const down = thicknessMm / 2 - pith.yMm;
    const signedDeg = down === 0 ? 90 : (Math.atan(-across / down) * 180) / Math.PI;
    return { position, signedDeg, angleDeg: Math.abs(signedDeg), confidence: 1 };
  });
  return { widthMm, thicknessMm, stations, pith, ringsPerInch: null };
}
