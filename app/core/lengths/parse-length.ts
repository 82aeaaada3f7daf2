/** The two ways a shop writes sizes. Lengths are kept in millimetres whatever is typed. */
export type LengthUnit = "in" | "mm";

export type ParsedLength = { ok: true; mm: number } | { ok: false; why: string };

export const mmPerInch = 25.4;
const mmPerFoot = 304.8;

const vulgar: Record<string, string> = {
  "½": "1/2",
  "⅓": "1/3",
  "⅔": "2/3",
  "¼": "1/4",
  "¾": "3/4",
  "⅛": "1/8",
  "⅜": "3/8",
  "⅝": "5/8",
  "⅞": "7/8",
};

const metric: Record<string, number> = { mm: 1, cm: 10, m: 1000 };

/**
 * Reads a length as people write it: `8 1/4`, `8-1/4`, `8.25`, `8,25`, `8¼`, `7' 2"`, `7ft 2in`, `86`, `210 mm`, `21 cm`.
 *
 * @param typed what was typed; a number without a unit is in the shop's.
 * @param unit the shop's unit.
 * @returns millimetres, or why not and what would be right. Nothing is rounded.
 */
export function parseLength(typed: string, unit: LengthUnit): ParsedLength {
  const text = typed
    .trim()
    .toLowerCase()
    .replace(/[½⅓⅔¼¾⅛⅜⅝⅞]/g, (sign) => ` ${vulgar[sign]}`)
    .replace(/[″”]|''/g, '"')
    .replace(/[′’]/g, "'")
    .replace(/⁄/g, "/")
    .replace(/\s+/g, " ");
  if (text === "") return { ok: false, why: "Give a length." };
  if (text.startsWith("-") || text.startsWith("−")) return { ok: false, why: "A length cannot be negative." };
  const match = /^(?<number>[\d.,/ -]+?) ?(?<unit>mm|cm|m)$/.exec(text);
  if (match?.groups)
    return finish(readNumber(match.groups.number as string), metric[match.groups.unit as string] as number, unit);
  const feet =
    /^(?<feet>[\d.,/ -]+?) ?(?:'|ft\.?|feet|foot) ?-? ?(?:(?<inches>[\d.,/ -]+?) ?(?:"|in\.?|inch|inches)?)?$/.exec(
      text,
    );
  if (feet?.groups) {
    const whole = readNumber(feet.groups.feet as string);
    const inches = feet.groups.inches ? readNumber(feet.groups.inches) : 0;
    if (typeof whole === "string") return { ok: false, why: whole };
    if (typeof inches === "string") return { ok: false, why: inches };
    return finish((whole * mmPerFoot + inches * mmPerInch) / mmPerInch, mmPerInch, unit);
  }
  const inches = /^(?<number>[\d.,/ -]+?) ?(?:"|in\.?|inch|inches)$/.exec(text);
  if (inches?.groups) return finish(readNumber(inches.groups.number as string), mmPerInch, unit);
  return finish(readNumber(text), unit === "in" ? mmPerInch : 1, unit);
}

const absurdMm = 20_000;

function finish(number: number | string, mmEach: number, unit: LengthUnit): ParsedLength {
  if (typeof number === "string") return { ok: false, why: number };
  const mm = number * mmEach;
  if (mm > absurdMm)
    return {
      ok: false,
      why: unit === "in" ? "Longer than 65 ft: check the figure." : "Longer than 20 m: check the figure.",
    };
  return { ok: true, mm };
}

const hint = "Write it as 8 1/4, 8.25, 7' 2\" or 210 mm.";

/** A plain number, a fraction, or a whole number with a fraction; a text is why it is none. */
function readNumber(text: string): number | string {
  const match = /^(?:(?<whole>\d+(?:[.,]\d+)?|[.,]\d+)|(?:(?<units>\d+)[ -]+)?(?<top>\d+) ?\/ ?(?<bottom>\d+))$/.exec(
    text.trim(),
  );
  if (!match?.groups) return `That is not a length. ${hint}`;
  const { whole, units, top, bottom } = match.groups;
  if (whole !== undefined) return Number(whole.replace(",", "."));
  if (Number(bottom) === 0) return "A fraction cannot have a zero below the line.";
  return Number(units ?? 0) + Number(top) / Number(bottom);
}
