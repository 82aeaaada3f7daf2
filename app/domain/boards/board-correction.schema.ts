import { z } from "zod";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import { isSpeciesCode } from "#app/core/species/species.ts";
import { lengthField, optionalLengthField } from "#app/domain/shop/length-field.ts";
import { moneyField } from "#app/domain/shop/money.ts";
import { boardEdges, boardSurfaces, figureKinds } from "./board.ts";

/** Every field of a board that is corrected in place, as stored. */
export interface BoardCorrection {
  species: string;
  quarters: number;
  thicknessMm: number;
  lengthMm: number;
  widthMm: number;
  widthFarMm: number | null;
  edges: (typeof boardEdges)[number];
  surface: (typeof boardSurfaces)[number];
  grade: string;
  figureKind: string;
  figureStrength: number;
  figureWhere: string;
  sapSharePct: number | null;
  colourNote: string;
  notes: string;
  logName: string;
  logSequence: number | null;
  costMinor: number | null;
}

/** Fields are corrected a group at a time, as they stand together on the page. */
export const correctionGroups = ["wood", "size", "figure", "log", "notes", "cost"] as const;
export type CorrectionGroup = (typeof correctionGroups)[number];

const words = (max: number) => z.string().trim().max(max, `At most ${max} characters.`).default("");

/** The form of one group, reading sizes and money in the shop's own units. */
export function correctionSchema(group: CorrectionGroup, shop: { units: LengthUnit; currency: string }) {
  const unit = shop.units;
  const groups = {
    wood: z.object({
      species: z.string().refine(isSpeciesCode, "Choose a species from the list."),
      quarters: z.coerce.number().int().min(1).max(64),
      grade: words(40),
      edges: z.enum(boardEdges),
      surface: z.enum(boardSurfaces),
    }),
    size: z.object({
      thicknessMm: lengthField(unit, { name: "thickness", leastMm: 3, mostMm: 400 }),
      lengthMm: lengthField(unit, { name: "length", leastMm: 50, mostMm: 12_000 }),
      widthMm: lengthField(unit, { name: "width", leastMm: 10, mostMm: 1_500 }),
      widthFarMm: optionalLengthField(unit, { name: "width at the far end", leastMm: 10, mostMm: 1_500 }),
    }),
    figure: z.object({
      figureKind: z.enum(["", ...figureKinds]).default(""),
      figureStrength: z.coerce.number().int().min(0).max(3).default(0),
      figureWhere: words(120),
      colourNote: words(200),
      sapSharePct: z.coerce.number().int().min(0, "0 to 100.").max(100, "0 to 100.").nullable().default(null),
    }),
    log: z.object({
      logName: words(40),
      logSequence: z.coerce.number().int().min(1).max(500).nullable().default(null),
    }),
    notes: z.object({ notes: words(2000) }),
    cost: z.object({ costMinor: moneyField(shop.currency) }),
  };
  return groups[group] as z.ZodType<Partial<BoardCorrection>>;
}
