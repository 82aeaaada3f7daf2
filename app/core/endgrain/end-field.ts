import { blurred, halved } from "#app/core/endgrain/blur.ts";
import { fitLevels, type SeenNormal } from "#app/core/endgrain/level-fit.ts";
import { type Explained, shiftLevels } from "#app/core/endgrain/level-shift.ts";
import { fitPith, type PointPx } from "#app/core/endgrain/pith-fit.ts";
import type { Plane } from "#app/core/endgrain/pixels.ts";
import { circularLevels, type RingLevels } from "#app/core/endgrain/ring-levels.ts";
import { cellGrid, type TensorCells, tensorPyramid } from "#app/core/endgrain/tensor-cells.ts";

/** Rings about one pith as one scale of the picture shows them. */
export type ScaleFit = {
  cells: TensorCells;
  pith: PointPx;
  /** Mean of coherence × cos 2(difference), see `agreement`. */
  agreement: number;
  /** The agreement above what noise alone reaches at this scale, less two of its standard deviations. */
  excess: number;
};

/** Everything read from one picture of an end; lengths in pixels of that picture. */
export type EndField = { levels: RingLevels; best: ScaleFit; fits: ScaleFit[]; explained: Explained };

/** Two scales an octave, four octaves: sigmas 1.5 to 17 pixels, rings from about 4 to 60 pixels apart. */
const OCTAVES = 4;
const SIGMAS = [1.5, 2.1] as const;

/**
 * White noise seen at sigma s over N pixels agrees with *some* pith by 2.7 s / √N on average, spread 0.9 (measured on generated
 * noise, 12 pictures × 8 scales). Taking that off lets coarse and fine scales be compared without favouring the coarse.
 */
const NOISE_AGREEMENT = { mean: 2.7, spread: 0.9 };

/** Lengths as parts of the end's thickness. Chosen on the development photographs, where halving or doubling them changes little. */
const PARTS = { cell: 1 / 18, knot: 0.4, stiffness: 0.1, sector: 0.2, shiftCell: 1 / 12, shiftStiffness: 0.15 };

/** Fits pith and rings at each scale; `excess` says which to believe. */
export function fitScales(picture: Plane, mask: Plane | null): ScaleFit[] {
  const grid = cellGrid(picture.width, picture.height, Math.max(6, picture.height * PARTS.cell));
  return tensorPyramid(picture, mask, grid, OCTAVES, SIGMAS).map((cells) => {
    const fit = fitPith(cells, picture);
    const noise = cells.scalePx / Math.sqrt(picture.width * picture.height);
    const excess = fit.agreement - (NOISE_AGREEMENT.mean + 2 * NOISE_AGREEMENT.spread) * noise;
    return { cells, ...fit, excess };
  });
}

/** Bends the rings of the best scale to the directions at that scale and its neighbours, then levels them on the picture itself. */
export function fitEndField(picture: Plane, mask: Plane | null, fits: ScaleFit[], best: ScaleFit): EndField {
  const thickness = picture.height;
  const seen = fits
    .filter((fit) => Math.abs(Math.log2(fit.cells.scalePx / best.cells.scalePx)) < 1.1)
    .flatMap((fit) => seenNormals(fit, picture));
  const circles = circularLevels(picture, best.pith, PARTS.knot * thickness);
  let levels = fitLevels(circles, seen, { stiffnessPx: PARTS.stiffness * thickness, rejectDeg: 20, rounds: 4 });
  let fine = blurred(picture, Math.max(0.7, best.cells.scalePx / 2));
  let fineMask = mask;
  let stepPx = 1;
  while (best.cells.scalePx / 2 > 1.9 * stepPx && stepPx < 4) {
    fine = halved(fine);
    fineMask = fineMask && halved(fineMask);
    stepPx *= 2;
  }
  let explained: Explained | null = null;
  for (let round = 0; round < LEVELLING_ROUNDS; round++) {
    const shifted = shiftLevels(fine, fineMask, levels, {
      stepPx,
      sectorPx: PARTS.sector * thickness,
      sectorSigma: 1.5,
      cellPx: PARTS.shiftCell * thickness,
      stiffnessPx: PARTS.shiftStiffness * thickness,
    });
    explained = shifted.explained;
    levels = shifted.levels;
  }
  return { levels, best, fits, explained: explained! };
}

/** After this many the angles move by less than a twentieth of a degree a round. */
const LEVELLING_ROUNDS = 5;

function seenNormals({ cells }: ScaleFit, size: { width: number; height: number }): SeenNormal[] {
  const seen: SeenNormal[] = [];
  for (let i = 0; i < cells.open.length; i++) {
    const coherence = Math.hypot(cells.cos2[i]!, cells.sin2[i]!);
    if (cells.open[i]! * coherence === 0) continue;
    const normal = Math.atan2(cells.sin2[i]!, cells.cos2[i]!) / 2;
    seen.push({
      x: (((i % cells.columns) + 0.5) * size.width) / cells.columns,
      y: ((Math.floor(i / cells.columns) + 0.5) * size.height) / cells.rows,
      nx: Math.cos(normal),
      ny: Math.sin(normal),
      weight: cells.open[i]! * coherence,
    });
  }
  return seen;
}
