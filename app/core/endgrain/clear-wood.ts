import { boxMean } from "#app/core/endgrain/blur.ts";
import { emptyPlane, type Plane } from "#app/core/endgrain/pixels.ts";

/** An end's picture in three planes of the working size, 0..255; `null` chroma for a grey picture. */
export type EndColours = { light: Plane; redness: Plane | null; yellowness: Plane | null };

/**
 * Where the wood can be seen: 1 clear, 0 covered or cracked; the part of the end that is clear; and whether the usual colour could
 * be wood's (null for a grey picture).
 */
export type ClearWood = { mask: Plane; clearPart: number; woodColoured: boolean | null };

/** Colour differences beyond this many robust spreads from the end's own wood are not wood. */
const COLOUR_SPREADS = 4;
/** Spread of colour (as a part of the brightness) that any wood is allowed, whatever its own: a camera's noise is near half of it. */
const LEAST_COLOUR_SPREAD = 0.01;
/** Less colour than this part of the end's usual one is a coat. */
const PALE = 0.4;
/** Light against the surroundings: this many of the end's own 5th-to-50th percentile distances darker or lighter is a crack, a stroke or a hole. */
const LIGHT_SPREADS = 2.5;
/** …but never less than this part of the surroundings' light. */
const LEAST_LIGHT_STEP = 0.25;

/**
 * Finds paint, wax, crayon, pencil and ink by their colour, against the colours of the end itself, and cracks and pencil by their
 * darkness. Where most of the end is covered the coat itself is the usual colour: the caller sees it as wood without rings.
 */
export function findClearWood(colours: EndColours): ClearWood {
  const { light } = colours;
  const { width, height } = light;
  const around = boxMean(light, Math.max(4, Math.round(height / 8)));
  const relative = light.data.map((value, i) => value / (around.data[i]! + 1));
  const sorted = sampled(relative).sort();
  const dark = 1 - Math.max(LEAST_LIGHT_STEP, LIGHT_SPREADS * (1 - quantile(sorted, 0.05)));
  const bright = 1 + Math.max(LEAST_LIGHT_STEP, LIGHT_SPREADS * (quantile(sorted, 0.95) - 1));
  const strange = colours.redness && colours.yellowness ? colourDistance(colours.redness, colours.yellowness) : null;
  const covered = emptyPlane(width, height);
  for (let i = 0; i < covered.data.length; i++) {
    if (relative[i]! < dark || relative[i]! > bright || (strange && strange[i]! > COLOUR_SPREADS)) covered.data[i] = 1;
  }
  // A margin, because strokes are soft at their edges; specks as small as pores and chips are let through.
  const spread = boxMean(covered, Math.max(1, Math.round(height / 60)));
  let clear = 0;
  const mask = emptyPlane(width, height);
  for (let i = 0; i < mask.data.length; i++) {
    const value = 1 - Math.max(0, Math.min(1, (spread.data[i]! - 0.15) * 5));
    mask.data[i] = value;
    clear += value;
  }
  return {
    mask,
    clearPart: clear / mask.data.length,
    woodColoured: colours.redness && colours.yellowness && woodColoured(colours.redness, colours.yellowness),
  };
}

/** Yellow to red, or grey as weathered wood is; green and blue are not wood. */
function woodColoured(redness: Plane, yellowness: Plane): boolean {
  const red = quantile(sampled(redness.data).sort(), 0.5);
  const yellow = quantile(sampled(yellowness.data).sort(), 0.5);
  return red > -0.02 && yellow > -0.02;
}

/**
 * Distance in robust spreads of each pixel's colour from the end's usual one. Early and latewood differ along one line of
 * colours, so the spread is taken apart along that line (15th to 85th percentile, wide enough for a two-coloured ring) and across it.
 */
function colourDistance(redness: Plane, yellowness: Plane): Float32Array {
  const r = sampled(redness.data);
  const g = sampled(yellowness.data);
  const middle = { r: quantile(r.slice().sort(), 0.5), g: quantile(g.slice().sort(), 0.5) };
  let rr = 0;
  let rg = 0;
  let gg = 0;
  for (let i = 0; i < r.length; i++) {
    // Far colours pull with no more than a constant strength: the line is that of the many, not of a splash of paint.
    const length = Math.hypot(r[i]! - middle.r, g[i]! - middle.g) + 0.02;
    rr += (r[i]! - middle.r) ** 2 / length;
    rg += ((r[i]! - middle.r) * (g[i]! - middle.g)) / length;
    gg += (g[i]! - middle.g) ** 2 / length;
  }
  const turn = Math.atan2(2 * rg, rr - gg) / 2;
  const ux = Math.cos(turn);
  const uy = Math.sin(turn);
  const along = r.map((value, i) => ux * (value - middle.r) + uy * (g[i]! - middle.g)).sort();
  const across = r.map((value, i) => uy * (value - middle.r) - ux * (g[i]! - middle.g)).sort();
  const alongMiddle = (quantile(along, 0.15) + quantile(along, 0.85)) / 2;
  const alongSpread = Math.max(LEAST_COLOUR_SPREAD, (quantile(along, 0.85) - quantile(along, 0.15)) / 2.07);
  const acrossSpread = Math.max(LEAST_COLOUR_SPREAD, (quantile(across, 0.75) - quantile(across, 0.25)) / 1.35);
  const wooden = middle.r > 0.01 && middle.g > 0.03;
  return redness.data.map((value, i) => {
    // Wood goes from yellow to red. Green and blue are never wood, and less than half its usual colour is wax, white paint or graphite.
    const pale = value + yellowness.data[i]! < PALE * (middle.r + middle.g);
    if (wooden && (value < -0.01 || yellowness.data[i]! < -0.01 || pale)) return Number.POSITIVE_INFINITY;
    const dr = value - middle.r;
    const dg = yellowness.data[i]! - middle.g;
    return Math.hypot((ux * dr + uy * dg - alongMiddle) / alongSpread, (uy * dr - ux * dg) / acrossSpread);
  });
}

function sampled(values: Float32Array): Float32Array {
  return Float32Array.from({ length: Math.ceil(values.length / 7) }, (_, i) => values[i * 7]!);
}

function quantile(sorted: Float32Array, part: number): number {
  return sorted[Math.min(sorted.length - 1, Math.floor(part * sorted.length))]!;
}
