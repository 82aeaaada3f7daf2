import { mmPerFoot, mmPerInch } from "#app/core/lengths/length-unit.ts";
import type { LeastCutting } from "./clear-cuttings.ts";

export type GradeName = "FAS" | "No. 1 Common" | "No. 2A Common" | "No. 3A Common";

/**
 * One grade by the cutting-unit method. A unit is 1 in × 1 ft. Trade reference, section 2: AHEC's pages for No. 1 and 2A Common's board and cutting
 * sizes and yields [confirmed]; the rest agreeing trade reprints of the NHLA chart [secondary]; that a division drops the fraction, from memory.
 */
export interface GradeRule {
  name: GradeName;
  leastBoard: { widthIn: number; lengthFt: number };
  leastCuttings: readonly LeastCutting[];
  /** Units needed for each foot of surface measure. */
  unitsPerSm: number;
  /** Cuttings allowed; null is without limit. */
  cuttings: (surfaceMeasure: number) => number | null;
  /** One cutting more, for more units, within this range of surface measure. */
  extra: { fromSm: number; toSm: number; unitsPerSm: number } | null;
}

const cutting = (widthIn: number, lengthFt: number): LeastCutting => ({
  widthMm: widthIn * mmPerInch,
  lengthMm: lengthFt * mmPerFoot,
});

/** Grades from the best down, of clear-face cuttings. No. 2B and 3B ask for sound cuttings only, which recorded defects do not tell apart, so they are left out. */
export const gradeRules: readonly GradeRule[] = [
  {
    name: "FAS",
    leastBoard: { widthIn: 6, lengthFt: 8 },
    leastCuttings: [cutting(4, 5), cutting(3, 7)],
    unitsPerSm: 10,
    cuttings: (sm) => Math.min(4, Math.floor(sm / 4)),
    extra: { fromSm: 6, toSm: 15, unitsPerSm: 11 },
  },
  {
    name: "No. 1 Common",
    leastBoard: { widthIn: 3, lengthFt: 4 },
    leastCuttings: [cutting(4, 2), cutting(3, 3)],
    unitsPerSm: 8,
    cuttings: (sm) => Math.min(5, Math.floor((sm + 1) / 3)),
    extra: { fromSm: 3, toSm: 10, unitsPerSm: 9 },
  },
  {
    name: "No. 2A Common",
    leastBoard: { widthIn: 3, lengthFt: 4 },
    leastCuttings: [cutting(3, 2)],
    unitsPerSm: 6,
    cuttings: (sm) => Math.min(7, Math.floor(sm / 2)),
    extra: { fromSm: 2, toSm: 7, unitsPerSm: 8 },
  },
  {
    name: "No. 3A Common",
    leastBoard: { widthIn: 3, lengthFt: 4 },
    leastCuttings: [cutting(3, 2)],
    unitsPerSm: 4,
    cuttings: () => null,
    extra: null,
  },
];

/** What a grade asks of a surface measure: units and cuttings, plainly or with the extra cutting. */
export function demandsOf(rule: GradeRule, surfaceMeasure: number): { units: number; cuttings: number | null }[] {
  const plain = { units: rule.unitsPerSm * surfaceMeasure, cuttings: rule.cuttings(surfaceMeasure) };
  const { extra } = rule;
  if (!extra || surfaceMeasure < extra.fromSm || surfaceMeasure > extra.toSm || plain.cuttings === null) return [plain];
  return [plain, { units: extra.unitsPerSm * surfaceMeasure, cuttings: plain.cuttings + 1 }];
}

/** Cutting units of an area in mm²: inches of width times feet of length. */
export function cuttingUnits(areaMm2: number): number {
  return areaMm2 / (mmPerInch * mmPerFoot);
}
