import { requireWithin } from "#app/core/moisture/accepted-range.ts";

/** A count within its limits, else a RangeError that names what was given and what is accepted: there is no half a clamp. */
export function requireWhole(what: string, count: number, low: number, high: number): number {
  if (Number.isFinite(count) && !Number.isInteger(count))
    throw new RangeError(`${what} must be a whole number from ${low} to ${high}; got ${count}.`);
  return requireWithin(what, count, low, high);
}
