import { fitDrying, isFit } from "#app/core/moisture/drying-fit.ts";
import { type DryingReading, dayAfter, toSeries } from "#app/core/moisture/drying-readings.ts";
import { type MoistureAhead, moistureAhead } from "#app/core/moisture/moisture-ahead.ts";
import { forecastReady, type ReadyForecast } from "#app/core/moisture/ready-forecast.ts";

/** What is asked of a board's readings. */
export interface ReadyQuestion {
  readings: readonly DryingReading[];
  /** What the air that the wood stands in holds wood at, percent. */
  emcPct: number;
  targetPct: number;
  tolerancePct: number;
}

/** The forecast with all that its plot needs: days count from the first reading used. */
export interface ReadyView {
  forecast: ReadyForecast;
  /** `isDoubted`: so far off the others that the fit gives it next to no weight. */
  readings: { day: number; moisturePct: number; isDoubted: boolean }[];
  ahead: MoistureAhead[];
  emcPct: number;
  band: { lowPct: number; highPct: number };
  /** Likely day, and the range that holds 9 of 10 outcomes; null unless a day is forecast. */
  readyDay: { likely: number; earliest: number; latest: number } | null;
  /** Day 0, where the readings have dates. */
  startsAt: Date | null;
  lastDay: number;
}

/** Points the curve is drawn through. */
const plotSteps = 32;

/** Forecasts the day that wood will be ready and lays out its plot. RangeError for figures that make no sense. */
export function readyView(question: ReadyQuestion): ReadyView {
  const { readings, emcPct, targetPct, tolerancePct } = question;
  const forecast = forecastReady(question);
  const fit = fitDrying(readings, emcPct);
  const series = isFit(fit) ? fit.series : toSeries(readings);
  const doubted = new Set(isFit(fit) ? fit.outliers : []);
  const span = series.days.at(-1) ?? 0;
  const readyDay =
    forecast.state === "forecast"
      ? {
          likely: span + forecast.likelyDays,
          earliest: span + forecast.earliestDays,
          latest: span + forecast.latestDays,
        }
      : null;
  const lastDay = Math.max(span * 1.25, (readyDay?.latest ?? 0) * 1.05, 7);
  const days = Array.from({ length: plotSteps + 1 }, (_, i) => (lastDay * i) / plotSteps);
  return {
    forecast,
    readings: series.days.map((day, i) => ({
      day,
      moisturePct: series.moisturesPct[i]!,
      isDoubted: doubted.has(series.from[i]!),
    })),
    ahead: isFit(fit) ? moistureAhead(fit, days) : [],
    emcPct,
    band: { lowPct: targetPct - tolerancePct, highPct: targetPct + tolerancePct },
    readyDay,
    startsAt: firstDate(readings),
    lastDay,
  };
}

function firstDate(readings: readonly DryingReading[]): Date | null {
  const dates = readings.filter(({ moisturePct }) => moisturePct <= 30).map(({ at }) => at);
  const times = dates.filter((at) => at instanceof Date).map((at) => at.getTime());
  return times.length > 0 ? new Date(Math.min(...times)) : null;
}

/** A day of the plot as a date, where there are dates. */
export function dateOf({ startsAt }: Pick<ReadyView, "startsAt">, day: number): Date | null {
  return startsAt && dayAfter(startsAt, day);
}
