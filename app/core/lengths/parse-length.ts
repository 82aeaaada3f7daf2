import { exactMm, type LengthUnit, mmPerFoot, mmPerInch } from "./length-unit.ts";
import { plainText } from "./plain-text.ts";
import { printLength } from "./print-length.ts";
import { lengthHint, numberPattern, readNumber } from "./read-number.ts";

export type { LengthUnit } from "./length-unit.ts";

export type ParsedLength = { ok: true; mm: number } | { ok: false; why: string };

/** The unit a length was understood in: as typed, or the shop's where none was typed. */
export type SpokenUnit = "in" | "ft" | "mm" | "cm" | "m";

export interface LengthLimits {
  /** Whether 0 is a length here, as it is for a place along a board. A size of zero is refused unless this is set. */
  zero?: boolean;
  /** The most it may be; 20 m unless told. */
  mostMm?: number;
}

const mmEach: Record<SpokenUnit, number> = { in: mmPerInch, ft: mmPerFoot, mm: 1, cm: 10, m: 1000 };

/** Longer than any board that a truck brings. */
const absurdMm = 20_000;

/** No length takes more characters than this to write. */
const longestText = 40;

/**
 * Reads a length as people write it: `8 1/4`, `8-1/4`, `8.25`, `8,25`, `8 1/4"`, `8¼`, `⅞`, `7' 2"`, `7'`, `7ft 2in`,
 * `86`, `210 mm`, `21 cm`, `3.05 m`.
 *
 * @param typed what was typed. A comma is a decimal comma; where it could as well part thousands (`3,050` mm) the length
 *   is refused and the question put.
 * @param unit the shop's unit, which a number without a unit is in.
 * @param limits whether zero will do, and the most it may be.
 * @returns millimetres, exact to a millionth, or why not and what would be right.
 */
export function parseLength(typed: string, unit: LengthUnit, limits: LengthLimits = {}): ParsedLength {
  const read = readLength(typed, unit);
  return read.ok ? withinLimits(read.mm, unit, limits, read.hasUnit) : read;
}

/** A length with the unit it was understood in, not yet held against any limit. */
export type ReadLength = { ok: true; mm: number; unit: SpokenUnit; hasUnit: boolean } | { ok: false; why: string };

/**
 * Reads a length without judging its size.
 *
 * @param bareUnit the unit of a number that has none.
 */
export function readLength(typed: string, bareUnit: SpokenUnit): ReadLength {
  const text = plainText(typed);
  if (text === "") return { ok: false, why: `Give a length. ${lengthHint}` };
  if (text.length > longestText) return { ok: false, why: `That is not a length. ${lengthHint}` };
  if (text.startsWith("-")) return { ok: false, why: "A length cannot be negative: leave the minus sign out." };
  const feetAndInches = feetPattern.exec(text)?.groups;
  if (feetAndInches) return readFeet(feetAndInches.feet!, feetAndInches.inches);
  const single = singlePattern.exec(text)?.groups;
  if (!single) return { ok: false, why: `That is not a length. ${lengthHint}` };
  const unit = single.unit === undefined ? bareUnit : spokenUnit(single.unit);
  if ((unit === "mm" || unit === "cm") && /^[1-9]\d{0,2},\d{3}$/.test(single.number!)) {
    const [whole, rest] = single.number!.split(",");
    return { ok: false, why: `Is that ${whole}${rest} or ${whole}.${rest} ${unit}? Write it without the comma.` };
  }
  const number = readNumber(single.number!);
  if (!number.ok) return number;
  return { ok: true, mm: exactMm(number.value * mmEach[unit]), unit, hasUnit: single.unit !== undefined };
}

const singlePattern = new RegExp(
  String.raw`^(?<number>${numberPattern}\.?) ?(?<unit>"|in(?:ch(?:es)?)?\.?|mm|cm|m|met(?:er|re)s?)?$`,
);
const feetPattern = new RegExp(
  String.raw`^(?<feet>${numberPattern}) ?(?:'|ft\.?|foot|feet) ?(?:-? ?(?<inches>${numberPattern}) ?(?:"|in(?:ch(?:es)?)?\.?)?)?$`,
);

function spokenUnit(text: string): SpokenUnit {
  if (text === "mm" || text === "cm") return text;
  return text.startsWith("m") ? "m" : "in";
}

function readFeet(feetText: string, inchText: string | undefined): ReadLength {
  const feet = readNumber(feetText);
  if (!feet.ok) return feet;
  if (inchText === undefined) return { ok: true, mm: exactMm(feet.value * mmPerFoot), unit: "ft", hasUnit: true };
  const inches = readNumber(inchText);
  if (!inches.ok) return inches;
  if (!feet.isWhole) return { ok: false, why: `Beside inches the feet must be whole: 7' 6", not 7 1/2' 0".` };
  if (inches.value >= 12) return { ok: false, why: "Beside feet the inches must be less than 12." };
  return { ok: true, mm: exactMm(feet.value * mmPerFoot + inches.value * mmPerInch), unit: "ft", hasUnit: true };
}

/**
 * Holds a length against the limits of its field.
 *
 * @param hasUnit whether a unit was typed; where not, a size fit for millimetres is asked about in an inch shop.
 */
export function withinLimits(
  mm: number,
  unit: LengthUnit,
  { zero = false, mostMm = absurdMm }: LengthLimits,
  hasUnit = true,
): ParsedLength {
  if (mm === 0 && !zero) return { ok: false, why: "A length of zero will not do: give one above zero." };
  if (mm <= mostMm) return { ok: true, mm };
  const asTyped = Math.round(mm / mmPerInch);
  const meant = !hasUnit && unit === "in" && asTyped <= mostMm ? ` For millimetres write ${asTyped} mm.` : "";
  return { ok: false, why: `At most ${printLimit(mostMm, unit)}: check the figure.${meant}` };
}

function printLimit(mostMm: number, unit: LengthUnit): string {
  if (unit === "mm")
    return mostMm >= 10_000 ? `${printLength(mostMm / 1000, "mm")} m` : `${printLength(mostMm, "mm")} mm`;
  const feet = Math.floor(exactMm(mostMm / mmPerFoot));
  return feet >= 10 ? `${feet} ft` : `${printLength(mostMm, "in")} in`;
}
