import { mmPerFoot, mmPerInch } from "#app/core/lengths/length-unit.ts";
import { surfaceMeasureFt2 } from "#app/core/measure/surface-measure.ts";
import { requireSize } from "#app/core/moisture/accepted-range.ts";
import { type CuttingsFound, clearCuttings, type LeastCutting } from "./clear-cuttings.ts";
import { type FaceDefect, keptClearOf } from "./defect-standing.ts";
import { cuttingUnits, demandsOf, fullWidthUnits, type GradeName, type GradeRule, gradeRules } from "./nhla.ts";

export interface BoardToGrade {
  widthMm: number;
  widthFarMm?: number | null;
  lengthMm: number;
  /** Defects as rectangles on each face, both from the same corner; one that shows on both is in both. Without a kind it counts as a knot does. */
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
  notice: string;
}

/** Cuttings tried where a grade sets no limit. */
const unlimited = 60;

const notice =
  "A helper, no inspector's certificate: it counts clear cuttings from the defects recorded here, by the NHLA chart. The back of a cutting is taken to be sound but for decay, pith, shake, wane, splits, holes and honeycomb recorded there. Limits on wane, pith, splits, knots and warp, and the rules of single species, are not judged. A grade is what an inspector, or buyer and seller, agree on.";

/**
 * Which of the NHLA grades a board's faces could make by the cutting-unit method: surface measure, clear cuttings found by search, least sizes, units.
 *
 * @throws RangeError for a size that is none.
 */
export function gradeBoard(board: BoardToGrade): BoardGrade {
  requireSize("Width", board.widthMm);
  requireSize("Length", board.lengthMm);
  const surfaceMeasure = Math.max(0, Math.round(surfaceMeasureFt2(board)));
  const faces = [gradeFace("heart", board, surfaceMeasure), gradeFace("bark", board, surfaceMeasure)] as const;
  const heartIsBetter = rank(faces[0].grade) <= rank(faces[1].grade);
  const [better, poorer] = heartIsBetter ? faces : [faces[1], faces[0]];
  return { surfaceMeasure, better, poorer, boardGrade: together(better.grade, poorer.grade), notice };
}

function rank(grade: GradeName | null): number {
  const at = gradeRules.findIndex((rule) => rule.name === grade);
  return at === -1 ? gradeRules.length : at;
}

/** Graded from the poorer face; but with the better face FAS, or Selects on a smaller board, and the other No. 1 Common it is FAS One Face or Selects. */
function together(better: GradeName | null, poorer: GradeName | null): BoardGrade["boardGrade"] {
  if (poorer !== "No. 1 Common") return poorer;
  if (better === "FAS") return "FAS One Face";
  return better === "Selects" ? "Selects" : poorer;
}

function isAtLeast(board: Pick<BoardToGrade, "widthMm" | "lengthMm">, widthIn: number, lengthFt: number): boolean {
  return board.widthMm >= widthIn * mmPerInch - 0.01 && board.lengthMm >= lengthFt * mmPerFoot - 0.01;
}

function gradeFace(face: FaceGrade["face"], board: BoardToGrade, surfaceMeasure: number): FaceGrade {
  const [own, back] = face === "heart" ? [board.heartFace, board.barkFace] : [board.barkFace, board.heartFace];
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
    const result = tryGrade(rule, board, surfaceMeasure, (least, most) => search(rule.kind, least, most));
    tries.push(result);
    if (result.passes) return { face, grade: rule.name, tries };
  }
  return { face, grade: null, tries };
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
  if (!isAtLeast(board, widthIn, lengthFt)) return refused(`A board of ${widthIn} in by ${lengthFt} ft at least.`);
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

/** Each way to make the grade: plainly, with the extra cutting, or by two cuttings of full width. */
function askedOf(rule: GradeRule, board: BoardToGrade, surfaceMeasure: number) {
  const plain = demandsOf(rule, surfaceMeasure, board.lengthMm / mmPerFoot);
  const fullWidth = fullWidthUnits(rule, surfaceMeasure, board.widthMm);
  return [
    ...plain.map((demand) => ({ ...demand, least: rule.leastCuttings })),
    ...(fullWidth === null
      ? []
      : [
          {
            units: fullWidth,
            cuttings: 2,
            least: [{ widthMm: Math.min(board.widthMm, board.widthFarMm ?? board.widthMm), lengthMm: mmPerInch }],
          },
        ]),
  ];
}

function shortOf(rule: GradeRule, found: number, asked: number, cuttings: number | null): string {
  return `${found.toFixed(1)} ${rule.kind} units in ${cuttings ?? "any number of"} cuttings; it asks for ${Number(asked.toFixed(2))}.`;
}
