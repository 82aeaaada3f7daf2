import type { PointMm, RingField } from "./ring-types.ts";
import { fieldFromPith } from "./stations.ts";

/** A line drawn by hand along one growth ring. */
export type Stroke = readonly PointMm[];

export interface StrokeReading {
  field: RingField;
  /** How far the strokes stray from the fitted rings, root mean square. */
  strayMm: number;
  /** 0 to 1: how many strokes, how well they agree, how much of the width they speak for. */
  confidence: number;
}

export type StrokesResult = { ok: true; reading: StrokeReading } | { ok: false; why: string };

const stepMm = 1.5;
const leastStrokeMm = 4;
/** A hand on a screen strays about this much from a ring. Our own estimate. */
const handMm = 0.35;
/** Beyond this many widths the pith's distance means nothing: the rings are straight. */
const straightBeyond = 25;

/**
 * Fits concentric rings to strokes drawn along them: one centre, a radius for each stroke, by least squares on the distances (Gauss–Newton from where
 * the strokes' normals meet). Strokes that are as good as straight and parallel give parallel rings and no pith.
 *
 * @param strokes in millimetres on the end, its top left corner the origin.
 * @param size of the end in millimetres.
 */
export function readStrokes(strokes: readonly Stroke[], size: { widthMm: number; thicknessMm: number }): StrokesResult {
  const lines = strokes.map(evenly).filter((line) => line.length >= 3);
  if (lines.length === 0) return { ok: false, why: "Draw along a ring, from one edge of the board towards the other." };
  const centre = refine(lines, whereNormalsMeet(lines), size);
  const direction = meanDirectionDeg(lines);
  const middle = { xMm: size.widthMm / 2, yMm: size.thicknessMm / 2 };
  const straight = distance(centre, middle) > straightBeyond * size.widthMm;
  const pith = straight ? farAlongNormal(middle, direction, straightBeyond * size.widthMm) : centre;
  const field = fieldFromPith(size, pith, null);
  const strayMm = stray(lines, pith);
  const agreement = 1 / (1 + (strayMm / (3 * handMm)) ** 2);
  const several = lines.length === 1 ? 0.6 : lines.length === 2 ? 0.9 : 1;
  const stations = field.stations.map((station) => ({
    ...station,
    confidence: agreement * several * nearness(lines, station.position * size.widthMm, size.widthMm),
  }));
  const confidence = stations.reduce((sum, station) => sum + station.confidence, 0) / stations.length;
  return { ok: true, reading: { field: { ...field, stations, pith: straight ? null : pith }, strayMm, confidence } };
}

/** Points at even steps along a stroke, so that a slow hand does not count for more; nothing for a dab. */
function evenly(stroke: Stroke): PointMm[] {
  const points: PointMm[] = [];
  let carried = 0;
  let length = 0;
  for (let i = 1; i < stroke.length; i++) {
    const [a, b] = [stroke[i - 1] as PointMm, stroke[i] as PointMm];
    const part = distance(a, b);
    for (let along = carried; along <= part && part > 0; along += stepMm)
      points.push({ xMm: a.xMm + ((b.xMm - a.xMm) * along) / part, yMm: a.yMm + ((b.yMm - a.yMm) * along) / part });
    carried = part > 0 ? (stepMm - ((part - carried) % stepMm)) % stepMm : carried;
    length += part;
  }
  return length < leastStrokeMm ? [] : points;
}

/** The point nearest to the normals of all pieces of all strokes. Pieces span several steps: neighbours alone would be mostly noise. */
function whereNormalsMeet(lines: PointMm[][]): PointMm {
  let [xx, xy, yy, bx, by] = [0, 0, 0, 0, 0];
  for (const line of lines) {
    const reach = Math.max(1, Math.floor(line.length / 3));
    for (let i = 0; i + reach < line.length; i++) {
      const [a, b] = [line[i] as PointMm, line[i + reach] as PointMm];
      const span = distance(a, b);
      if (span === 0) continue;
      const [tx, ty] = [(b.xMm - a.xMm) / span, (b.yMm - a.yMm) / span];
      const along = (tx * (a.xMm + b.xMm) + ty * (a.yMm + b.yMm)) / 2;
      xx += tx * tx;
      xy += tx * ty;
      yy += ty * ty;
      bx += tx * along;
      by += ty * along;
    }
  }
  // A little weight toward nowhere keeps parallel strokes from dividing by nothing: their centre lands very far off.
  const ridge = 1e-9 * (xx + yy);
  const determinant = (xx + ridge) * (yy + ridge) - xy * xy;
  return { xMm: (bx * (yy + ridge) - by * xy) / determinant, yMm: (by * (xx + ridge) - bx * xy) / determinant };
}

/** Gauss–Newton on the spread of each stroke's distances from the centre; steps are halved until they help. */
function refine(lines: PointMm[][], start: PointMm, size: { widthMm: number }): PointMm {
  let centre = start;
  let best = stray(lines, centre);
  for (let round = 0; round < 60; round++) {
    let [xx, xy, yy, gx, gy] = [0, 0, 0, 0, 0];
    for (const line of lines) {
      const rays = line.map((p) => {
        const r = Math.max(1e-6, distance(p, centre));
        return { r, ux: (centre.xMm - p.xMm) / r, uy: (centre.yMm - p.yMm) / r };
      });
      const mean = (key: "r" | "ux" | "uy") => rays.reduce((sum, ray) => sum + ray[key], 0) / rays.length;
      const [r, ux, uy] = [mean("r"), mean("ux"), mean("uy")];
      for (const ray of rays) {
        const [jx, jy, residual] = [ray.ux - ux, ray.uy - uy, ray.r - r];
        xx += jx * jx;
        xy += jx * jy;
        yy += jy * jy;
        gx += jx * residual;
        gy += jy * residual;
      }
    }
    const damping = 1e-7 * (xx + yy) + 1e-15;
    const determinant = (xx + damping) * (yy + damping) - xy * xy;
    if (!(determinant > 0)) break;
    let step = {
      xMm: -(gx * (yy + damping) - gy * xy) / determinant,
      yMm: -(gy * (xx + damping) - gx * xy) / determinant,
    };
    let helped = false;
    for (let halving = 0; halving < 12; halving++) {
      const next = { xMm: centre.xMm + step.xMm, yMm: centre.yMm + step.yMm };
      const value = stray(lines, next);
      if (value < best) {
        helped = best - value > 1e-7;
        [centre, best] = [next, value];
        break;
      }
      step = { xMm: step.xMm / 2, yMm: step.yMm / 2 };
    }
    if (!helped || Math.abs(centre.xMm) > 1e3 * size.widthMm) break;
  }
  return centre;
}

/** Root mean square of how far points stray from their stroke's own circle round the centre. */
function stray(lines: PointMm[][], centre: PointMm): number {
  let sum = 0;
  let count = 0;
  for (const line of lines) {
    const radii = line.map((point) => distance(point, centre));
    const mean = radii.reduce((a, b) => a + b, 0) / radii.length;
    for (const radius of radii) sum += (radius - mean) ** 2;
    count += radii.length;
  }
  return Math.sqrt(sum / count);
}

/** Mean direction of the strokes as lines without a sense, weighted by length; positive falls to the right. */
function meanDirectionDeg(lines: PointMm[][]): number {
  let [cosine, sine] = [0, 0];
  for (const line of lines) {
    const [a, b] = [line[0] as PointMm, line.at(-1) as PointMm];
    const angle = 2 * Math.atan2(b.yMm - a.yMm, b.xMm - a.xMm);
    const length = distance(a, b);
    cosine += length * Math.cos(angle);
    sine += length * Math.sin(angle);
  }
  return (Math.atan2(sine, cosine) * 90) / Math.PI;
}

function farAlongNormal(from: PointMm, directionDeg: number, awayMm: number): PointMm {
  const angle = (directionDeg * Math.PI) / 180;
  return { xMm: from.xMm - 40 * awayMm * Math.sin(angle), yMm: from.yMm + 40 * awayMm * Math.cos(angle) };
}

/** How much the strokes say about a place across the width: all where one passes, less further off. */
function nearness(lines: PointMm[][], xMm: number, widthMm: number): number {
  const gap = Math.min(...lines.flat().map((point) => Math.abs(point.xMm - xMm)));
  return 1 / (1 + (gap / (0.4 * widthMm)) ** 2);
}

function distance(a: PointMm, b: PointMm): number {
  return Math.hypot(a.xMm - b.xMm, a.yMm - b.yMm);
}
