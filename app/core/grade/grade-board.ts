import { mmPerFoot, mmPerInch } from "#app/core/lengths/length-unit.ts";
import { surfaceMeasureFt2 } from "#app/core/measure/surface-measure.ts";
import { requireSize } from "#app/core/moisture/accepted-range.ts";
import { type CuttingsFound, clearCuttings, type FaceArea } from "./clear-cuttings.ts";
import { cuttingUnits, demandsOf, type GradeName, type GradeRule, gradeRules } from "./nhla.ts";

export interface BoardToGrade {
  widthMm: number;
  widthFarMm?: number | null;
  lengthMm: number;
  /** Defects as rectangles on each face; one that shows on both is in both. */
  heartFace: readonly FaceArea[];
  barkFace: readonly FaceArea[];
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
  boardGrade: GradeName | "FAS One Face" | "Selects" | null;
  notice: string;
}

/** Cuttings tried where a grade sets no limit: more on one face than this is firewood. */
const unlimited = 7;

const notice =
  "A helper, no inspector's certificate: it counts clear cuttings from the defects recorded here, by the NHLA chart. Limits on wane, pith, splits, knots and warp, the 97 % rule and the rules of single species are not judged. A grade is what an inspector, or buyer and seller, agree on.";

/**
 * Which of the NHLA grades a board's faces could make by the cutting-unit method: surface measure, clear cuttings found by search, least sizes, units.
 *
 * @throws RangeError for a size that is none.
 */
export function gradeBoard(board: BoardToGrade): BoardGrade {
  requireSize("Width", board.widthMm);
  requireSize("Length", board.lengthMm);
  const surfaceMeasure = Math.max(0, Math.round(surfaceMeasureFt2(board)));
  const faces = [
    gradeFace("heart", board, board.heartFace, surfaceMeasure),
    gradeFace("bark", board, board.barkFace, surfaceMeasure),
  ] as const;
  const heartIsBetter = rank(faces[0].grade) <= rank(faces[1].grade);
  const [better, poorer] = heartIsBetter ? faces : [faces[1], faces[0]];
  return { surfaceMeasure, better, poorer, boardGrade: together(better.grade, poorer.grade, board), notice };
}

function rank(grade: GradeName | null): number {
  const at = gradeRules.findIndex((rule) => rule.name === grade);
  return at === -1 ? gradeRules.length : at;
}

/** Graded from the poorer face; but with one FAS face and the other No. 1 Common it is FAS One Face, or Selects when smaller. */
function together(better: GradeName | null, poorer: GradeName | null, board: BoardToGrade): BoardGrade["boardGrade"] {
  if (better !== "FAS" || poorer !== "No. 1 Common") return poorer;
  return isAtLeast(board, 6, 8) ? "FAS One Face" : "Selects";
}

function isAtLeast(board: Pick<BoardToGrade, "widthMm" | "lengthMm">, widthIn: number, lengthFt: number): boolean {
  return board.widthMm >= widthIn * mmPerInch - 0.01 && board.lengthMm >= lengthFt * mmPerFoot - 0.01;
}

function gradeFace(
  face: FaceGrade["face"],
  board: BoardToGrade,
  defects: readonly FaceArea[],
  surfaceMeasure: number,
): FaceGrade {
  const tries: GradeTry[] = [];
  for (const rule of gradeRules) {
    const result = tryGrade(rule, board, defects, surfaceMeasure);
    tries.push(result);
    if (result.passes) return { face, grade: rule.name, tries };
  }
  return { face, grade: null, tries };
}

function tryGrade(
  rule: GradeRule,
  board: BoardToGrade,
  defects: readonly FaceArea[],
  surfaceMeasure: number,
): GradeTry {
  const refused = (why: string): GradeTry => ({
    grade: rule.name,
    passes: false,
    why,
    unitsNeeded: null,
    unitsFound: null,
    cuttingsAllowed: null,
    found: null,
  });
  const { widthIn, lengthFt } = rule.leastBoard;
  if (!isAtLeast(board, widthIn, lengthFt)) return refused(`A board of ${widthIn} in by ${lengthFt} ft at least.`);
  let nearest: GradeTry | null = null;
  for (const { units, cuttings } of demandsOf(rule, surfaceMeasure)) {
    if (cuttings === 0) continue;
    const found = clearCuttings(board, defects, rule.leastCuttings, cuttings ?? unlimited);
    const unitsFound = cuttingUnits(found.areaMm2);
    const passes = unitsFound >= units - 1e-6;
    const why = passes
      ? null
      : `${unitsFound.toFixed(1)} clear units in ${cuttings ?? "any number of"} cuttings; it asks for ${units}.`;
    const result: GradeTry = {
      grade: rule.name,
      passes,
      why,
      unitsNeeded: units,
      unitsFound,
      cuttingsAllowed: cuttings,
      found,
    };
    if (passes) return result;
    if (!nearest || unitsFound / units > (nearest.unitsFound ?? 0) / (nearest.unitsNeeded ?? 1)) nearest = result;
  }
  return nearest ?? refused(`A surface measure of ${surfaceMeasure} allows it no cutting.`);
}
