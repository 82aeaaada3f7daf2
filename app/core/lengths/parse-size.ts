import { exactMm, mmPerInch } from "./length-unit.ts";
import { type LengthUnit, type ParsedLength, readLength, type SpokenUnit, withinLimits } from "./parse-length.ts";
import { plainText } from "./plain-text.ts";
import { lengthHint } from "./read-number.ts";

/** A board's length as a tally takes it, with the unit it was understood in, so that the screen can say so. */
export type TallyLength = { ok: true; mm: number; understood: SpokenUnit } | { ok: false; why: string };

/** Up to this, a bare length is feet, or metres: lumber is sold in lengths of 4 to 16 ft, and no board is 3.05 mm long. */
const longestSpoken = 20;

const mostLengthMm = 20_000;
const mostWidthMm = 2_000;
const mostAlike = 500;

/**
 * Reads the length of a tally line. A length with its unit is taken at its word. A bare number follows one rule: in an
 * inch shop up to 20 it is feet (`10` is 10 ft, `10 1/2` is 10 ft 6 in), above 20 inches (`126`); in a millimetre shop up
 * to 20 it is metres (`3.05`), above 20 millimetres (`3050`).
 */
export function parseTallyLength(typed: string, unit: LengthUnit): TallyLength {
  const asUnit = readLength(typed, unit);
  if (!asUnit.ok) return asUnit;
  const small: SpokenUnit = unit === "in" ? "ft" : "m";
  const spokenUpToMm = exactMm(longestSpoken * (unit === "in" ? mmPerInch : 1));
  const read = !asUnit.hasUnit && asUnit.mm <= spokenUpToMm ? readLength(typed, small) : asUnit;
  if (!read.ok) return read;
  const judged = withinLimits(read.mm, unit, { mostMm: mostLengthMm }, read.hasUnit);
  return judged.ok ? { ok: true, mm: read.mm, understood: read.unit } : judged;
}

/** Reads the width of a tally line: as any length, but no wider than a slab, 2 m. */
export function parseTallyWidth(typed: string, unit: LengthUnit): ParsedLength {
  const read = readLength(typed, unit);
  if (!read.ok) return read;
  if (read.mm > mostWidthMm)
    return { ok: false, why: "Too wide for a board: the width comes first, then the length, as in 8 1/4 x 10'." };
  return withinLimits(read.mm, unit, {}, read.hasUnit);
}

/** One tally line: how many boards alike, their width and length, and the unit the length was understood in. */
export type ParsedSize =
  | { ok: true; widthMm: number; lengthMm: number; count: number; understood: SpokenUnit }
  | { ok: false; part: "line" | "count" | "width" | "length"; why: string };

/**
 * Reads a tally line: `8 1/4 x 10'6"`, `210 x 3050`, `8.25 × 126`, with a repeat count `3 @ 8 x 10'` or `8 x 10' *3`.
 * The length follows the rule of parseTallyLength.
 *
 * @param units what bare widths and bare lengths are in; some shops measure widths in mm of boards sold by the foot.
 * @returns millimetres and a count of 1 to 500, or which part will not do and what would be right.
 */
export function parseSize(typed: string, units: { width: LengthUnit; length: LengthUnit }): ParsedSize {
  const text = plainText(typed);
  const counted = countPattern.exec(text)?.groups;
  if (counted?.before && counted.after)
    return { ok: false, part: "count", why: "Say how many once: 3 @ 8 x 10' or 8 x 10' *3." };
  const count = Number(counted?.before ?? counted?.after ?? 1);
  if (!(count >= 1 && count <= mostAlike))
    return { ok: false, part: "count", why: `Between 1 and ${mostAlike} boards alike on one line.` };
  const sizes = (counted?.size ?? "").split(/x|\bby\b/).map((size) => size.trim());
  if (sizes.length > 2)
    return { ok: false, part: "line", why: "Width x length only. For three alike write 8 x 10' *3." };
  if (sizes.length < 2)
    return { ok: false, part: "line", why: `Write width x length, as in 8 1/4 x 10'6". ${lengthHint}` };
  const width = parseTallyWidth(sizes[0]!, units.width);
  if (!width.ok) return { ok: false, part: "width", why: width.why };
  const length = parseTallyLength(sizes[1]!, units.length);
  if (!length.ok) return { ok: false, part: "length", why: length.why };
  return { ok: true, widthMm: width.mm, lengthMm: length.mm, count, understood: length.understood };
}

const countPattern = /^(?:(?<before>\d{1,6}) ?(?:@|pcs?\.? ) ?)?(?<size>[^@*]*?)(?: ?\* ?(?<after>\d{1,6}))?$/;
