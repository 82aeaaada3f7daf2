/**
 * The one way these modules (moisture, movement, weight) refuse bad input: a RangeError that names the quantity, what
 * was given and what is accepted. NaN and the infinities are always refused. A value that is accepted but lies outside
 * what a formula was published for is no error: the result says so in `outsideRange`.
 */
export function requireWithin(what: string, value: number, low: number, high: number, unit = ""): number {
  if (Number.isFinite(value) && value >= low && value <= high) return value;
  const after = unit ? ` ${unit}` : "";
  throw new RangeError(`${what} must be a number from ${low} to ${high}${after}; got ${value}.`);
}

/** Moisture that any wood can hold, percent of its ovendry mass. Balsa-like woods soak up several times their own mass. */
const moistureLimitPct = 600;

/** A moisture content in percent, refused with a RangeError unless 0 to 600. */
export function requireMoisture(what: string, moisturePct: number): number {
  return requireWithin(what, moisturePct, 0, moistureLimitPct, "%");
}

/** A length in millimetres above zero and no more than 100 m, else a RangeError. */
export function requireSize(what: string, sizeMm: number): number {
  return requireWithin(what, sizeMm, 0.001, 100_000, "mm");
}
