import { halved, slopes } from "#app/core/endgrain/blur.ts";
import type { Plane } from "#app/core/endgrain/pixels.ts";

/**
 * The end cut into equal cells, with the structure tensor of each at one scale.
 * `cos2` and `sin2` are the mean double-angle vector of the normals to the lines seen (length = coherence 0..1:
 * 1 all one way, 0 no direction); `open` is the part of the cell that is clear wood
 * and not too near the edge.
 */
export type TensorCells = {
  columns: number;
  rows: number;
  cellPx: number;
  scalePx: number;
  cos2: Float32Array;
  sin2: Float32Array;
  open: Float32Array;
};

/** A grid of about square cells over a picture: how many, and their size in pixels (not a whole number). */
export function cellGrid(width: number, height: number, wantedCellPx: number): { columns: number; rows: number } {
  return {
    columns: Math.max(9, Math.round(width / wantedCellPx)),
    rows: Math.max(3, Math.round(height / wantedCellPx)),
  };
}

/**
 * Structure tensors of an evened-out picture, per cell, at each octave of scale from fine to coarse.
 * Each pixel's tensor is divided by its gradient's length, so that a strong edge counts in proportion to its contrast and
 * not to the contrast's square. The scale is the sigma, in pixels of the picture, of the Gaussian under the slope.
 * `mask` (0..1 a pixel) takes pixels out.
 */
export function tensorPyramid(
  picture: Plane,
  mask: Plane | null,
  grid: { columns: number; rows: number },
  octaves: number,
  sigmasPx: readonly number[],
): TensorCells[] {
  const cells: TensorCells[] = [];
  let level = picture;
  let levelMask = mask;
  for (let octave = 0; octave < octaves && Math.min(level.width, level.height) >= 12; octave++) {
    for (const sigmaPx of sigmasPx) {
      cells.push(tensorCells(level, levelMask, grid, sigmaPx, picture.width / level.width));
    }
    level = halved(level);
    levelMask = levelMask && halved(levelMask);
  }
  return cells;
}

/** Width, in sigmas, of the strip along the edge that is left out. */
const EDGE_SIGMAS = 1;

function tensorCells(
  level: Plane,
  mask: Plane | null,
  { columns, rows }: { columns: number; rows: number },
  sigmaPx: number,
  factor: number,
): TensorCells {
  const { dx, dy } = slopes(level, sigmaPx);
  const count = columns * rows;
  const cos2 = new Float32Array(count);
  const sin2 = new Float32Array(count);
  const strength = new Float32Array(count);
  const open = new Float32Array(count);
  const pixelsACell = (level.width * level.height) / count;
  // Nearer to the edge the mirrored picture turns the slopes along the edge.
  const margin = Math.min(Math.round(EDGE_SIGMAS * sigmaPx), level.height >> 2, level.width >> 2);
  for (let y = margin; y < level.height - margin; y++) {
    const row = Math.floor(((y + 0.5) * rows) / level.height) * columns;
    for (let x = margin; x < level.width - margin; x++) {
      const at = y * level.width + x;
      const cell = row + Math.floor(((x + 0.5) * columns) / level.width);
      const gx = dx.data[at]!;
      const gy = dy.data[at]!;
      const length = Math.sqrt(gx * gx + gy * gy) + 1e-9;
      const clear = mask ? mask.data[at]! : 1;
      cos2[cell]! += (clear * (gx * gx - gy * gy)) / length;
      sin2[cell]! += (clear * 2 * gx * gy) / length;
      strength[cell]! += clear * length;
      open[cell]! += clear / pixelsACell;
    }
  }
  for (let i = 0; i < count; i++) {
    const sum = strength[i]! || 1;
    cos2[i]! /= sum;
    sin2[i]! /= sum;
  }
  return { columns, rows, cellPx: (level.width * factor) / columns, scalePx: sigmaPx * factor, cos2, sin2, open };
}
