import { requireWithin } from "./accepted-range.ts";
import { type Curve, curveAt, fitGap, rateGrid } from "./approach-curve.ts";
import { type DryingReading, type Series, toSeries } from "./drying-readings.ts";

/** A board's approach to equilibrium, M(t) = E + gap x exp(-rate x t), t in days from the first reading used. */
export interface DryingFit {
  curve: Curve;
  halfLifeDays: number;
  /** Typical distance of a reading from the curve, points. */
  noisePct: number;
  /** Weight of each reading used, 0 (disbelieved) to 1, in time order. */
  weights: number[];
  /** Positions, in the list given, of readings so far off that the fit gives them next to no weight. */
  outliers: number[];
  series: Series;
  outsideRange: string | null;
}

/** Why there is no fit, in a sentence. */
export interface NoFit {
  why: string;
}

// Meters are good to 1-2 points in normal use [secondary]: a reading is not called wrong for less than that.
const leastNoisePct = 0.5;
const rates = rateGrid(240);

/**
 * Fits readings of one board, lying in one place, to an exponential approach to the place's equilibrium `emcPct`. A
 * stray reading loses its weight (Tukey's biweight about a least-absolute-deviation start) once there are five or more;
 * with fewer, one that is wrong cannot be told from the rest. Own model: first-order approach, common in drying work and
 * not published for any one board. Readings taken before the board was moved are to be left out by the caller.
 * RangeError for bad readings or an equilibrium outside 0-30 %; `why` where there are fewer than three readings on
 * three different days.
 */
export function fitDrying(readings: readonly DryingReading[], emcPct: number): DryingFit | NoFit {
  requireWithin("Equilibrium moisture", emcPct, 0, 30, "%");
  const series = toSeries(readings);
  const { days, moisturesPct, from, leftOut } = series;
  const distinct = new Set(days.map((day) => Math.floor(day + 0.5))).size;
  if (distinct < 3) return { why: `Three readings on different days are needed; there ${count(distinct)} so far.` };
  const above = moisturesPct.map((moisture) => moisture - emcPct);
  const weights = settleWeights(days, above);
  const curve = { equilibriumPct: emcPct, ...bestCurve(days, above, weights) };
  const residuals = days.map((day, i) => moisturesPct[i]! - curveAt(curve, day));
  const freedom = Math.max(1, sum(weights) - 2);
  return {
    curve,
    halfLifeDays: Math.LN2 / curve.ratePerDay,
    noisePct: Math.sqrt(sum(residuals.map((residual, i) => weights[i]! * residual ** 2)) / freedom),
    weights,
    outliers: from.filter((_, i) => weights[i]! < 0.1),
    series,
    outsideRange: leftOut > 0 ? `${leftOut} of ${readings.length} readings are above 30 % and were left out.` : null,
  };
}

/** True where a fit could be made. */
export function isFit(result: DryingFit | NoFit): result is DryingFit {
  return "curve" in result;
}

function settleWeights(days: number[], above: number[]): number[] {
  if (days.length < 5) return days.map(() => 1);
  let curve = leastAbsoluteCurve(days, above);
  let weights = days.map(() => 1);
  for (let pass = 0; pass < 10; pass += 1) {
    const residuals = days.map((day, i) => above[i]! - curve.gapPct * Math.exp(-curve.ratePerDay * day));
    const scale = Math.max(leastNoisePct, 1.4826 * median(residuals.map(Math.abs)));
    weights = residuals.map((residual) => Math.max(0, 1 - (residual / (4.685 * scale)) ** 2) ** 2);
    curve = bestCurve(days, above, weights);
  }
  return weights;
}

function bestCurve(days: number[], above: number[], weights: number[]): { gapPct: number; ratePerDay: number } {
  let best = { gapPct: 0, ratePerDay: rates[0]!, squares: Number.POSITIVE_INFINITY };
  for (const ratePerDay of rates) {
    const { gapPct, squares } = fitGap(days, above, weights, ratePerDay);
    if (squares < best.squares) best = { gapPct, ratePerDay, squares };
  }
  return { gapPct: best.gapPct, ratePerDay: best.ratePerDay };
}

function leastAbsoluteCurve(days: number[], above: number[]): { gapPct: number; ratePerDay: number } {
  let best = { gapPct: 0, ratePerDay: rates[0]!, distance: Number.POSITIVE_INFINITY };
  for (const ratePerDay of rates) {
    const decays = days.map((day) => Math.exp(-ratePerDay * day));
    const gapPct = weightedMedian(
      above.map((value, i) => value / decays[i]!),
      decays,
    );
    const distance = sum(above.map((value, i) => Math.abs(value - gapPct * decays[i]!)));
    if (distance < best.distance) best = { gapPct, ratePerDay, distance };
  }
  return best;
}

function weightedMedian(values: number[], weights: number[]): number {
  const order = values.map((_, i) => i).sort((a, b) => values[a]! - values[b]!);
  const half = sum(weights) / 2;
  let reached = 0;
  for (const i of order) {
    reached += weights[i]!;
    if (reached >= half) return values[i]!;
  }
  return values[order.at(-1)!]!;
}

const median = (values: number[]) =>
  weightedMedian(
    values,
    values.map(() => 1),
  );
const sum = (values: number[]) => values.reduce((total, value) => total + value, 0);
const count = (distinct: number) => (distinct === 1 ? "is 1" : `are ${distinct}`);
