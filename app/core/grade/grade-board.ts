import { kilnDriedMinimumWidthMm } from "#app/core/lengths/kiln-dried-minimum.ts";
import { mmPerFoot, mmPerInch } from "#app/core/lengths/length-unit.ts";
import { alternatingRounder } from "#app/core/measure/alternating-rounder.ts";
import { tallyWidthMm } from "#app/core/measure/measured-board.ts";
import { surfaceMeasureFt2 } from "#app/core/measure/surface-measure.ts";
import { requireSize } from "#app/core/moisture/accepted-range.ts";
import { commonSideLimitsBroken, fasLimitsBroken } from "./board-limits.ts";
import { type CuttingsFound, clearCuttings, type LeastCutting } from "./clear-cuttings.ts";
import { type FaceDefect, keptClearOf } from "./defect-standing.ts";
import { cuttingUnits, demandsOf, fullWidthUnits, type GradeName, type GradeRule, gradeRules } from "./nhla.ts";

export interface BoardToGrade {
  widthMm: number;
  widthFarMm?: number | null;
  lengthMm: number;
  /** Kiln-dried boards may be 1/4 in narrower than a grade's least width: NHLA 2023 p. 56 [confirmed]. False when not said. */
  isKilnDried?: boolean;
  /**
   * Defects as rectangles on each face, both from the same corner; one that shows on both is in both. One without a kind is kept out of cuttings as a knot
   * is, but breaks no limit. A face without any is taken to be clear: give none to a board that nobody has looked over.
   */
  heartFace: readonly FaceDefect[];
  barkFace: readonly FaceDefect[];
}

/** What one grade asked of a face, and what was found. */
export interface GradeTry {
  grade: GradeName;
  passes: boolean;
  /** Why not, in words. */
  why: string | null;
  unitsNeeded: number | null;
  unitsFound: number | null;
  cuttingsAllowed: number | null;
  /** False when it fails by the cuttings found, and the search could not rule out better ones. */
  isProven: boolean;
  found: CuttingsFound | null;
}

export interface FaceGrade {
  face: "heart" | "bark";
  /** The best grade the face could make; null when it makes none of those tried. */
  grade: GradeName | null;
  tries: GradeTry[];
}

export interface BoardGrade {
  /** Rounded as the trade rounds; what grading goes by. */
  surfaceMeasure: number;
  better: FaceGrade;
  poorer: FaceGrade;
  /** What the two faces together could be sold as; null below all grades tried. */
  boardGrade: GradeName | "FAS One Face" | null;
  /** Why a better face of FAS or Selects does not make the board FAS One Face or Selects although the other is No. 1 Common; null when it does, or never came near. */
  whyNotOneFace: string | null;
  notice: string;
}

/** Cuttings tried where a grade sets no limit. */
const unlimited = 60;

const notice =
  "A helper, no inspector's certificate: it counts clear cuttings from the defects recorded here, by the NHLA chart, and takes a face with none recorded to be clear. The back of a cutting is taken to be sound but for decay, pith, shake, wane, splits, holes and honeycomb recorded there. FAS's limits on pith, wane, splits, knots and the ends are judged where a defect's kind is known; whether the board is flat enough, how far splits diverge, and the rules of single species are not. A grade is what an inspector, or buyer and seller, agree on.";

/**
 * Which of the NHLA grades a board's faces could make by the cutting-unit method: surface measure, clear cuttings found by search, least sizes, units.
 *
 * @throws RangeError for a size that is none.
 */
export function gradeBoard(board: BoardToGrade): BoardGrade {
  requireSize("Width", board.widthMm);
  requireSize("Length", board.lengthMm);
  // Of one board alone an exact half goes up, as the first of a tally does.
  const surfaceMeasure = alternatingRounder()(surfaceMeasureFt2(board));
  const faces = [gradeFace("heart", board, surfaceMeasure), gradeFace("bark", board, surfaceMeasure)] as const;
  const heartIsBetter = rank(faces[0].grade) <= rank(faces[1].grade);
  const [better, poorer] = heartIsBetter ? faces : [faces[1], faces[0]];
  return { surfaceMeasure, better, poorer, ...together(board, better, poorer), notice };
}

function rank(grade: GradeName | null): number {
  const at = gradeRules.findIndex((rule) => rule.name === grade);
  return at === -1 ? gradeRules.length : at;
}

/** Graded from the poorer face; but with the better face FAS, or Selects on a smaller board, and the other No. 1 Common it is FAS One Face or Selects. */
function together(board: BoardToGrade, better: FaceGrade, poorer: FaceGrade) {
  const oneFace = better.grade === "FAS" ? "FAS One Face" : better.grade === "Selects" ? "Selects" : null;
  if (poorer.grade !== "No. 1 Common" || !oneFace) return { boardGrade: poorer.grade, whyNotOneFace: null };
  const face = { lengthMm: board.lengthMm, widthMm: tallyWidthMm(board) };
  const broken = commonSideLimitsBroken(face, defectsOf(board, poorer.face), isNarrow(board));
  if (broken.length === 0) return { boardGrade: oneFace, whyNotOneFace: null } as const;
  return { boardGrade: poorer.grade, whyNotOneFace: broken.join(" ") };
}

function defectsOf(board: BoardToGrade, face: FaceGrade["face"]): readonly FaceDefect[] {
  return face === "heart" ? board.heartFace : board.barkFace;
}

function leastWidthMm({ isKilnDried }: BoardToGrade, widthIn: number): number {
  const leastMm = widthIn * mmPerInch;
  return isKilnDried ? kilnDriedMinimumWidthMm(leastMm).mostPiecesMm : leastMm;
}

function isAtLeast(board: BoardToGrade, widthIn: number, lengthFt: number): boolean {
  return tallyWidthMm(board) >= leastWidthMm(board, widthIn) - 0.01 && board.lengthMm >= lengthFt * mmPerFoot - 0.01;
}

/** Selects of 4 and 5 in have limits on wane of their own. */
function isNarrow(board: BoardToGrade): boolean {
  return !isAtLeast(board, 6, 0);
}

function gradeFace(face: FaceGrade["face"], board: BoardToGrade, surfaceMeasure: number): FaceGrade {
  const own = defectsOf(board, face);
  const back = defectsOf(board, face === "heart" ? "bark" : "heart");
  const kept = { clear: keptClearOf(own, back, "clear"), sound: keptClearOf(own, back, "sound") };
  // Which edge tapers is not recorded: only the width that is there from end to end is cut from.
  const whole = { lengthMm: board.lengthMm, widthMm: Math.min(board.widthMm, board.widthFarMm ?? board.widthMm) };
  const known = new Map<string, CuttingsFound>();
  // No. 2A and 2B ask the same of a face that has nothing sound on it; it is searched once.
  const search = (kind: "clear" | "sound", least: readonly LeastCutting[], most: number) => {
    const key = JSON.stringify([kept[kind].length, least, most]);
    const result = known.get(key) ?? clearCuttings(whole, kept[kind], least, most);
    known.set(key, result);
    return result;
  };
  const tries: GradeTry[] = [];
  for (const rule of gradeRules) {
    if (rule.name === "Selects" && isAtLeast(board, 6, 8)) continue;
    const byCuttings = tryGrade(rule, board, surfaceMeasure, (least, most) => search(rule.kind, least, most));
    const result = keepLimits(byCuttings, board, own, surfaceMeasure);
    tries.push(result);
    if (result.passes) return { face, grade: rule.name, tries };
  }
  return { face, grade: null, tries };
}

/** FAS's cuttings are not enough by themselves: the face must keep its limits too. */
function keepLimits(
  result: GradeTry,
  board: BoardToGrade,
  defects: readonly FaceDefect[],
  surfaceMeasure: number,
): GradeTry {
  if (!result.passes || (result.grade !== "FAS" && result.grade !== "Selects")) return result;
  const face = { lengthMm: board.lengthMm, widthMm: tallyWidthMm(board) };
  const broken = fasLimitsBroken(face, defects, surfaceMeasure, { narrow: isNarrow(board) });
  return broken.length === 0 ? result : { ...result, passes: false, why: broken.join(" ") };
}

function tryGrade(
  rule: GradeRule,
  board: BoardToGrade,
  surfaceMeasure: number,
  search: (least: readonly LeastCutting[], most: number) => CuttingsFound,
): GradeTry {
  const none = { unitsNeeded: null, unitsFound: null, cuttingsAllowed: null, isProven: true, found: null };
  const refused = (why: string): GradeTry => ({ grade: rule.name, passes: false, why, ...none });
  const { widthIn, lengthFt } = rule.leastBoard;
  if (!isAtLeast(board, widthIn, lengthFt)) {
    const dried = board.isKilnDried
      ? `, or ${Number((leastWidthMm(board, widthIn) / mmPerInch).toFixed(2))} in once kiln dried,`
      : "";
    return refused(`A board of ${widthIn} in${dried} by ${lengthFt} ft at least.`);
  }
  let nearest: GradeTry | null = null;
  let isProven = true;
  for (const { units, cuttings, least } of askedOf(rule, board, surfaceMeasure)) {
    if (cuttings === 0 || units === 0) continue;
    const found = search(least, cuttings ?? unlimited);
    const unitsFound = cuttingUnits(found.areaMm2);
    const passes = unitsFound >= units - 1e-6;
    const why = passes ? null : shortOf(rule, unitsFound, units, cuttings);
    isProven &&= passes || cuttingUnits(found.atMostMm2) < units - 1e-6;
    const counted = { unitsNeeded: units, unitsFound, cuttingsAllowed: cuttings, isProven: true, found };
    const result: GradeTry = { grade: rule.name, passes, why, ...counted };
    if (passes) return result;
    if (!nearest || unitsFound / units > (nearest.unitsFound ?? 0) / (nearest.unitsNeeded ?? 1)) nearest = result;
  }
  return nearest ? { ...nearest, isProven } : refused(`A surface measure of ${surfaceMeasure} allows it no cutting.`);
}

/** Each way to make the grade: plainly, with the extra cutting, or by two cuttings of full width. No more is asked than a face holds that is clear all over. */
function askedOf(rule: GradeRule, board: BoardToGrade, surfaceMeasure: number) {
  const fullWidth = fullWidthUnits(rule, surfaceMeasure, board.widthMm);
  const narrowMm = Math.min(board.widthMm, board.widthFarMm ?? board.widthMm);
  const whole = cuttingUnits(tallyWidthMm(board) * board.lengthMm);
  return [
    ...demandsOf(rule, surfaceMeasure, board.lengthMm / mmPerFoot).map((demand) => ({
      ...demand,
      least: rule.leastCuttings,
    })),
    ...(fullWidth === null
      ? []
      : [{ units: fullWidth, cuttings: 2, least: [{ widthMm: narrowMm, lengthMm: mmPerInch }] }]),
  ].map((asked) => ({ ...asked, units: Math.min(asked.units, whole) }));
}

function shortOf(rule: GradeRule, found: number, asked: number, cuttings: number | null): string {
  return `${found.toFixed(1)} ${rule.kind} units in ${cuttings ?? "any number of"} cuttings; it asks for ${Number(asked.toFixed(2))}.`;
}
