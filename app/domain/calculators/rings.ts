import { z } from "zod";
import { ringDefinitions } from "#app/core/rings/definitions.ts";
import type { ClassShares, RingClass, RingField } from "#app/core/rings/ring-types.ts";
import { bestStrip, type StripResult, suitingStrips } from "#app/core/rings/strips.ts";
import { angleSummary, classShares, dominantClass } from "#app/core/rings/summary.ts";
import { lengthField, optionalLengthField } from "#app/domain/shop/length-field.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { type Asked, ask, inUnits, type ShopForCalculators } from "./ask.ts";
import { numberField } from "./number-field.ts";
import { type RingBox, ringFields, ringStart, typedField } from "./ring-boxes.ts";

export type RingsBox = RingBox | "width" | "thickness" | "strip" | "least" | "greatest" | "share";

export interface RingsAnswer {
  field: RingField;
  summary: { least: number; greatest: number; mean: number };
  shares: ClassShares;
  ringClass: RingClass;
  /** What each published definition makes of this end; null shares where it names no angles. */
  published: { source: string; shares: ClassShares | null; ringClass: RingClass | null }[];
  strip: StripResult | null;
  /** How many such strips the board gives side by side. */
  stripsSideBySide: number;
}

/** Reads the rings of an end, all of it from the page's address. */
export function askRings(params: URLSearchParams, shop: ShopForCalculators): Asked<RingsBox, RingsAnswer> {
  const { units, classLimits, kerfMm } = shop;
  const angle = (name: string) => numberField({ name, least: 0, most: 90, unit: "degrees" });
  const schema = z
    .object({
      width: lengthField(units, { name: "width", leastMm: 5, mostMm: 2000 }),
      thickness: lengthField(units, { name: "thickness", leastMm: 1, mostMm: 500 }),
      strip: optionalLengthField(units, { name: "width of the strip", leastMm: 2, mostMm: 2000 }),
      least: angle("least angle"),
      greatest: angle("greatest angle"),
      share: numberField({ name: "share", least: 0, most: 100, unit: "%" }),
      ...ringFields(units),
    })
    .refine(({ least, greatest }) => least <= greatest, {
      path: ["greatest"],
      error: "The greatest angle is not below the least.",
    });
  const start = {
    width: inUnits(units, "8", "200"),
    thickness: inUnits(units, "1", "25"),
    strip: inUnits(units, "2 1/4", "57"),
    least: "30",
    greatest: "60",
    share: "90",
    ...ringStart(units),
  };
  return ask(params, start, schema, (typed) => {
    const field = typedField(typed, { widthMm: typed.width, thicknessMm: typed.thickness });
    const demand = {
      widthMm: typed.strip ?? 0,
      window: { leastDeg: typed.least, greatestDeg: typed.greatest },
      leastShare: typed.share / 100,
      kerfMm,
    };
    return {
      field,
      summary: angleSummary(field),
      shares: classShares(field, classLimits),
      ringClass: dominantClass(field, classLimits),
      published: ringDefinitions.map(({ source, limits }) => ({
        source,
        shares: limits && classShares(field, limits),
        ringClass: limits && dominantClass(field, limits),
      })),
      strip: typed.strip === null ? null : bestStrip(field, demand),
      stripsSideBySide: typed.strip === null ? 0 : suitingStrips(field, demand).length,
    };
  });
}

export const ringsFormula = [
  "ring angle at a point = the angle between the wide face and the circle round the pith through that point",
  "0° rings parallel to the face (flat), 90° square to it (quartered); shares are of the end's area",
  "strip: the place across the width with the largest share of its area within the window; then fewer rips; then nearest its middle",
];

export const ringsSources: Source[] = [
  { of: "Angle, shares and strips", text: "plane geometry of circles", confidence: "derived" },
  {
    of: "Flat 0 to 30, rift 30 to 60, quartered 60 to 90 as first limits",
    text: "Architectural Woodwork Standards, ed. 1 (2009), App. B; NHLA Rules Corner, March 2023",
    confidence: "confirmed",
  },
  {
    of: "Two conventions",
    text: "the Wood Handbook and AWS measure the rings to the face, as here; NHLA measures the rays, 90° less",
    confidence: "confirmed",
  },
];
