import { z } from "zod";
import { type LengthUnit, parseLength } from "#app/core/lengths/parse-length.ts";

interface LengthOptions {
  /** What the message calls it: "length", "width". */
  name: string;
  leastMm?: number;
  mostMm?: number;
}

/** A length in a form: typed the way people write it, in the shop's units, millimetres out. */
export function lengthField(unit: LengthUnit, options: LengthOptions) {
  return z
    .string({ error: `Give the ${options.name}.` })
    .transform((typed, context) => readLength(typed, unit, options, context) ?? z.NEVER);
}

/** The same, null when left empty. */
export function optionalLengthField(unit: LengthUnit, options: LengthOptions) {
  return z
    .string()
    .default("")
    .transform((typed, context) =>
      typed.trim() === "" ? null : (readLength(typed, unit, options, context) ?? z.NEVER),
    );
}

function readLength(
  typed: string,
  unit: LengthUnit,
  { name, leastMm = 0.1, mostMm = 20_000 }: LengthOptions,
  context: z.RefinementCtx,
): number | undefined {
  const parsed = parseLength(typed, unit, { zero: leastMm === 0 });
  if (parsed.ok && parsed.mm >= leastMm && parsed.mm <= mostMm) return parsed.mm;
  context.addIssue({ code: "custom", message: parsed.ok ? `That cannot be the ${name} here.` : parsed.why });
  return undefined;
}
