import { type EndCorners, endPlane, type PointPx } from "./perspective.ts";
import { fitRings, type RingFit } from "./ring-fit.ts";
import { centreDistance, centreMm, type EndFrame, type Place } from "./ring-levels.ts";
import type { PointMm, RingField } from "./ring-types.ts";
import { type EndSize, fieldFromPith, requireEndSize } from "./stations.ts";

/** A line drawn by hand along one growth ring. */
export type Stroke = readonly PointMm[];

export interface StrokeReading {
  field: RingField;
  /** 0 to 1: mean of the stations', less where the strokes disagree or only one was drawn. */
  confidence: number;
  /** How far the strokes stray from the fitted rings, root mean square: together, and each in its turn. */
  strayMm: number;
  strokeStrayMm: number[];
  /** What speaks against the reading, in words for the page; empty when nothing does. */
  doubts: string[];
}

export type StrokesResult = { ok: true; reading: StrokeReading } | { ok: false; why: string };

const mostStrokes = 40;
/** Of the thickness: a shorter stroke has no direction to speak of. */
const leastStroke = 0.15;
/** A stroke is taken at this many places, evenly along it, however it was recorded. */
const placesPerStroke = 24;
/** Rings that turn by less than 3 degrees across the end's diagonal are as good as straight. */
const straightBeyond = 2 / ((3 * Math.PI) / 180);

/** A stroke with no other to check it is believed less. */
const aloneFactor = 0.6;

/** How far a hand strays from a ring: 0.3 mm, or 0.3 % of the width, as a wide board's end is drawn smaller on the screen. */
function handNoiseMm({ widthMm }: EndSize): number {
  return Math.max(0.3, 0.003 * widthMm);
}

/**
 * Rings of a board's end from strokes drawn along growth rings: circles round one pith, each stroke on a circle of its own. Strokes that run nearly
 * straight put the pith far off; where it is so far that it does not show, it is null and the rings run straight.
 *
 * @param strokes in millimetres of the end, best two or three, well apart; they may run a little past its edges.
 * @param size of the end in millimetres.
 * @param ringsPerInch if somebody counted.
 * @returns the reading, or why these strokes cannot be read.
 */
export function readStrokes(
  strokes: readonly Stroke[],
  { widthMm, thicknessMm }: EndSize,
  ringsPerInch: number | null = null,
): StrokesResult {
  const size = requireEndSize({ widthMm, thicknessMm });
  const why = strokesProblem(strokes, size);
  if (why) return { ok: false, why };
  const frame: EndFrame = {
    middle: { xMm: widthMm / 2, yMm: thicknessMm / 2 },
    halfMm: Math.hypot(widthMm, thicknessMm) / 2,
  };
  const places = strokes.map((stroke) => evenly(stroke, frame));
  const noiseMm = handNoiseMm(size);
  const fit = fitRings(places, noiseMm / frame.halfMm);
  const centre = centreMm(fit.centre, frame);
  const round = fieldFromPith(size, centre, ringsPerInch);
  const stations = round.stations.map((station) => ({
    ...station,
    confidence: stationConfidence(fit, places, station.position, size, frame),
  }));
  const pith = centreDistance(fit.centre) > straightBeyond ? null : centre;
  const strayMm = fit.residual * frame.halfMm;
  const strokeStrayMm = fit.strokeResiduals.map((residual) => residual * frame.halfMm);
  const sure = stations.reduce((sum, { confidence }) => sum + confidence, 0) / stations.length;
  const agreement = Math.min(1, (3 * noiseMm) / Math.max(strayMm, 1e-9));
  return {
    ok: true,
    reading: {
      field: { ...round, stations, pith },
      confidence: sure * agreement * (strokes.length === 1 ? aloneFactor : 1),
      strayMm,
      strokeStrayMm,
      doubts: doubts(strokeStrayMm, sure, noiseMm),
    },
  };
}

/**
 * The same from strokes on a photo, in its pixels, with perspective taken out by the end's corners (top left, top right, bottom right, bottom left)
 * and its real size.
 */
export function readPhotoStrokes(
  strokes: readonly (readonly PointPx[])[],
  corners: EndCorners,
  size: EndSize,
  ringsPerInch: number | null = null,
): StrokesResult {
  const result = endPlane(corners, size);
  if (!result.ok) return { ok: false, why: result.why };
  return readStrokes(
    strokes.map((stroke) => stroke.map(result.plane.toMm)),
    size,
    ringsPerInch,
  );
}

function offTheEnd(index: number): string {
  return `Stroke ${index + 1} runs off the board's end: draw it between the four corners.`;
}

function strokesProblem(strokes: readonly Stroke[], { widthMm, thicknessMm }: EndSize): string | null {
  if (strokes.length === 0) return "Draw along a ring, from one edge of the board towards the other.";
  if (strokes.length > mostStrokes) return `At most ${mostStrokes} strokes can be read at once.`;
  for (const [i, stroke] of strokes.entries()) {
    const off = stroke.some(
      ({ xMm, yMm }) => !(Math.abs(xMm / widthMm - 0.5) < 1 && Math.abs(yMm / thicknessMm - 0.5) < 1.5),
    );
    if (off) return offTheEnd(i);
    if (lengthMm(stroke) < leastStroke * Math.min(widthMm, thicknessMm))
      return `Stroke ${i + 1} is too short to have a direction: follow its ring further.`;
  }
  return null;
}

function lengthMm(stroke: Stroke): number {
  return stroke.reduce((sum, { xMm, yMm }, i) => {
    const before = stroke[i - 1];
    return before ? sum + Math.hypot(xMm - before.xMm, yMm - before.yMm) : sum;
  }, 0);
}

/** Places at even steps along a stroke. */
function evenly(stroke: Stroke, { middle, halfMm }: EndFrame): Place[] {
  const step = lengthMm(stroke) / (placesPerStroke - 1);
  const places: Place[] = [];
  let walked = 0;
  for (let i = 1; i < stroke.length; i++) {
    const [from, to] = [stroke[i - 1]!, stroke[i]!];
    const span = Math.hypot(to.xMm - from.xMm, to.yMm - from.yMm);
    while (span > 0 && places.length < placesPerStroke && places.length * step <= walked + span * (1 + 1e-9)) {
      const share = (places.length * step - walked) / span;
      places.push({
        x: (from.xMm + share * (to.xMm - from.xMm) - middle.xMm) / halfMm,
        y: (from.yMm + share * (to.yMm - from.yMm) - middle.yMm) / halfMm,
      });
    }
    walked += span;
  }
  return places;
}

/** Degrees by which real rings stray from one pith's circles: near a stroke, and added for each half diagonal away from the nearest. */
const strayDeg = { near: 1.5, away: 6 };
/** A station whose angle is this uncertain has half the confidence. */
const halfSureDeg = 8;

function stationConfidence(
  fit: RingFit,
  strokes: Place[][],
  position: number,
  { widthMm, thicknessMm }: EndSize,
  { halfMm }: EndFrame,
): number {
  const x = ((position - 0.5) * widthMm) / halfMm;
  const quarter = thicknessMm / 4 / halfMm;
  const fitted = [-quarter, 0, quarter].map((y) => (fit.directionSd({ x, y }) * 180) / Math.PI);
  const away = Math.min(...strokes.flat().map((place) => Math.hypot(place.x - x, place.y)));
  const off = Math.hypot(Math.max(...fitted), strayDeg.near + strayDeg.away * away);
  return 1 / (1 + (off / halfSureDeg) ** 2);
}

function doubts(strokeStrayMm: readonly number[], sure: number, noiseMm: number): string[] {
  if (strokeStrayMm.length === 1) return ["One ring alone: draw another, well apart, to check it."];
  const found = strokeStrayMm.flatMap((residual, i) =>
    residual > 4 * noiseMm
      ? [`Stroke ${i + 1} does not run with the others: it may follow a ray or a saw mark instead of a ring.`]
      : [],
  );
  if (found.length === strokeStrayMm.length)
    return ["The strokes do not lie on rings round one pith: they may not follow growth rings."];
  if (sure < 0.5) found.push("The strokes say little about parts of the end: draw one nearer each edge, and longer.");
  return found;
}
