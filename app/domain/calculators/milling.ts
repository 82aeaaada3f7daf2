import { z } from "zod";
import { type Caution, cautionsFor } from "#app/core/blanks/cautions.ts";
import { type MillingSheet, millingSheet } from "#app/core/blanks/milling.ts";
import { planerPasses, type Resawing, resawing } from "#app/core/blanks/passes.ts";
import { lengthField } from "#app/domain/shop/length-field.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { type Asked, ask, inUnits, type ShopForCalculators } from "./ask.ts";
import { speciesField } from "./number-field.ts";

export type MillingBox =
  | "species"
  | "thickness"
  | "width"
  | "length"
  | "stock"
  | "addLength"
  | "addWidth"
  | "addThickness"
  | "joint"
  | "pass"
  | "blade"
  | "leave";

export interface MillingAnswer {
  sheet: MillingSheet;
  passes: number;
  saw: Resawing | null;
  /** For each step, in order. */
  cautions: Caution[][];
  wood: Caution[];
}

/** A part's sizes from rough to finished, planer against saw, and the cautions each size calls for. */
export function askMilling(params: URLSearchParams, shop: ShopForCalculators): Asked<MillingBox, MillingAnswer> {
  const { units } = shop;
  const size = (name: string, leastMm: number, mostMm: number) => lengthField(units, { name, leastMm, mostMm });
  const schema = z.object({
    species: speciesField(),
    thickness: size("finished thickness", 2, 400),
    width: size("finished width", 5, 1_500),
    length: size("finished length", 20, 6_000),
    stock: size("stock's measured thickness", 3, 200),
    addLength: size("allowance in length", 0, 500),
    addWidth: size("allowance in width", 0, 100),
    addThickness: size("allowance in thickness", 0, 50),
    joint: size("jointing of a face", 0, 20),
    pass: size("depth of a planer pass", 0.1, 6),
    blade: size("height the saw cuts", 10, 600),
    leave: size("what is left for the planer", 0, 20),
  });
  const start = {
    species: "white-oak",
    thickness: inUnits(units, "1 1/2", "38"),
    width: inUnits(units, "3 5/8", "92"),
    length: inUnits(units, "42", "1070"),
    stock: inUnits(units, "1", "26"),
    addLength: inUnits(units, "1", "25"),
    addWidth: inUnits(units, "1/8", "3"),
    addThickness: inUnits(units, "1/4", "6"),
    joint: inUnits(units, "1/32", "1"),
    pass: inUnits(units, "1/40", "0.6"),
    blade: inUnits(units, "3 1/8", "79"),
    leave: inUnits(units, "1/16", "2"),
  };
  return ask(params, start, schema, (typed) => {
    const finished = { lengthMm: typed.length, widthMm: typed.width, thicknessMm: typed.thickness };
    const allow = {
      lengthMm: typed.addLength,
      widthMm: typed.addWidth,
      thicknessMm: typed.addThickness,
      jointPerFaceMm: typed.joint,
    };
    const sheet = millingSheet(finished, typed.stock, allow);
    if (!sheet) throw new RangeError("Twelve plies of that stock do not make the thickness.");
    const takeOff = sheet.plies.toTakeOffMm;
    const saw = resawing(takeOff, typed.width, typed.blade, shop.kerfMm, typed.leave);
    const { dust, trade } = typed.species;
    return {
      sheet,
      passes: planerPasses(takeOff, typed.pass),
      saw,
      cautions: sheet.steps.map(({ step, size: piece }) => cautionsFor(situationOf(step, piece, shop))),
      wood: cautionsFor({
        dust,
        trade,
        ...(saw ? { resawing: true, rip: { heightMm: typed.width, bladeHeightMm: typed.blade } } : {}),
      }),
    };
  });
}

/** Which machine a step goes to. */
function situationOf(
  step: MillingSheet["steps"][number]["step"],
  piece: { lengthMm: number; widthMm: number; thicknessMm: number },
  shop: ShopForCalculators,
) {
  if (step.startsWith("joint"))
    return {
      piece,
      jointer: { minLengthMm: shop.jointerMinLengthMm, maxWidthMm: shop.jointerMaxWidthMm },
      planer: { minLengthMm: 0, maxWidthMm: Number.POSITIVE_INFINITY },
    };
  if (step === "plane to thickness")
    return {
      piece,
      jointer: { minLengthMm: 0, maxWidthMm: Number.POSITIVE_INFINITY },
      planer: { minLengthMm: shop.planerMinLengthMm, maxWidthMm: shop.planerMaxWidthMm },
    };
  return {};
}

export const millingFormula = [
  "rough = finished + allowances; length is cut last",
  "plies as for a glue-up: each glue face loses its jointing",
  "planer passes = what is taken off ÷ depth of a pass, rounded up",
  "saw passes = width ÷ height the blade cuts, rounded up, at most two; then the planer takes what was left for it",
];

export const millingSources: Source[] = [
  {
    of: "Allowances +1/4 in width, +1/2 in length, 1/8 in thickness",
    text: "Ira S. Griffith, Advanced Projects in Woodwork (1912)",
    confidence: "confirmed",
  },
  { of: "Rough-mill, rest, then mill to size", text: "benches", confidence: "practice" },
  {
    of: "Least sizes for jointer and planer",
    text: "school and shop rules, machine manuals as quoted",
    confidence: "confirmed-secondary",
  },
  { of: "Guards, riving knife, push blocks", text: "29 CFR 1910.213 and OSHA 3157", confidence: "memory" },
];
