import { z } from "zod";
import { type ArmLoad, armLoad, stiffPileShares } from "#app/core/weight/arm-load.ts";
import { type Density, densityOf, greatestMoisturePct, poundsPerBoardFoot } from "#app/core/weight/density.ts";
import { boardMassKg, volumeM3 } from "#app/core/weight/mass.ts";
import { lengthField, optionalLengthField } from "#app/domain/shop/length-field.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { kgFrom } from "#app/domain/weight/mass-text.ts";
import { type Asked, ask, inUnits, type ShopForCalculators } from "./ask.ts";
import { numberField, optionalNumberField, speciesField } from "./number-field.ts";

export type WeightBox =
  | "species"
  | "moisture"
  | "thickness"
  | "width"
  | "widthFar"
  | "length"
  | "count"
  | "arms"
  | "rating";

export interface WeightAnswer {
  species: string;
  moisturePct: number;
  widthMm: number;
  thicknessMm: number;
  count: number;
  boardKg: number;
  stackKg: number;
  volumeM3: number;
  density: Density;
  poundsPerBoardFoot: number;
  greatestMoisturePct: number;
  /** What each arm bears of the stack, kg, from one end to the other; empty for a stack on the floor. */
  arms: ArmLoad[];
}

/** Weighs a board and a stack of it on its arms, all of it from the page's address. */
export function askWeight(params: URLSearchParams, { units }: ShopForCalculators): Asked<WeightBox, WeightAnswer> {
  const most = units === "in" ? 20_000 : 10_000;
  const schema = z.object({
    species: speciesField(),
    moisture: numberField({ name: "moisture", least: 0, most: 300, unit: "%" }),
    thickness: lengthField(units, { name: "thickness", leastMm: 1, mostMm: 500 }),
    width: lengthField(units, { name: "width", mostMm: 2000 }),
    widthFar: optionalLengthField(units, { name: "width at the far end", mostMm: 2000 }),
    length: lengthField(units, { name: "length", leastMm: 10 }),
    count: numberField({ name: "number of boards", least: 1, most: 1000, whole: true }),
    arms: optionalNumberField({ name: "number of arms", least: 2, most: 20, whole: true }),
    rating: optionalNumberField({ name: "rating of one arm", least: 1, most, unit: units === "in" ? "lb" : "kg" }),
  });
  // The worked example of an 8/4 sugar maple board of 8 bf at 8 %.
  const start = {
    species: "sugar-maple",
    moisture: "8",
    thickness: inUnits(units, "2", "50"),
    width: inUnits(units, "6", "150"),
    widthFar: "",
    length: inUnits(units, "8'", "2440"),
    count: "12",
    arms: "3",
    rating: "",
  };
  return ask(params, start, schema, (typed) => {
    const piece = {
      species: typed.species,
      moisturePct: typed.moisture,
      lengthMm: typed.length,
      widthMm: typed.width,
      widthFarMm: typed.widthFar,
      thicknessMm: typed.thickness,
    };
    const density = densityOf(typed.species, typed.moisture);
    const boardKg = boardMassKg(piece);
    const basic = typed.species.specificGravity?.basic ?? null;
    if (!density || boardKg === null || basic === null)
      throw new RangeError(`No specific gravity is published for ${typed.species.commonName}.`);
    const stackKg = boardKg * typed.count;
    const ratedKg = typed.rating === null ? null : kgFrom(typed.rating, units);
    const shares = typed.arms === null ? [] : stiffPileShares(typed.arms);
    return {
      species: typed.species.code,
      moisturePct: typed.moisture,
      widthMm: typed.width,
      thicknessMm: typed.thickness,
      count: typed.count,
      boardKg,
      stackKg,
      volumeM3: volumeM3(piece) * typed.count,
      density,
      poundsPerBoardFoot: poundsPerBoardFoot(density.densityKgM3),
      greatestMoisturePct: greatestMoisturePct(basic),
      arms: shares.map((share) => armLoad({ massKg: stackKg * share, weighed: typed.count, unknown: 0 }, ratedKg)),
    };
  });
}

export const weightFormula = [
  "density = 1000 × G × (1 + M/100) kg/m³, G on the volume at moisture M",
  "G = G_basic ÷ (1 − S/100), S = S₀ (1 − M/30), zero from 30 % up; S₀ = 26.5 × G_basic where none is published",
  "lb per board foot = density × 0.062428 ÷ 12",
  "arms: reactions of a stiff, even beam on evenly spaced supports; three bear 3/16, 5/8 and 3/16",
];

export const weightSources: Source[] = [
  { of: "Density", text: "Wood Handbook FPL-GTR-282 (2021), Eq. 4-9, 4-11, 4-14", confidence: "confirmed" },
  { of: "Shrinkage where none is published", text: "Wood Handbook, Eq. 4-12 (Stamm 1964)", confidence: "confirmed" },
  { of: "Share of each arm", text: "equation of three moments", confidence: "derived" },
  {
    of: "Single boards stray 10 % and more",
    text: "variation of specific gravity, Wood Handbook chapter 5",
    confidence: "memory",
  },
  { of: "Arm spacing 24 to 32 in keeps 4/4 flat", text: "makers", confidence: "practice" },
];
