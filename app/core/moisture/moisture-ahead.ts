import { curveAt } from "./approach-curve.ts";
import { believedCurves, weighedQuantile } from "./drying-belief.ts";
import type { DryingFit } from "./drying-fit.ts";

/** A board's moisture at a day, percent: the middle and the range that holds 9 of 10 curves still possible. */
export interface MoistureAhead {
  day: number;
  lowPct: number;
  middlePct: number;
  highPct: number;
}

/**
 * The fitted moisture at each of `days` (counted from the first reading used, before or after the last), for a plot.
 * The range is of the board's average, not of a single reading, which strays from it by about `fit.noisePct`.
 */
export function moistureAhead(fit: DryingFit, days: readonly number[], equilibriumSdPct = 0.5): MoistureAhead[] {
  const curves = believedCurves(fit, equilibriumSdPct);
  return days.map((day) => {
    const values = curves.map((curve) => ({ value: curveAt(curve, day), weight: curve.weight }));
    const [lowPct, middlePct, highPct] = [0.05, 0.5, 0.95].map((at) => weighedQuantile(values, at));
    return { day, lowPct: lowPct!, middlePct: middlePct!, highPct: highPct! };
  });
}
