import { mmPerFoot, mmPerInch } from "#app/core/lengths/length-unit.ts";
import { type FaceDefect, standingOf } from "./defect-standing.ts";
import { areaOf, coveredArea, type FaceArea, overlap } from "./empty-rectangles.ts";

/**
 * Limits that a face must keep besides its cuttings: pith, wane, splits, knots and holes, and the soundness of its ends. They are judged by a defect's kind,
 * so of one without a kind nothing is said here. Trade reference, section 2, and distributors' copies of the NHLA chart [secondary]; how lengths are
 * added up where the chart does not say is told at each. How far a split diverges, and whether the board is flat enough, are not recorded.
 */
interface Face {
  lengthMm: number;
  widthMm: number;
}

/** What of FAS's limits a face breaks, in words; none when it keeps them all. `narrow` is for Selects of 4 and 5 in, which have wane limits of their own. */
export function fasLimitsBroken(
  face: Face,
  defects: readonly FaceDefect[],
  surfaceMeasure: number,
  { narrow = false } = {},
): string[] {
  const of = (...kinds: string[]) => defects.filter(({ kind }) => kind !== undefined && kinds.includes(kind));
  const inches = (mm: number) => mm / mmPerInch;
  const broken: string[] = [];
  // Pieces of pith, and splits of both ends, are added up.
  const pithIn = inches(sumOf(of("pith").map(({ lengthMm }) => lengthMm)));
  if (pithIn > surfaceMeasure + noise)
    broken.push(`Pith ${shown(pithIn)} in long; it allows ${surfaceMeasure} in, the surface measure.`);
  const splitsIn = inches(sumOf(of("split").map(({ lengthMm }) => lengthMm)));
  const splitLimitIn = Math.max(2 * surfaceMeasure, 12);
  if (splitsIn > splitLimitIn + noise)
    broken.push(`Splits ${shown(splitsIn)} in long together; it allows ${splitLimitIn} in.`);
  // A knot's size is the mean of its length and width: an average diameter, from memory of the rule.
  const widestIn = Math.max(0, ...of("knot", "hole").map(({ lengthMm, widthMm }) => inches((lengthMm + widthMm) / 2)));
  if (widestIn > surfaceMeasure / 3 + noise)
    broken.push(
      `A knot or hole ${shown(widestIn)} in across; it allows ${shown(surfaceMeasure / 3)} in, a third of the surface measure.`,
    );
  broken.push(...(narrow ? waneBroken(face, of("wane"), true) : waneTooLong(face, of("wane"), false)));
  for (const [end, alongMm] of [
    ["near", 0],
    ["far", face.lengthMm - mmPerFoot],
  ] as const) {
    const foot = { alongMm, acrossMm: 0, lengthMm: mmPerFoot, widthMm: face.widthMm };
    const share = unsoundShare(foot, defects);
    if (share > 0.25 + noise)
      broken.push(`The ${end} end's first foot is ${Math.round(share * 100)} % unsound; it allows 25 %.`);
  }
  return broken;
}

/** What of the wane limits the No. 1 Common side of FAS One Face or Selects breaks: a third of the width, edges added, or half of the length. */
export function commonSideLimitsBroken(face: Face, defects: readonly FaceDefect[], narrow: boolean): string[] {
  return waneBroken(
    face,
    defects.filter(({ kind }) => kind === "wane"),
    narrow,
  );
}

const noise = 1e-6;

function waneBroken(face: Face, wane: readonly FaceDefect[], addEdges: boolean): string[] {
  const { left, right } = byEdge(face, wane);
  const widest = (edge: readonly FaceDefect[]) => Math.max(0, ...edge.map(({ widthMm }) => widthMm));
  const share = (widest(left) + widest(right)) / face.widthMm;
  const tooWide = share > 1 / 3 + noise ? [`Wane ${Math.round(share * 100)} % of the width; it allows a third.`] : [];
  return [...tooWide, ...waneTooLong(face, wane, addEdges)];
}

/** Half of the board's length, on either edge by itself or, where the chart says so, on both together. */
function waneTooLong(face: Face, wane: readonly FaceDefect[], addEdges: boolean): string[] {
  const { left, right } = byEdge(face, wane);
  const lengths = [left, right].map(lengthAlong);
  const longest = addEdges ? sumOf(lengths) : Math.max(...lengths);
  const share = longest / face.lengthMm;
  if (share <= 0.5 + noise) return [];
  return [`Wane along ${Math.round(share * 100)} % of the length${addEdges ? ", edges added" : ""}; it allows half.`];
}

/** Wane belongs to the edge that its middle is nearer to. */
function byEdge(face: Face, wane: readonly FaceDefect[]) {
  const isLeft = ({ acrossMm, widthMm }: FaceDefect) => acrossMm + widthMm / 2 <= face.widthMm / 2;
  return { left: wane.filter(isLeft), right: wane.filter((one) => !isLeft(one)) };
}

/** Length of board along which any of the areas lies, each place once. */
function lengthAlong(areas: readonly FaceArea[]): number {
  return coveredArea(areas.map((area) => ({ ...area, acrossMm: 0, widthMm: 1 })));
}

/** Wane is no wood and a split is no area: both have limits of their own and are not counted again. Our own reading of "unsound wood". */
function unsoundShare(foot: FaceArea, defects: readonly FaceDefect[]): number {
  const inside = defects.filter(
    (defect) =>
      standingOf(defect) === "unsound" && defect.kind !== "wane" && defect.kind !== "split" && overlap(defect, foot),
  );
  return coveredArea(inside.map((defect) => common(defect, foot))) / areaOf(foot);
}

function common(a: FaceArea, b: FaceArea): FaceArea {
  const alongMm = Math.max(a.alongMm, b.alongMm);
  const acrossMm = Math.max(a.acrossMm, b.acrossMm);
  return {
    alongMm,
    acrossMm,
    lengthMm: Math.min(a.alongMm + a.lengthMm, b.alongMm + b.lengthMm) - alongMm,
    widthMm: Math.min(a.acrossMm + a.widthMm, b.acrossMm + b.widthMm) - acrossMm,
  };
}

function sumOf(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0);
}

function shown(inches: number): string {
  return String(Number(inches.toFixed(2)));
}
