import { z } from "zod";
import {
  type LegGrain,
  type LegSection,
  type LegTurn,
  leastTurn,
  legGrain,
  straightFromDeg,
  turnToDiagonal,
} from "#app/core/rings/leg.ts";
import type { RingField } from "#app/core/rings/ring-types.ts";
import { lengthField } from "#app/domain/shop/length-field.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { type Asked, ask, inUnits, type ShopForCalculators } from "./ask.ts";
import { numberField } from "./number-field.ts";
import { type RingBox, ringFields, ringStart, typedField } from "./ring-boxes.ts";

export type LegBox = RingBox | "width" | "thickness" | "legWidth" | "legThickness" | "middle" | "straight";

export interface LegAnswer {
  field: RingField;
  leg: LegSection;
  straightFromDeg: number;
  asItLies: LegGrain;
  diagonal: LegTurn;
  least: LegTurn | null;
}

/** Looks at the four sides of a leg cut from a board's end, and at turning it; all of it from the page's address. */
export function askLeg(params: URLSearchParams, { units }: ShopForCalculators): Asked<LegBox, LegAnswer> {
  const schema = z
    .object({
      width: lengthField(units, { name: "board's width", leastMm: 5, mostMm: 2000 }),
      thickness: lengthField(units, { name: "board's thickness", leastMm: 5, mostMm: 500 }),
      legWidth: lengthField(units, { name: "leg's width", leastMm: 5, mostMm: 500 }),
      legThickness: lengthField(units, { name: "leg's thickness", leastMm: 5, mostMm: 500 }),
      middle: lengthField(units, { name: "place of the leg's middle", leastMm: 0, mostMm: 2000 }),
      straight: numberField({ name: "least angle", least: 1, most: 45, unit: "degrees" }),
      ...ringFields(units),
    })
    .refine(({ middle, width }) => middle <= width, { path: ["middle"], error: "The leg's middle lies on the board." });
  const start = {
    ...ringStart(units),
    width: inUnits(units, "8", "200"),
    thickness: inUnits(units, "2", "50"),
    legWidth: inUnits(units, "1 1/2", "38"),
    legThickness: inUnits(units, "1 1/2", "38"),
    middle: inUnits(units, "6 3/4", "170"),
    straight: String(straightFromDeg),
    pithDown: inUnits(units, "6", "150"),
  };
  return ask(params, start, schema, (typed) => {
    const field = typedField(typed, { widthMm: typed.width, thicknessMm: typed.thickness });
    const leg: LegSection = {
      middle: { xMm: typed.middle, yMm: typed.thickness / 2 },
      widthMm: typed.legWidth,
      thicknessMm: typed.legThickness,
      turnDeg: 0,
    };
    return {
      field,
      leg,
      straightFromDeg: typed.straight,
      asItLies: legGrain(field, leg, typed.straight),
      diagonal: turnToDiagonal(field, leg, typed.straight),
      least: leastTurn(field, leg, typed.straight),
    };
  });
}

export const legFormula = [
  "a side shows straight grain where the rings meet it at the least angle or more: 1 ÷ sin a is how much it magnifies their wander",
  "with straight rings all four sides are straight where the rings lie between that angle and 90° less it: 30 to 60 is rift",
  "turned by b, stock needs width × sin b + thickness × cos b of thickness",
];

export const legSources: Source[] = [
  { of: "Rift stock shows straight grain on all four sides of a leg", text: "makers", confidence: "practice" },
  { of: "Angles at the four sides, turning", text: "plane geometry of circles", confidence: "derived" },
  {
    of: "The least angle of 30°",
    text: "where flat ends by default; no published figure found",
    confidence: "practice",
  },
  { of: "Rings at 45° move alike on all faces but go diamond", text: "plane strain", confidence: "derived" },
];
