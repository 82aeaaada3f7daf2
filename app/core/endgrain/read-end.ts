import { chooseField } from "#app/core/endgrain/choose-field.ts";
import { type ClearWood, findClearWood } from "#app/core/endgrain/clear-wood.ts";
import {
  type EndMeasures,
  NO_RINGS_BELOW,
  overallConfidence,
  SURE_FROM,
  stationConfidence,
  type WoodStructure,
} from "#app/core/endgrain/confidence.ts";
import { contrastOf, evenContrast } from "#app/core/endgrain/contrast.ts";
import {
  type CornerProblem,
  cornerProblem,
  type EndCorners,
  LEAST_SIDE_PX,
  wholePicture,
} from "#app/core/endgrain/corner-check.ts";
import { agreementWithLevels } from "#app/core/endgrain/level-fit.ts";
import type { EndPixels, Plane } from "#app/core/endgrain/pixels.ts";
import { ringPitch } from "#app/core/endgrain/ring-count.ts";
import { findSawMarks, withoutSawMarks } from "#app/core/endgrain/saw-marks.ts";
import { readStations } from "#app/core/endgrain/stations.ts";
import { straightened, workingSize } from "#app/core/endgrain/straighten.ts";
import { traceRings } from "#app/core/endgrain/trace-rings.ts";
import { ringProfile, unroll } from "#app/core/endgrain/unroll.ts";
import type { ClassLimits, ClassShares, PointMm, RingClass, RingStation } from "#app/core/rings/ring-types.ts";

/** Changes whenever the same photograph could read differently. */
export const READING_METHOD = "rings-1";

export type ReadEndOptions = {
  /** Corners of the end in the photograph; without them the whole picture is the end. */
  corners?: EndCorners;
  /** The board's size; without it lengths are in pixels of the straightened photograph and rings per inch are not known. */
  widthMm?: number;
  thicknessMm?: number;
  /** Parts of the width to read, 9 or more. */
  stationCount?: number;
  /** 30 and 60 degrees (common practice) unless the shop set others. */
  limits?: ClassLimits;
  /** What the species is known to be; without it the picture's finest texture decides whether the wood counts as porous. */
  structure?: WoodStructure;
};

/** Why an end could not be read at all. */
export type EndProblem = CornerProblem | "too-small" | "nothing-to-see" | "no-rings" | "size-not-possible";

export type EndReading = {
  ok: true;
  corners: EndCorners;
  widthMm: number;
  thicknessMm: number;
  stations: RingStation[];
  /** Mean ring angle to the wide face over the area, degrees. */
  angleDeg: number;
  shares: ClassShares;
  class: RingClass;
  /** From the end's top left corner; null when the rings are as good as straight. */
  pith: PointMm | null;
  ringsPerInch: number | null;
  confidence: number;
  sure: boolean;
  /** What speaks against the reading, in words for the page; empty when nothing does. */
  doubts: string[];
  /** Rings as the method sees them, to draw over the photograph: lines of places in its pixels. */
  ringLines: { x: number; y: number }[][];
  /** The figures the confidence was made of. */
  measures: EndMeasures;
  methodVersion: string;
};

export type EndRefusal = { ok: false; problem: EndProblem; message: string };

const MESSAGES: Record<EndProblem, string> = {
  "corners-not-numbers": "Four corners are needed, each an x and a y in pixels.",
  "corners-outside": "A corner lies outside the picture.",
  "corners-crossed": "The corners cross: give them in turn, top left, top right, bottom right, bottom left.",
  "corners-too-close": `The corners are too close together: each side of the end must be at least ${LEAST_SIDE_PX} pixels long.`,
  "too-small": `The picture is too small to read: the end must be at least ${LEAST_SIDE_PX} pixels thick.`,
  "nothing-to-see": "There is nothing to see in the picture: it is all one shade.",
  "no-rings": "No rings can be told in this picture. Is it the end of one board, sharp and uncovered?",
  "size-not-possible":
    "Width and thickness must both be given, in millimetres, more than 0 and less than 3000, the width no more than 100 times the thickness.",
};

/** Spread of light (grey levels, 0..255) below which a picture is all one shade: a black or white frame, a wall out of focus. */
const LEAST_CONTRAST = 1.2;
/** A pith further off than this many widths bends the rings by less than can be told from straight lines. */
const FURTHEST_PITH_WIDTHS = 6;

/**
 * Reads the growth rings of a board's end from raw pixels: straightens the end, masks what is not clear wood, takes straight saw
 * marks out, fits rings about a pith at eight scales, chooses between the directions they show, and levels the rings on the picture.
 * Angles in degrees to the wide face (the picture's x axis), lengths in millimetres (pixels without a size). Same input, same answer.
 * @throws RangeError when the data do not fit the picture's size; every other trouble is a returned refusal.
 */
export function readEnd(pixels: EndPixels, options: ReadEndOptions = {}): EndReading | EndRefusal {
  const corners = options.corners ?? wholePicture(pixels);
  const problem = inputProblem(pixels, corners, options);
  if (problem) return refusal(problem);
  const aspect = options.widthMm && options.thicknessMm ? options.widthMm / options.thicknessMm : null;
  const colours = straightened(pixels, corners, workingSize(corners, aspect));
  if (contrastOf(colours.light) < LEAST_CONTRAST) return refusal("nothing-to-see");
  const clear = findClearWood(colours);
  const mask = clear.clearPart < 0.995 ? clear.mask : null;
  const window = Math.round(0.15 * Math.min(colours.light.width, colours.light.height));
  const even = evenContrast(colours.light, mask, window);
  const saw = findSawMarks(even);
  return readPicture(saw ? withoutSawMarks(even, saw) : even, mask, corners, options, {
    clear,
    sawShare: saw?.share ?? 0,
  });
}

function refusal(problem: EndProblem): EndRefusal {
  return { ok: false, problem, message: MESSAGES[problem] };
}

function inputProblem(pixels: EndPixels, corners: EndCorners, options: ReadEndOptions): EndProblem | null {
  if (Math.min(pixels.width, pixels.height) < LEAST_SIDE_PX) return "too-small";
  const { widthMm, thicknessMm } = options;
  if (widthMm !== undefined || thicknessMm !== undefined) {
    const possible = (mm: number | undefined) => mm !== undefined && mm > 0 && mm < 3000;
    if (!possible(widthMm) || !possible(thicknessMm) || widthMm! > 100 * thicknessMm! || thicknessMm! > 20 * widthMm!)
      return "size-not-possible";
  }
  return cornerProblem(corners, pixels);
}

function readPicture(
  picture: Plane,
  mask: Plane | null,
  corners: EndCorners,
  options: ReadEndOptions,
  seen: { clear: ClearWood; sawShare: number },
): EndReading | EndRefusal {
  const found = chooseField(picture, mask);
  if (!found) return refusal("too-small");
  const { chosen, rival } = found;
  const { levels } = chosen;
  const limits = options.limits ?? { flatBelowDeg: 30, quarteredAboveDeg: 60 };
  const { stations, shares, angleDeg } = readStations(levels, chosen.explained, options.stationCount ?? 9, limits);
  const photo = endSizePx(corners);
  const widthMm = options.widthMm ?? photo.width;
  const thicknessMm = options.thicknessMm ?? photo.height;
  const pithPx = chosen.best.pith;
  const pithWidths = Math.hypot(pithPx.x - picture.width / 2, pithPx.y - picture.height / 2) / picture.width;
  const unrolled = unroll(levels, picture, 1, picture.height / 5);
  const pitchPx = ringPitch(
    unrolled,
    ringProfile(picture, mask, unrolled, Math.max(1, chosen.best.cells.scalePx / 3), 1.5),
  );
  const ranked = Object.entries(shares).sort((a, b) => b[1] - a[1]) as [RingClass, number][];
  const measures: EndMeasures = {
    evidence: chosen.evidence,
    excess: chosen.best.excess,
    rivalEvidence: rival?.evidence ?? 0,
    fineAgreement: agreementWithLevels(chosen.fits[0]!.cells, levels),
    clearPart: seen.clear.clearPart,
    sawShare: seen.sawShare,
    pithWidths,
    woodColoured: seen.clear.woodColoured,
  };
  if (measures.evidence < NO_RINGS_BELOW) return refusal("no-rings");
  const { confidence, doubts } = overallConfidence(measures, options.structure);
  return {
    ok: true,
    corners,
    widthMm,
    thicknessMm,
    stations: stations.map(({ position, angleDeg, signedDeg, explained, spreadDeg }) => ({
      explained,
      spreadDeg,
      position,
      angleDeg,
      signedDeg,
      confidence: stationConfidence(confidence, explained, spreadDeg),
    })),
    angleDeg,
    shares,
    class: ranked[0]![0],
    pith:
      pithWidths > FURTHEST_PITH_WIDTHS
        ? null
        : { xMm: (pithPx.x * widthMm) / picture.width, yMm: (pithPx.y * thicknessMm) / picture.height },
    ringsPerInch: options.widthMm && pitchPx ? 25.4 / ((pitchPx * widthMm) / picture.width) : null,
    confidence,
    sure: confidence >= SURE_FROM,
    doubts,
    ringLines: traceRings(levels, corners),
    measures,
    methodVersion: READING_METHOD,
  };
}

function endSizePx([a, b, c, d]: EndCorners): { width: number; height: number } {
  return {
    width: (Math.hypot(b.x - a.x, b.y - a.y) + Math.hypot(c.x - d.x, c.y - d.y)) / 2,
    height: (Math.hypot(d.x - a.x, d.y - a.y) + Math.hypot(c.x - b.x, c.y - b.y)) / 2,
  };
}
