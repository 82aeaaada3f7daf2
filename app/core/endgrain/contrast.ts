import { boxMean } from "#app/core/endgrain/blur.ts";
import { channelsOf, type EndPixels, emptyPlane, type Plane } from "#app/core/endgrain/pixels.ts";

/** Luminance 0..255 of a picture (weights of ITU-R BT.601). */
export function luminance(pixels: EndPixels): Plane {
  const channels = channelsOf(pixels);
  const out = emptyPlane(pixels.width, pixels.height);
  for (let i = 0; i < out.data.length; i++) {
    out.data[i] =
      channels === 1
        ? pixels.data[i]!
        : 0.299 * pixels.data[3 * i]! + 0.587 * pixels.data[3 * i + 1]! + 0.114 * pixels.data[3 * i + 2]!;
  }
  return out;
}

/**
 * Evens out light and contrast: (value − mean) / spread over a window, cut off at ±`limit` spreads so that a
 * chip, a pencil line or a check weighs no more than a ring. `floor` is the spread (grey levels) below which
 * there is nothing to see, only noise of the camera.
 */
export function evenContrast(plane: Plane, windowRadiusPx: number, floor = 2, limit = 2.5): Plane {
  const mean = boxMean(boxMean(plane, windowRadiusPx), windowRadiusPx >> 1);
  const out = emptyPlane(plane.width, plane.height);
  const square = emptyPlane(plane.width, plane.height);
  for (let i = 0; i < out.data.length; i++) {
    const difference = plane.data[i]! - mean.data[i]!;
    out.data[i] = difference;
    square.data[i] = difference * difference;
  }
  const variance = boxMean(boxMean(square, windowRadiusPx), windowRadiusPx >> 1);
  for (let i = 0; i < out.data.length; i++) {
    const value = out.data[i]! / Math.sqrt(variance.data[i]! + floor * floor);
    out.data[i] = Math.max(-limit, Math.min(limit, value));
  }
  return out;
}

