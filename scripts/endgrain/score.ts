import type { ClassShares, RingClass } from "#app/core/rings/ring-types.ts";
import { isNearTie } from "#scripts/endgrain/development-set.ts";

/** One end's reading beside its truth. Angles in degrees; errors of pith and ring density as parts of the width and of the truth. */
export type ScoredEnd = {
  name: string;
  group: string;
  errors: number[];
  stationConfidences: number[];
  shares: ClassShares;
  class: RingClass;
  trueShares: ClassShares;
  trueClass: RingClass;
  sure: boolean;
  confidence: number;
  pithError: number | null;
  ringsError: number | null;
  ms: number;
};

/** A reading is wrong when its class is (near ties left out) or when the middle station error is over 5 degrees. */
export function isWrong(end: ScoredEnd): boolean {
  return (!isNearTie(end.trueShares) && end.class !== end.trueClass) || quantile(end.errors, 0.5)! > 5;
}

/** A value that the given part of the numbers lies below; null for none. */
export function quantile(values: readonly number[], part: number): number | null {
  if (values.length === 0) return null;
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(part * sorted.length))]!;
}

/** The class with the largest share. */
export function largestClass(shares: ClassShares): RingClass {
  return (Object.keys(shares) as RingClass[]).reduce((best, name) => (shares[name] > shares[best] ? name : best));
}

/** One line of the benchmark's table. */
export function scoreLine(label: string, ends: readonly ScoredEnd[]): string {
  const errors = ends.flatMap((end) => end.errors);
  const clear = ends.filter((end) => !isNearTie(end.trueShares));
  const sure = ends.filter((end) => end.sure);
  const some = (pick: (end: ScoredEnd) => number | null) =>
    ends.map(pick).filter((value): value is number => value !== null);
  const figure = (value: number | null, digits: number, unit = "") =>
    value === null ? "-" : `${value.toFixed(digits)}${unit}`;
  const percent = (part: number, whole: number) => (whole === 0 ? "-" : `${((100 * part) / whole).toFixed(0)}%`);
  return [
    label.padEnd(26),
    String(ends.length).padStart(4),
    figure(quantile(errors, 0.5), 2).padStart(7),
    figure(errors.length ? errors.reduce((a, b) => a + b, 0) / errors.length : null, 2).padStart(7),
    figure(quantile(errors, 0.9), 2).padStart(7),
    percent(clear.filter((end) => end.class === end.trueClass).length, clear.length).padStart(6),
    percent(sure.length, ends.length).padStart(6),
    `${sure.filter(isWrong).length}/${sure.length}`.padStart(8),
    figure(
      quantile(
        some((end) => end.pithError),
        0.5,
      ),
      3,
    ).padStart(7),
    figure(
      quantile(
        some((end) => end.ringsError),
        0.5,
      ),
      2,
    ).padStart(7),
    figure(
      quantile(
        some((end) => end.ms),
        0.5,
      ),
      0,
    ).padStart(6),
  ].join(" ");
}

export const SCORE_HEADER = [
  "".padEnd(26),
  "ends",
  " median",
  "   mean",
  "   90th",
  " class",
  "  sure",
  "   wrong",
  "   pith",
  "  rings",
  "    ms",
].join(" ");
