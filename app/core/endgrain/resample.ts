import { channelsOf, type EndPixels } from "#app/core/endgrain/pixels.ts";

/** A picture at another size, not larger in either direction: each new pixel is the mean of the area it covers. */
export function shrunkPixels(pixels: EndPixels, width: number, height: number): EndPixels {
  if (width === pixels.width && height === pixels.height) return pixels;
  const channels = channelsOf(pixels);
  const columns = shares(pixels.width, width);
  const sums = new Float32Array(width * height * channels);
  const row = new Float32Array(width * channels);
  const rows = shares(pixels.height, height);
  for (let y = 0; y < height; y++) {
    const { first, weights } = rows[y]!;
    for (let k = 0; k < weights.length; k++) {
      shrinkRow(pixels.data, (first + k) * pixels.width, channels, columns, row);
      for (let i = 0; i < row.length; i++) sums[y * row.length + i]! += weights[k]! * row[i]!;
    }
  }
  return { width, height, data: Uint8Array.from(sums, Math.round) };
}

function shrinkRow(
  data: Uint8Array,
  start: number,
  channels: number,
  columns: { first: number; weights: Float32Array }[],
  row: Float32Array,
): void {
  for (let x = 0; x < columns.length; x++) {
    const { first, weights } = columns[x]!;
    for (let c = 0; c < channels; c++) {
      let sum = 0;
      for (let k = 0; k < weights.length; k++) sum += weights[k]! * data[(start + first + k) * channels + c]!;
      row[x * channels + c] = sum;
    }
  }
}

/** For each new pixel, the first old pixel it covers and the share of each; shares sum to 1. */
function shares(from: number, to: number): { first: number; weights: Float32Array }[] {
  const ratio = from / to;
  return Array.from({ length: to }, (_, i) => {
    const start = i * ratio;
    const end = Math.min(from, start + ratio);
    const first = Math.min(from - 1, Math.floor(start));
    const weights: number[] = [];
    for (let k = first; k < end - 1e-9 || k === first; k++) {
      weights.push((Math.min(end, k + 1) - Math.max(start, k)) / (end - start));
    }
    return { first, weights: Float32Array.from(weights) };
  });
}
