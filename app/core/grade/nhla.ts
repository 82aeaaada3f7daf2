import { mmPerFoot, mmPerInch } from "#app/core/lengths/length-unit.ts";
import type { LeastCutting } from "./clear-cuttings.ts";

export type GradeName =
  | "FAS"
  | "Selects"
  | "No. 1 Common"
  | "No. 2A Common"
  | "No. 2B Common"
  | "No. 3A Common"
  | "No. 3B Common";

/**
 * One grade by the cutting-unit method. A unit is 1 in × 1 ft. Trade reference, section 2: AHEC's pages for No. 1 and 2A Common's board and cutting
 * sizes and yields [confirmed]; the rest agreeing trade reprints of the NHLA chart [secondary]; that a division drops the fraction, from memory.
 */
export interface GradeRule {
  name: GradeName;
  leastBoard: { widthIn: number; lengthFt: number };
  leastCuttings: readonly LeastCutting[];
  /** Clear of all defects, or only of unsound ones. */
  kind: "clear" | "sound";
  /** Units needed for each foot of surface measure. */
  unitsPerSm: number;
  /** Cuttings allowed; null is without limit. */
  cuttings: (surfaceMeasure: number) => number | null;
  /** One cutting more, for more units, within this range of surface measure. */
  extra: { fromSm: number; toSm: number; unitsPerSm: number } | null;
  /**
   * Surface measures too small for the table: one cutting, of so many units for each foot. A distributor's copy of the NHLA chart, its columns run together
   * [secondary]: Selects of 2 and 3 clear or SM × 11; No. 1 Common of 1 clear, of 2 SM × 9; No. 2 of 1 SM × 8.
   */
  small: Readonly<Record<number, number>>;
  /** One cutting more for each 4 of surface measure over 16 in boards over 17 ft, up to 7. NHLA 2015 p. 22 [confirmed]. */
  moreWhenLong: boolean;
}

const cutting = (widthIn: number, lengthFt: number): LeastCutting => ({
  widthMm: widthIn * mmPerInch,
  lengthMm: lengthFt * mmPerFoot,
});

const fasCuttings = {
  leastCuttings: [cutting(4, 5), cutting(3, 7)],
  kind: "clear",
  unitsPerSm: 10,
  cuttings: (sm: number) => Math.min(4, Math.floor(sm / 4)),
  extra: { fromSm: 6, toSm: 15, unitsPerSm: 11 },
  small: {},
  moreWhenLong: true,
} as const;

const no2Cuttings = {
  leastBoard: { widthIn: 3, lengthFt: 4 },
  leastCuttings: [cutting(3, 2)],
  unitsPerSm: 6,
  cuttings: (sm: number) => Math.min(7, Math.floor(sm / 2)),
  extra: { fromSm: 2, toSm: 7, unitsPerSm: 8 },
  small: { 1: 8 },
  moreWhenLong: false,
} as const;

/** No. 3B's least cutting is 36 in² of at least 1 1/2 in of width; the inch of length only bounds the search. */
const no3BCutting = { ...cutting(1.5, 1 / 12), areaMm2: 36 * mmPerInch * mmPerInch };

/**
 * What one face may make, from the best down. Selects asks FAS's cuttings of the better face of a smaller board; FAS One Face and Selects as the grade
 * of a board follow from its two faces.
 */
export const gradeRules: readonly GradeRule[] = [
  { name: "FAS", leastBoard: { widthIn: 6, lengthFt: 8 }, ...fasCuttings },
  { name: "Selects", leastBoard: { widthIn: 4, lengthFt: 6 }, ...fasCuttings, small: { 2: 11, 3: 11 } },
  {
    name: "No. 1 Common",
    leastBoard: { widthIn: 3, lengthFt: 4 },
    leastCuttings: [cutting(4, 2), cutting(3, 3)],
    kind: "clear",
    unitsPerSm: 8,
    cuttings: (sm) => Math.min(5, Math.floor((sm + 1) / 3)),
    extra: { fromSm: 3, toSm: 10, unitsPerSm: 9 },
    small: { 1: 12, 2: 9 },
    moreWhenLong: true,
  },
  { name: "No. 2A Common", kind: "clear", ...no2Cuttings },
  { name: "No. 2B Common", kind: "sound", ...no2Cuttings },
  {
    name: "No. 3A Common",
    leastBoard: { widthIn: 3, lengthFt: 4 },
    leastCuttings: [cutting(3, 2)],
    kind: "clear",
    unitsPerSm: 4,
    cuttings: () => null,
    extra: null,
    small: {},
    moreWhenLong: false,
  },
  {
    name: "No. 3B Common",
    leastBoard: { widthIn: 3, lengthFt: 4 },
    leastCuttings: [no3BCutting],
    kind: "sound",
    unitsPerSm: 3,
    cuttings: () => null,
    extra: null,
    small: {},
    moreWhenLong: false,
  },
];

/** What a grade asks of a surface measure: units and cuttings, plainly or with the extra cutting, or of a small board the one that it allows. */
export function demandsOf(
  rule: GradeRule,
  surfaceMeasure: number,
  lengthFt = 0,
): { units: number; cuttings: number | null }[] {
  const small = rule.small[surfaceMeasure];
  if (small !== undefined) return [{ units: small * surfaceMeasure, cuttings: 1 }];
  const plain = { units: rule.unitsPerSm * surfaceMeasure, cuttings: rule.cuttings(surfaceMeasure) };
  const { extra } = rule;
  if (plain.cuttings === null) return [plain];
  if (rule.moreWhenLong && lengthFt > 17 && surfaceMeasure > 16)
    return [{ ...plain, cuttings: Math.min(7, plain.cuttings + Math.floor((surfaceMeasure - 16) / 4)) }];
  if (!extra || surfaceMeasure < extra.fromSm || surfaceMeasure > extra.toSm) return [plain];
  return [plain, { units: extra.unitsPerSm * surfaceMeasure, cuttings: plain.cuttings + 1 }];
}

/**
 * Units that two cuttings of full width, of any length, must make together for FAS where the surface measure is 6 to 12 and the board 6 in and wider:
 * the 97 % rule, trade reprints of the NHLA chart [secondary]. Null where it does not apply.
 */
export function fullWidthUnits(rule: GradeRule, surfaceMeasure: number, widthMm: number): number | null {
  const applies = rule.name === "FAS" && surfaceMeasure >= 6 && surfaceMeasure <= 12 && widthMm >= 6 * mmPerInch - 0.01;
  return applies ? 11.64 * surfaceMeasure : null;
}

/** Cutting units of an area in mm²: inches of width times feet of length. */
export function cuttingUnits(areaMm2: number): number {
  return areaMm2 / (mmPerInch * mmPerFoot);
}
