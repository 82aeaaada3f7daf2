import { emptyPlane, type Plane } from "#app/core/endgrain/pixels.ts";

/** The plane at another size, not larger in either direction: each new pixel is the mean of the area it covers. */
export function shrunk(plane: Plane, width: number, height: number): Plane {
  if (width === plane.width && height === plane.height) return plane;
  const narrow = emptyPlane(width, plane.height);
  const columns = shares(plane.width, width);
  for (let y = 0; y < plane.height; y++) {
    for (let x = 0; x < width; x++) {
      let sum = 0;
      const { first, weights } = columns[x]!;
      for (let k = 0; k < weights.length; k++) sum += weights[k]! * plane.data[y * plane.width + first + k]!;
      narrow.data[y * width + x] = sum;
    }
  }
  const out = emptyPlane(width, height);
  shares(plane.height, height).forEach(({ first, weights }, y) => {
    for (let k = 0; k < weights.length; k++) {
      const weight = weights[k]!;
      for (let x = 0; x < width; x++) out.data[y * width + x]! += weight * narrow.data[(first + k) * width + x]!;
    }
  });
  return out;
}

/** For each new pixel, the first old pixel it covers and the share of each; shares sum to 1. */
function shares(from: number, to: number): { first: number; weights: number[] }[] {
  const ratio = from / to;
  return Array.from({ length: to }, (_, i) => {
    const start = i * ratio;
    const end = Math.min(from, start + ratio);
    const first = Math.min(from - 1, Math.floor(start));
    const weights: number[] = [];
    for (let k = first; k < end - 1e-9 || k === first; k++) {
      weights.push((Math.min(end, k + 1) - Math.max(start, k)) / (end - start));
    }
    return { first, weights };
  });
}
