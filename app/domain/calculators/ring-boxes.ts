import { z } from "zod";
import { type LengthUnit, parseLength } from "#app/core/lengths/parse-length.ts";
import { fieldFromAngle } from "#app/core/rings/field-from-angle.ts";
import type { RingField } from "#app/core/rings/ring-types.ts";
import { fieldFromPith } from "#app/core/rings/stations.ts";
import { inUnits } from "./ask.ts";
import { numberField } from "./number-field.ts";

/** The boxes that say how a board's rings run: by an angle, or by where the pith lies. */
export type RingBox = "rings" | "angle" | "falls" | "pithAcross" | "pithDown";

/** A place that may lie beyond an edge: a length with or without a minus sign. */
function placeField(units: LengthUnit, name: string) {
  return z.string().transform((typed, context) => {
    const text = typed.trim().replace("−", "-");
    const parsed = parseLength(text.replace(/^-\s*/, ""), units, { zero: true, mostMm: 20_000 });
    if (parsed.ok) return text.startsWith("-") ? -parsed.mm : parsed.mm;
    context.addIssue({ code: "custom", message: `${parsed.why} With a minus sign it lies beyond the ${name}.` });
    return z.NEVER;
  });
}

/** The fields of a schema that read the ring boxes. */
export function ringFields(units: LengthUnit) {
  return {
    rings: z.enum(["pith", "angle"], "Choose how the rings are known."),
    angle: numberField({ name: "ring angle", least: 0, most: 90, unit: "degrees" }),
    falls: z.enum(["right", "left"], "Choose the side to which the rings fall."),
    pithAcross: placeField(units, "left edge"),
    pithDown: placeField(units, "top face"),
  };
}

/** What the boxes start from: rings round a pith under the middle of an 8 in board. */
export function ringStart(units: LengthUnit): Record<RingBox, string> {
  return {
    rings: "pith",
    angle: "45",
    falls: "right",
    pithAcross: inUnits(units, "4", "100"),
    pithDown: inUnits(units, "4 1/2", "115"),
  };
}

interface TypedRings {
  rings: "pith" | "angle";
  angle: number;
  falls: "right" | "left";
  pithAcross: number;
  pithDown: number;
}

/** The rings of an end of this size, as typed. */
export function typedField(typed: TypedRings, size: { widthMm: number; thicknessMm: number }): RingField {
  if (typed.rings === "angle") return fieldFromAngle(size, typed.angle, typed.falls);
  return fieldFromPith(size, { xMm: typed.pithAcross, yMm: typed.pithDown });
}
