import { z } from "zod";
import { isSpeciesCode, type Species, speciesByCode } from "#app/core/species/species.ts";

interface NumberOptions {
  /** What the message calls it: "humidity". */
  name: string;
  least: number;
  most: number;
  /** Behind the figures in the message: "%". */
  unit?: string;
  /** Whole numbers only. */
  whole?: boolean;
}

/** A number in a form, with point or comma. The message says what would be right. */
export function numberField(options: NumberOptions) {
  return z.string().transform((typed, context) => readNumber(typed, options, context) ?? z.NEVER);
}

/** The same, null when left empty. */
export function optionalNumberField(options: NumberOptions) {
  return z
    .string()
    .transform((typed, context) => (typed.trim() === "" ? null : (readNumber(typed, options, context) ?? z.NEVER)));
}

function readNumber(
  typed: string,
  { name, least, most, unit = "", whole = false }: NumberOptions,
  context: z.RefinementCtx,
): number | undefined {
  const text = typed.trim().replace("−", "-").replace(",", ".");
  const value = /^[+-]?(\d+\.?\d*|\.\d+)$/.test(text) ? Number(text) : Number.NaN;
  const fits = value >= least && value <= most && (!whole || Number.isInteger(value));
  if (fits) return value;
  const kind = whole ? "a whole number" : "a number";
  context.addIssue({
    code: "custom",
    message: `Give the ${name} as ${kind} from ${least} to ${most}${unit ? ` ${unit}` : ""}.`,
  });
  return undefined;
}

/** A shipped species by its code. */
export function speciesField() {
  return z
    .string()
    .refine(isSpeciesCode, "Choose a species from the list.")
    .transform((code) => speciesByCode(code) as Species);
}
