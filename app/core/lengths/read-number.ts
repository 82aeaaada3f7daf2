/** A number as typed in a length: its value, and how it was written, since only some ways fit beside feet. */
export type ReadNumber = { ok: true; value: number; isWhole: boolean } | { ok: false; why: string };

const refuse = (why: string): ReadNumber => ({ ok: false, why });

/** What a length may look like, for the messages. */
export const lengthHint = `Write it as 8 1/4, 8.25, 7' 2" or 210 mm.`;

/** The characters a number may have. What they spell is judged by readNumber. */
export const numberPattern = String.raw`[\d.,/ -]*\d`;

/**
 * A whole number, a decimal with point or comma, a fraction, or a whole number with a fraction (`8 1/4`, `8-1/4`).
 *
 * @returns the value, or why not: no number, a zero below the line, or a fraction of one or more beside a whole number.
 */
export function readNumber(text: string): ReadNumber {
  const decimal = /^(?:\d+(?:[.,]\d*)?|[.,]\d+)$/.exec(text);
  if (decimal) return { ok: true, value: Number(text.replace(",", ".")), isWhole: /^\d+$/.test(text) };
  const fraction = /^(?:(\d+)(?: ?- ?| ))?(\d+) ?\/ ?(\d+)$/.exec(text);
  if (!fraction) return refuse(`That is not a length. ${lengthHint}`);
  const [, units, top, bottom] = fraction;
  if (Number(bottom) === 0) return refuse("A fraction cannot have a zero below the line: write 1/2, not 1/0.");
  if (units !== undefined && Number(top) >= Number(bottom))
    return refuse(`Beside a whole number the fraction must be less than one; ${top}/${bottom} is not.`);
  return { ok: true, value: Number(units ?? 0) + Number(top) / Number(bottom), isWhole: false };
}
