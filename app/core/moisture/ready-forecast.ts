import { requireWithin } from "./accepted-range.ts";
import { type Curve, curveAt } from "./approach-curve.ts";
import { believedCurves, weighedQuantile } from "./drying-belief.ts";
import { fitDrying, isFit } from "./drying-fit.ts";
import type { DryingReading } from "./drying-readings.ts";
import { type Readiness, readiness } from "./interior-targets.ts";

/** What is asked: readings of a board in one place, that place's equilibrium, and the band to be reached. */
export interface ReadyQuestion {
  readings: readonly DryingReading[];
  emcPct: number;
  targetPct: number;
  tolerancePct: number;
  /** How well the equilibrium is known, standard deviation in points; 0.5 unless the shop logs its air. */
  emcSdPct?: number;
}

/** Days are counted from the last reading. The range holds 9 of 10 outcomes that the readings leave possible. */
export type ReadyForecast = { now: Readiness | null; outsideRange: string | null } & (
  | { state: "ready"; staysReady: boolean }
  | {
      state: "forecast";
      /** False where this room would carry the board through the band and out at the other side. */
      staysReady: boolean;
      likelyDays: number;
      earliestDays: number;
      latestDays: number;
      /** Set where the likely day lies further ahead than the readings reach back. */
      furtherThanData: string | null;
    }
  | { state: "never-here"; why: string }
  | { state: "not-yet-known"; why: string }
);

/**
 * The day a board's average moisture will come within `tolerancePct` of `targetPct`, from its own readings. Says "ready"
 * when it is more likely than not there now, "never-here" when the room's equilibrium lies outside the band,
 * "not-yet-known" when the readings do not settle it. See `fitDrying` for the model and its limits. RangeError for bad
 * figures.
 */
export function forecastReady(question: ReadyQuestion): ReadyForecast {
  const { readings, emcPct, targetPct, tolerancePct, emcSdPct = 0.5 } = question;
  requireWithin("Target moisture", targetPct, 1, 30, "%");
  requireWithin("Tolerance", tolerancePct, 0.1, 10, "points");
  requireWithin("Spread of the equilibrium", emcSdPct, 0, 3, "points");
  const fit = fitDrying(readings, emcPct);
  if (!isFit(fit)) return { state: "not-yet-known", why: fit.why, now: latest(question), outsideRange: null };
  const span = fit.series.days.at(-1)!;
  const band = { low: targetPct - tolerancePct, high: targetPct + tolerancePct };
  const waits = believedCurves(fit, emcSdPct).map((curve) => ({
    value: daysUntil(curve, band, span),
    weight: curve.weight,
  }));
  const staysReady = emcPct >= band.low && emcPct <= band.high;
  const [earliestDays, likelyDays, latestDays] = [0.05, 0.5, 0.95].map((at) => weighedQuantile(waits, at)) as [
    number,
    number,
    number,
  ];
  const shared = { now: readiness(curveAt(fit.curve, span), question), outsideRange: fit.outsideRange };
  if (likelyDays === 0) return { ...shared, now: "ready", state: "ready", staysReady };
  if (likelyDays === Number.POSITIVE_INFINITY) return { ...shared, state: "never-here", why: notHere(emcPct, band) };
  if (latestDays === Number.POSITIVE_INFINITY) {
    return { ...shared, state: "not-yet-known", why: "It may settle just outside the target in this room." };
  }
  if (latestDays - earliestDays > 14 + 2 * likelyDays || likelyDays > 4 * span) {
    return { ...shared, state: "not-yet-known", why: "The readings so far fit too many outcomes; take more." };
  }
  const furtherThanData = likelyDays > span ? "The likely day is further ahead than the readings reach back." : null;
  return { ...shared, state: "forecast", staysReady, likelyDays, earliestDays, latestDays, furtherThanData };
}

/** Days after `span` until the curve enters the band: 0 when inside, infinite when it never does. */
function daysUntil(curve: Curve, band: { low: number; high: number }, span: number): number {
  const now = curveAt(curve, span);
  if (now >= band.low && now <= band.high) return 0;
  const edge = now > band.high ? band.high : band.low;
  const share = (edge - curve.equilibriumPct) / curve.gapPct;
  if (share <= 0 || share >= 1) return Number.POSITIVE_INFINITY;
  const day = -Math.log(share) / curve.ratePerDay;
  return day > span ? day - span : Number.POSITIVE_INFINITY;
}

function latest(question: ReadyQuestion): Readiness | null {
  const last = question.readings.reduce<DryingReading | null>(
    (newest, reading) => (newest === null || Number(reading.at) >= Number(newest.at) ? reading : newest),
    null,
  );
  return last && readiness(last.moisturePct, question);
}

function notHere(emcPct: number, band: { low: number; high: number }): string {
  const [room, low, high] = [emcPct, band.low, band.high].map((value) => value.toFixed(1));
  return `This room's air holds wood near ${room} %, and the target is ${low} to ${high} %.`;
}
