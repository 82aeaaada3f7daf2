import type { EndColours } from "#app/core/endgrain/clear-wood.ts";
import { endColours } from "#app/core/endgrain/contrast.ts";
import type { EndCorners } from "#app/core/endgrain/corner-check.ts";
import { channelsOf, type EndPixels } from "#app/core/endgrain/pixels.ts";
import { shrunkPixels } from "#app/core/endgrain/resample.ts";

/** Pixels of the picture that is worked on. On the development photographs 50 000 to 400 000 read the same to a twentieth of a degree. */
export const WORKING_AREA_PX = 100_000;

/** Width and height to work at: the end's true proportions, no more pixels than the photograph has and than `WORKING_AREA_PX`. */
export function workingSize(corners: EndCorners, aspect: number | null): { width: number; height: number } {
  const [a, b, c, d] = corners;
  const across = (Math.hypot(b.x - a.x, b.y - a.y) + Math.hypot(c.x - d.x, c.y - d.y)) / 2;
  const down = (Math.hypot(d.x - a.x, d.y - a.y) + Math.hypot(c.x - b.x, c.y - b.y)) / 2;
  const proportion = aspect ?? across / down;
  const area = Math.min(WORKING_AREA_PX, across * down);
  const height = Math.max(1, Math.round(Math.sqrt(area / proportion)));
  return { width: Math.max(1, Math.round(height * proportion)), height };
}

/** The end straightened: colours of a rectangle of the given size with the perspective taken out. */
export function straightened(
  pixels: EndPixels,
  corners: EndCorners,
  size: { width: number; height: number },
): EndColours {
  const [a, , c] = corners;
  const whole = a.x === 0 && a.y === 0 && c.x === pixels.width && c.y === pixels.height;
  if (whole && size.width <= pixels.width && size.height <= pixels.height) {
    return endColours(shrunkPixels(pixels, size.width, size.height));
  }
  return endColours(resampled(pixels, corners, size));
}

/** Mapping of the unit square onto four corners, as a…h of (ax+by+c)/(gx+hy+1) (P. Heckbert, Fundamentals of texture mapping, 1989). */
export function squareToCorners([p0, p1, p2, p3]: EndCorners): number[] {
  const sx = p0.x - p1.x + p2.x - p3.x;
  const sy = p0.y - p1.y + p2.y - p3.y;
  const dx1 = p1.x - p2.x;
  const dx2 = p3.x - p2.x;
  const dy1 = p1.y - p2.y;
  const dy2 = p3.y - p2.y;
  const det = dx1 * dy2 - dx2 * dy1;
  const g = (sx * dy2 - dx2 * sy) / det;
  const h = (dx1 * sy - sx * dy1) / det;
  return [
    p1.x - p0.x + g * p1.x,
    p3.x - p0.x + h * p3.x,
    p0.x,
    p1.y - p0.y + g * p1.y,
    p3.y - p0.y + h * p3.y,
    p0.y,
    g,
    h,
  ];
}

function resampled(pixels: EndPixels, corners: EndCorners, size: { width: number; height: number }): EndPixels {
  const channels = channelsOf(pixels);
  const m = squareToCorners(corners);
  const out = new Uint8Array(size.width * size.height * channels);
  // Where several photograph pixels fall on one, take as many looks each way, so that fine texture does not alias into false rings.
  const [a, b, , d] = corners;
  const shrink = Math.max(
    Math.hypot(b.x - a.x, b.y - a.y) / size.width,
    Math.hypot(d.x - a.x, d.y - a.y) / size.height,
  );
  const looks = Math.max(1, Math.min(4, Math.ceil(shrink * 1.2)));
  const sums = new Float64Array(channels);
  for (let y = 0; y < size.height; y++) {
    for (let x = 0; x < size.width; x++) {
      sums.fill(0);
      for (let j = 0; j < looks; j++) {
        const v = (y + (j + 0.5) / looks) / size.height;
        for (let i = 0; i < looks; i++) {
          const u = (x + (i + 0.5) / looks) / size.width;
          const w = m[6]! * u + m[7]! * v + 1;
          addLook(
            pixels,
            channels,
            (m[0]! * u + m[1]! * v + m[2]!) / w - 0.5,
            (m[3]! * u + m[4]! * v + m[5]!) / w - 0.5,
            sums,
          );
        }
      }
      for (let c = 0; c < channels; c++)
        out[(y * size.width + x) * channels + c] = Math.round(sums[c]! / (looks * looks));
    }
  }
  return { ...size, data: out };
}

function addLook({ width, height, data }: EndPixels, channels: number, x: number, y: number, sums: Float64Array): void {
  const left = Math.max(0, Math.min(width - 1, Math.floor(x)));
  const top = Math.max(0, Math.min(height - 1, Math.floor(y)));
  const fx = Math.max(0, Math.min(1, x - left));
  const fy = Math.max(0, Math.min(1, y - top));
  const right = Math.min(width - 1, left + 1);
  const bottom = Math.min(height - 1, top + 1);
  for (let c = 0; c < channels; c++) {
    const upper =
      data[(top * width + left) * channels + c]! * (1 - fx) + data[(top * width + right) * channels + c]! * fx;
    const lower =
      data[(bottom * width + left) * channels + c]! * (1 - fx) + data[(bottom * width + right) * channels + c]! * fx;
    sums[c]! += upper * (1 - fy) + lower * fy;
  }
}

/** Where a place of the straightened end (0..1 across and down) lies in the photograph. */
export function placeInPhoto(corners: EndCorners, u: number, v: number): { x: number; y: number } {
  const m = squareToCorners(corners);
  const w = m[6]! * u + m[7]! * v + 1;
  return { x: (m[0]! * u + m[1]! * v + m[2]!) / w, y: (m[3]! * u + m[4]! * v + m[5]!) / w };
}
