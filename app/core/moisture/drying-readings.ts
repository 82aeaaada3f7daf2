import { requireMoisture } from "./accepted-range.ts";

/** One reading of a board: when (a Date, or a number of days on any scale) and the corrected moisture in percent. */
export interface DryingReading {
  at: Date | number;
  moisturePct: number;
}

/** Readings in order, days counted from the first one that is used. */
export interface Series {
  days: number[];
  moisturesPct: number[];
  /** Position of each used reading in the list that was given. */
  from: number[];
  /** Readings above 30 %, which no hand meter follows and no approach to equilibrium describes. */
  leftOut: number;
}

const msPerDay = 86_400_000;

/** Days on a common scale: a number stays itself, a Date becomes days since 1970. */
export function toDays(at: Date | number): number {
  const days = at instanceof Date ? at.getTime() / msPerDay : at;
  if (Number.isFinite(days)) return days;
  throw new RangeError("A reading's time must be a valid date or a finite number of days.");
}

/** The date `days` after `at`. */
export function dayAfter(at: Date, days: number): Date {
  return new Date(at.getTime() + days * msPerDay);
}

/** Sorts readings by time and sets aside those above 30 %. RangeError for a bad moisture or a mix of dates and days. */
export function toSeries(readings: readonly DryingReading[]): Series {
  if (new Set(readings.map(({ at }) => at instanceof Date)).size > 1) {
    throw new RangeError("Give the times of readings either all as dates or all as days.");
  }
  const all = readings.map(({ at, moisturePct }, index) => ({
    day: toDays(at),
    moisturePct: requireMoisture("Reading", moisturePct),
    index,
  }));
  const used = all.filter(({ moisturePct }) => moisturePct <= 30).sort((a, b) => a.day - b.day);
  const start = used[0]?.day ?? 0;
  return {
    days: used.map(({ day }) => day - start),
    moisturesPct: used.map(({ moisturePct }) => moisturePct),
    from: used.map(({ index }) => index),
    leftOut: all.length - used.length,
  };
}
