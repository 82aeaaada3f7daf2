import { endColours } from "#app/core/endgrain/contrast.ts";
import { type EndCorners, wholePicture } from "#app/core/endgrain/corner-check.ts";
import { convexHull, fourSided, straightSides, turn } from "#app/core/endgrain/outline.ts";
import type { PointPx } from "#app/core/endgrain/pith-fit.ts";
import type { EndPixels, Plane } from "#app/core/endgrain/pixels.ts";
import { shrunkPixels } from "#app/core/endgrain/resample.ts";

/**
 * Corners proposed for the end in a photograph. `found` "end": an end with something else round it; "whole": the picture is
 * filled; "unclear": something else is there, but no clear four-sided end, and the corners are the whole picture's.
 */
export type ProposedCorners = { corners: EndCorners; found: "end" | "whole" | "unclear" };

/** Longest side the search works at: a gap between boards is still two pixels wide, and a page waits no tenth of a second. */
const SEARCH_PX = 400;
/** A region that takes up this much of the picture is the picture. */
const WHOLE_PART = 0.9;
/** With this much of the picture's edge in other colours the picture is not filled, found or not. */
const FRAMED_PART = 0.9;

/**
 * Proposes the corners of the end in the middle of a photograph: the region that has the middle's colours and is not broken by
 * a dark gap, its outline made four-sided, its sides straightened; every side inside the picture must show a gap or another
 * colour beyond it, or else what was found is a stain or a colour of heartwood and not a board.
 */
export function findCorners(pixels: EndPixels): ProposedCorners {
  const whole = wholePicture(pixels);
  const scale = Math.min(1, SEARCH_PX / Math.max(pixels.width, pixels.height));
  const width = Math.max(1, Math.round(pixels.width * scale));
  const height = Math.max(1, Math.round(pixels.height * scale));
  if (Math.min(width, height) < 24) return { corners: whole, found: "whole" };
  const colours = endColours(shrunkPixels(pixels, width, height));
  const planes = [colours.light, colours.redness, colours.yellowness].flatMap((plane) => plane ?? []);
  const region = regionOfMiddle(planes);
  if (!region || region.part > WHOLE_PART) return { corners: whole, found: "whole" };
  const rough = fourSided(convexHull(region.outline));
  const shape = rough && straightSides(rough, region.outline, Math.max(4, 0.02 * (width + height)));
  const unsure = { corners: whole, found: region.framed > FRAMED_PART ? ("unclear" as const) : ("whole" as const) };
  if (!shape || shape.roughness > 2.5) return unsure;
  const area =
    Math.abs(
      turn(shape.corners[0]!, shape.corners[1]!, shape.corners[2]!) +
        turn(shape.corners[0]!, shape.corners[2]!, shape.corners[3]!),
    ) / 2;
  const filled = (region.part * width * height) / area;
  if (filled < 0.85 || area < 0.02 * width * height) return unsure;
  if (!sidesShow(planes, shape.corners)) return unsure;
  return { corners: inOrder(shape.corners, width / pixels.width, height / pixels.height, pixels), found: "end" };
}

/**
 * `outline`: its outermost pixels' middles; `part`: of the picture; `framed`: part of the picture's edge that is not in it.
 */
type Region = { outline: PointPx[]; part: number; framed: number };

function regionOfMiddle(planes: readonly Plane[]): Region | null {
  const { width, height } = planes[0]!;
  const accepted = new Uint8Array(width * height).fill(1);
  planes.forEach((plane, k) => {
    const [low, high] = rangeOfMiddle(plane);
    const slack = k === 0 ? Math.max(12, 0.35 * (high - low)) : Math.max(0.012, 0.5 * (high - low));
    for (let i = 0; i < accepted.length; i++)
      if (plane.data[i]! < low - slack || plane.data[i]! > high + slack) accepted[i] = 0;
  });
  const mask = floodFromMiddle(majority(accepted, width, height), width, height);
  if (!mask) return null;
  // Whatever the outside cannot reach is inside: knots, holes, writing.
  const outside = floodOutside(mask, width, height);
  const strange = strangeTo(planes);
  const outline: PointPx[] = [];
  let count = 0;
  let frame = 0;
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const i = y * width + x;
      if (outside[i]) {
        if ((x === 0 || y === 0 || x === width - 1 || y === height - 1) && strange(i)) frame++;
        continue;
      }
      count++;
      const edge =
        x === 0 ||
        y === 0 ||
        x === width - 1 ||
        y === height - 1 ||
        outside[i - 1] ||
        outside[i + 1] ||
        outside[i - width] ||
        outside[i + width];
      if (edge) outline.push({ x: x + 0.5, y: y + 0.5 });
    }
  }
  return { outline, part: count / (width * height), framed: frame / (2 * (width + height) - 4) };
}

/** Whether a pixel is of another material than the middle: another colour, further off than latewood from earlywood, or in the dark. */
function strangeTo(planes: readonly Plane[]): (i: number) => boolean {
  const middles = planes.map((plane) => valuesOfMiddle(plane)).map((values) => values[values.length >> 1]!);
  return (i) => {
    const colour = planes.slice(1).reduce((sum, plane, k) => sum + Math.abs(plane.data[i]! - middles[k + 1]!), 0);
    return colour > 0.09 || planes[0]!.data[i]! < 0.3 * middles[0]!;
  };
}

/** The 2nd and 98th percentile of a plane in the middle of the picture. */
function rangeOfMiddle(plane: Plane): [number, number] {
  const values = valuesOfMiddle(plane);
  return [values[Math.floor(0.02 * values.length)]!, values[Math.floor(0.98 * values.length)]!];
}

function valuesOfMiddle({ width, height, data }: Plane): number[] {
  const values: number[] = [];
  const reach = 0.06 * Math.min(width, height);
  for (let y = Math.floor(height / 2 - reach); y < height / 2 + reach; y++) {
    for (let x = Math.floor(width / 2 - reach); x < width / 2 + reach; x++) values.push(data[y * width + x]!);
  }
  return values.sort((a, b) => a - b);
}

function majority(accepted: Uint8Array, width: number, height: number): Uint8Array {
  const out = new Uint8Array(accepted.length);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      let sum = 0;
      let count = 0;
      for (let dy = -1; dy <= 1; dy++) {
        for (let dx = -1; dx <= 1; dx++) {
          const [px, py] = [x + dx, y + dy];
          if (px < 0 || py < 0 || px >= width || py >= height) continue;
          sum += accepted[py * width + px]!;
          count++;
        }
      }
      out[y * width + x] = sum * 2 > count ? 1 : 0;
    }
  }
  return out;
}

function floodFromMiddle(open: Uint8Array, width: number, height: number): Uint8Array | null {
  const middle = Math.floor(height / 2) * width + Math.floor(width / 2);
  const reach = Math.floor(Math.min(width, height) / 20);
  for (let away = 0; away <= reach; away++) {
    for (const start of [middle, middle + away, middle - away, middle + away * width, middle - away * width]) {
      if (!open[start]) continue;
      const mask = flood(open, [start], width, height);
      if (mask.reduce((sum, value) => sum + value, 0) > 0.01 * width * height) return mask;
    }
  }
  return null;
}

function floodOutside(mask: Uint8Array, width: number, height: number): Uint8Array {
  const border: number[] = [];
  for (let x = 0; x < width; x++) border.push(x, (height - 1) * width + x);
  for (let y = 0; y < height; y++) border.push(y * width, y * width + width - 1);
  const free = mask.map((value) => 1 - value);
  return flood(
    free,
    border.filter((i) => free[i]),
    width,
    height,
  );
}

function flood(open: Uint8Array, starts: readonly number[], width: number, height: number): Uint8Array {
  const reached = new Uint8Array(open.length);
  const stack = [...starts];
  for (const start of starts) reached[start] = 1;
  while (stack.length > 0) {
    const i = stack.pop()!;
    const x = i % width;
    const y = (i - x) / width;
    for (const j of [
      x > 0 ? i - 1 : -1,
      x < width - 1 ? i + 1 : -1,
      y > 0 ? i - width : -1,
      y < height - 1 ? i + width : -1,
    ]) {
      if (j < 0 || reached[j] || !open[j]) continue;
      reached[j] = 1;
      stack.push(j);
    }
  }
  return reached;
}

/** Whether each side that lies inside the picture has, along most of it, a dark gap or another colour just beyond. */
function sidesShow(planes: readonly Plane[], corners: readonly PointPx[]): boolean {
  const { width, height } = planes[0]!;
  const at = (plane: Plane, x: number, y: number) =>
    plane.data[
      Math.max(0, Math.min(height - 1, Math.floor(y))) * width + Math.max(0, Math.min(width - 1, Math.floor(x)))
    ]!;
  let inner = 0;
  for (let i = 0; i < 4; i++) {
    const a = corners[i]!;
    const b = corners[(i + 1) % 4]!;
    const length = Math.hypot(b.x - a.x, b.y - a.y);
    const nx = (b.y - a.y) / length;
    const ny = -(b.x - a.x) / length;
    let shown = 0;
    let looked = 0;
    for (let k = 1; k < 24; k++) {
      const x = a.x + ((b.x - a.x) * k) / 24;
      const y = a.y + ((b.y - a.y) * k) / 24;
      if (x + 6 * nx < 0 || y + 6 * ny < 0 || x + 6 * nx > width || y + 6 * ny > height) continue;
      looked++;
      const inside = [2, 4, 6, 8].map((d) => at(planes[0]!, x - d * nx, y - d * ny));
      const beyond = [1, 2, 3, 4, 5].map((d) => at(planes[0]!, x + d * nx, y + d * ny));
      const gap = Math.min(...beyond) < 0.6 * Math.min(...inside);
      const colour = planes.slice(1).reduce((sum, plane) => {
        const mean = (side: 1 | -1) =>
          [3, 4, 5, 6].reduce((total, d) => total + at(plane, x + side * d * nx, y + side * d * ny), 0) / 4;
        return sum + Math.abs(mean(1) - mean(-1));
      }, 0);
      if (gap || colour > 0.05) shown++;
    }
    if (looked < 6) continue;
    inner++;
    if (shown < 0.7 * looked) return false;
  }
  return inner >= 2;
}

/** Scales corners back to the photograph and begins with the one from which the longer side runs most to the right. */
function inOrder(
  corners: readonly PointPx[],
  scaleX: number,
  scaleY: number,
  picture: { width: number; height: number },
): EndCorners {
  const full = corners.map((p) => ({
    x: Math.max(0, Math.min(picture.width, p.x / scaleX)),
    y: Math.max(0, Math.min(picture.height, p.y / scaleY)),
  }));
  const side = (i: number) => Math.hypot(full[(i + 1) % 4]!.x - full[i % 4]!.x, full[(i + 1) % 4]!.y - full[i % 4]!.y);
  const longFirst = side(0) + side(2) >= side(1) + side(3) ? [0, 2] : [1, 3];
  const runsRight = (i: number) => full[(i + 1) % 4]!.x - full[i]!.x + 0.3 * (full[(i + 1) % 4]!.y - full[i]!.y);
  const first = runsRight(longFirst[0]!) >= runsRight(longFirst[1]!) ? longFirst[0]! : longFirst[1]!;
  return [0, 1, 2, 3].map((k) => full[(first + k) % 4]!) as EndCorners;
}
