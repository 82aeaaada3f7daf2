import { boxMean } from "#app/core/endgrain/blur.ts";
import type { EndColours } from "#app/core/endgrain/clear-wood.ts";
import { channelsOf, type EndPixels, emptyPlane, type Plane } from "#app/core/endgrain/pixels.ts";

/** Luminance 0..255 of a picture. */
export function luminance(pixels: EndPixels): Plane {
  return endColours(pixels).light;
}

/** The three planes that tell wood from what covers it: luminance (ITU-R BT.601 weights), and how red and how yellow for its brightness. */
export function endColours(pixels: EndPixels): EndColours {
  const channels = channelsOf(pixels);
  const light = emptyPlane(pixels.width, pixels.height);
  if (channels === 1) {
    light.data.set(pixels.data);
    return { light, redness: null, yellowness: null };
  }
  const redness = emptyPlane(pixels.width, pixels.height);
  const yellowness = emptyPlane(pixels.width, pixels.height);
  for (let i = 0; i < light.data.length; i++) {
    const red = pixels.data[3 * i]!;
    const green = pixels.data[3 * i + 1]!;
    const blue = pixels.data[3 * i + 2]!;
    light.data[i] = 0.299 * red + 0.587 * green + 0.114 * blue;
    const brightness = red + green + blue + 24;
    redness.data[i] = (red - green) / brightness;
    yellowness.data[i] = (red + green - 2 * blue) / brightness / 2;
  }
  return { light, redness, yellowness };
}

/**
 * Evens out light and contrast: (value − mean) / spread over a window of clear wood, cut off at ±`limit` spreads so that a
 * chip or a speck weighs no more than a ring. `floor` is the spread (grey levels) below which there is nothing to see, only noise
 * of the camera. Covered places read 0.
 */
export function evenContrast(plane: Plane, mask: Plane | null, windowRadiusPx: number, floor = 2, limit = 2.5): Plane {
  const wide = (values: Plane) => boxMean(boxMean(values, windowRadiusPx), windowRadiusPx >> 1);
  const open = mask && wide(mask);
  const average = (values: Plane) => {
    if (!mask || !open) return wide(values);
    for (let i = 0; i < values.data.length; i++) values.data[i]! *= mask.data[i]!;
    const mean = wide(values);
    for (let i = 0; i < mean.data.length; i++) mean.data[i]! /= Math.max(1e-3, open.data[i]!);
    return mean;
  };
  const mean = average({ ...plane, data: plane.data.slice() });
  const out = emptyPlane(plane.width, plane.height);
  const square = emptyPlane(plane.width, plane.height);
  for (let i = 0; i < out.data.length; i++) {
    const difference = plane.data[i]! - mean.data[i]!;
    out.data[i] = difference;
    square.data[i] = difference * difference;
  }
  const variance = average(square);
  for (let i = 0; i < out.data.length; i++) {
    const value = out.data[i]! / Math.sqrt(variance.data[i]! + floor * floor);
    out.data[i] = Math.max(-limit, Math.min(limit, value)) * (mask ? mask.data[i]! : 1);
  }
  return out;
}

/** Spread of light within a picture: standard deviation, grey levels. */
export function contrastOf(plane: Plane): number {
  let sum = 0;
  let square = 0;
  for (const value of plane.data) {
    sum += value;
    square += value * value;
  }
  const mean = sum / plane.data.length;
  return Math.sqrt(Math.max(0, square / plane.data.length - mean * mean));
}
