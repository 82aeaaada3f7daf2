import { type Curve, fitGap, rateGrid } from "./approach-curve.ts";
import type { DryingFit } from "./drying-fit.ts";

/** A curve and how much belief it carries; the weights of a list sum to one. */
export interface WeighedCurve extends Curve {
  weight: number;
}

// A shop's air wanders and drying wood stops 1-2 points above wetting wood, so the equilibrium itself is uncertain.
const equilibriumSteps = [-1.8, -1.2, -0.6, 0, 0.6, 1.2, 1.8];
const gapSteps = [-2.7, -1.8, -0.9, 0, 0.9, 1.8, 2.7];
const rates = rateGrid(56);
/** Before any reading: noise of about half a point, worth four readings. */
const prior = { shape: 2, scale: 2 * 0.5 ** 2 };

/**
 * Every curve that the readings leave possible, with its weight: rate (logarithmically even beforehand), equilibrium
 * (normal about the fit's, `equilibriumSdPct` points) and gap, the noise integrated out (normal readings with an
 * inverse-gamma variance, so that a few readings give the wider Student ranges they deserve).
 */
export function believedCurves(fit: DryingFit, equilibriumSdPct: number): WeighedCurve[] {
  const { days, moisturesPct } = fit.series;
  const used = fit.weights.reduce((total, weight) => total + weight, 0);
  const freedom = 2 * prior.shape + used - 1;
  const curves: Array<Curve & { log: number }> = [];
  for (const step of equilibriumSdPct > 0 ? equilibriumSteps : [0]) {
    const equilibriumPct = Math.max(0, fit.curve.equilibriumPct + step * equilibriumSdPct);
    const above = moisturesPct.map((moisture) => moisture - equilibriumPct);
    for (const ratePerDay of rates) {
      const { gapPct, information, squares } = fitGap(days, above, fit.weights, ratePerDay);
      const scale = prior.scale + squares / 2;
      const log = -(step * step) / 2 - Math.log(information) / 2 - (freedom / 2) * Math.log(scale);
      const spread = Math.sqrt((2 * scale) / freedom / information);
      for (const z of gapSteps) {
        const tail = ((freedom + 1) / 2) * Math.log1p((z * z) / freedom);
        curves.push({ equilibriumPct, ratePerDay, gapPct: gapPct + z * spread, log: log - tail });
      }
    }
  }
  return normalise(curves);
}

function normalise(curves: Array<Curve & { log: number }>): WeighedCurve[] {
  const most = curves.reduce((high, { log }) => Math.max(high, log), Number.NEGATIVE_INFINITY);
  const weighed = curves.map(({ log, ...curve }) => ({ ...curve, weight: Math.exp(log - most) }));
  const total = weighed.reduce((sum, { weight }) => sum + weight, 0);
  return weighed
    .filter(({ weight }) => weight > total * 1e-9)
    .map((curve) => ({ ...curve, weight: curve.weight / total }));
}

/** The value below which the share `at` (0-1) of the weight lies. Infinite values are allowed and sort last. */
export function weighedQuantile(values: ReadonlyArray<{ value: number; weight: number }>, at: number): number {
  const sorted = [...values].sort((a, b) => a.value - b.value);
  let reached = 0;
  for (const { value, weight } of sorted) {
    reached += weight;
    if (reached >= at) return value;
  }
  return sorted.at(-1)?.value ?? Number.NaN;
}
