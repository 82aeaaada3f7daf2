import { type LengthUnit, type ParsedLength, readLength, type SpokenUnit } from "#app/core/lengths/parse-length.ts";
import { parseTallyLength, parseTallyWidth } from "#app/core/lengths/parse-size.ts";
import { plainText } from "#app/core/lengths/plain-text.ts";

/** A size written in one go, cut into its boxes. */
export interface SplitSize {
  count?: string;
  quarters?: string;
  width: string;
  length: string;
}

const counted = /^(?:(?<before>\d+) ?(?:@|pcs?\.? |pieces )(?: ?of )? ?)?(?<size>[^@*]*?)(?: ?\* ?(?<after>\d+))?$/;

/**
 * Cuts a whole size into its boxes, each still as typed: `8 1/4 x 10'6"`, `210 x 3050`, `3 @ 8 x 10'`, `8 x 10' *3`, `5/4 x 8 x 10'`.
 *
 * @returns null when the text is not a whole size, such as a width alone.
 */
export function splitSize(typed: string): SplitSize | null {
  const { before, size, after } = counted.exec(plainText(typed))?.groups ?? {};
  if (size === undefined || (before && after)) return null;
  const parts = size.split(/x|\bby\b/).map((part) => part.trim());
  const quarters = parts.length === 3 ? /^(\d+) ?\/ ?4$/.exec(parts[0] ?? "")?.[1] : undefined;
  const [width, length, ...more] = quarters ? parts.slice(1) : parts;
  if (width === undefined || length === undefined || more.length > 0) return null;
  const count = before ?? after;
  return { ...(count ? { count } : {}), ...(quarters ? { quarters } : {}), width, length };
}

/** A bare width over this many is not inches: no board is 5 ft wide. */
const widestInches = 60;

/** The unit a text names itself, by a sign or by being a fraction; null for a bare figure. */
function namedUnit(text: string): LengthUnit | null {
  const read = readLength(text, "mm");
  if (!read.ok) return null;
  if (read.hasUnit) return read.unit === "in" || read.unit === "ft" ? "in" : "mm";
  return plainText(text).includes("/") ? "in" : null;
}

/** In which units bare figures of one board are meant: by its other figure and what a board can measure, else the shop's. */
function bareUnits(width: string, length: string, shopUnit: LengthUnit): { width: LengthUnit; length: LengthUnit } {
  const named = namedUnit(length);
  const metric = Number.parseFloat(width.replace(",", ".")) > widestInches || (shopUnit === "mm" && named !== "in");
  const widthUnit = namedUnit(width) ?? (metric ? "mm" : "in");
  return { width: widthUnit, length: named ?? widthUnit };
}

/** A width, or the widths at both ends of a board that tapers: `9 to 7`. */
function ends(width: string): string[] {
  return width.split(/\s+to\s+|\s*→\s*/i).map((end) => end.trim());
}

export interface ReadSize {
  width: ParsedLength;
  /** Width at the far end; null where the board does not taper. */
  widthFar: ParsedLength | null;
  length: ParsedLength;
}

/** Reads the width and length of one board, each as typed, together: a bare figure takes its unit from the other. */
export function readSize(width: string, length: string, shopUnit: LengthUnit): ReadSize {
  const [near = "", far, ...more] = ends(width);
  const units = bareUnits(near, length, shopUnit);
  return {
    width: more.length > 0 ? { ok: false, why: "Two ends at most: 9 to 7." } : parseTallyWidth(near, units.width),
    widthFar: far === undefined ? null : parseTallyWidth(far, units.width),
    length: parseTallyLength(length, units.length),
  };
}

const signs: Record<SpokenUnit, string> = { in: '"', ft: "'", mm: " mm", cm: " cm", m: " m" };

/**
 * Width and length with the unit of each bare figure written out where the shop's unit does not say it, so that a person sees how it was read:
 * in a shop of inches `8` by `10` becomes `8` by `10'`, and `210` by `3050` becomes `210 mm` by `3050 mm`. Reading the result again changes nothing.
 */
export function spellOut(width: string, length: string, shopUnit: LengthUnit): { width: string; length: string } {
  const units = bareUnits(ends(width)[0] ?? "", length, shopUnit);
  const read = parseTallyLength(length, units.length);
  const isPlain = !read.ok || (read.understood === "mm" && shopUnit === "mm");
  return {
    width:
      units.width === shopUnit
        ? width.trim()
        : ends(width)
            .map((end) => signed(end, units.width))
            .join(" to "),
    length: isPlain ? length.trim() : signed(length, read.understood),
  };
}

/** A bare figure with a unit's sign behind it; any other text as it is. */
function signed(text: string, unit: SpokenUnit): string {
  const read = readLength(text, unit);
  return read.ok && !read.hasUnit ? `${text.trim()}${signs[unit]}` : text.trim();
}
