import { z } from "zod";
import { type GlueBatch, glueBatches } from "#app/core/blanks/batches.ts";
import { type Caution, cautionsFor } from "#app/core/blanks/cautions.ts";
import { type ClampPlan, clampsFor, glueGrams, newtonsFromLbf } from "#app/core/blanks/clamps.ts";
import { type GlueLine, glueLines, type PlyPlan, pliesNeeded } from "#app/core/blanks/plies.ts";
import { lengthField } from "#app/domain/shop/length-field.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { type Asked, ask, inUnits, type ShopForCalculators } from "./ask.ts";
import { numberField } from "./number-field.ts";

export type GlueUpBox =
  | "finished"
  | "stock"
  | "joint"
  | "allowance"
  | "width"
  | "length"
  | "fromTop"
  | "pressure"
  | "force"
  | "caul"
  | "blanks"
  | "clamps"
  | "minutes";

export interface GlueUpAnswer {
  finishedMm: number;
  plies: PlyPlan;
  /** As glued, from the top. */
  pliesMm: number[];
  takenTopMm: number;
  lines: GlueLine[];
  clamps: ClampPlan | null;
  glue: { low: number; high: number };
  batches: GlueBatch[];
  tooMany: boolean;
  cautions: Caution[];
}

/** Newtons in one of the shop's units of force: pounds-force, or kilonewtons. */
const forceN = (force: number, units: "in" | "mm") => (units === "in" ? newtonsFromLbf(force) : force * 1000);

/** Plies, glue lines, clamps, glue and batches of alike blanks, all of it from the page's address. */
export function askGlueUp(params: URLSearchParams, { units }: ShopForCalculators): Asked<GlueUpBox, GlueUpAnswer> {
  const schema = z.object({
    finished: lengthField(units, { name: "finished thickness", leastMm: 2, mostMm: 400 }),
    stock: lengthField(units, { name: "stock's measured thickness", leastMm: 3, mostMm: 200 }),
    joint: lengthField(units, { name: "jointing of a face", leastMm: 0, mostMm: 20 }),
    allowance: lengthField(units, { name: "allowance", leastMm: 0, mostMm: 100 }),
    width: lengthField(units, { name: "blank's width", leastMm: 5, mostMm: 1_500 }),
    length: lengthField(units, { name: "blank's length", leastMm: 30, mostMm: 6_000 }),
    fromTop: numberField({ name: "share taken from the top", least: 0, most: 100, unit: "%" }),
    pressure: numberField({ name: "pressure", least: 10, most: 1_500, unit: "psi" }),
    force: numberField({
      name: "force of a clamp",
      least: units === "in" ? 50 : 0.2,
      most: units === "in" ? 10_000 : 45,
      unit: units === "in" ? "lbf" : "kN",
    }),
    caul: lengthField(units, { name: "caul's thickness", leastMm: 0, mostMm: 300 }),
    blanks: numberField({ name: "number of blanks", least: 1, most: 200, whole: true }),
    clamps: numberField({ name: "number of clamps", least: 1, most: 500, whole: true }),
    minutes: numberField({ name: "minutes in clamps", least: 5, most: 3_000 }),
  });
  const start = {
    finished: inUnits(units, "1 1/2", "38"),
    stock: inUnits(units, "1", "26"),
    joint: inUnits(units, "1/32", "1"),
    allowance: inUnits(units, "1/4", "6"),
    width: inUnits(units, "2", "50"),
    length: inUnits(units, "18", "460"),
    fromTop: "50",
    pressure: "175",
    force: inUnits(units, "1000", "4.4"),
    caul: inUnits(units, "1 1/2", "40"),
    blanks: "8",
    clamps: "16",
    minutes: "60",
  };
  return ask(params, start, schema, (typed) => {
    const plies = pliesNeeded({
      finishedMm: typed.finished,
      stockMm: typed.stock,
      jointPerFaceMm: typed.joint,
      allowanceMm: typed.allowance,
    });
    if (!plies) throw new RangeError("Twelve plies of that stock do not make the thickness.");
    const pliesMm = Array.from({ length: plies.plies }, (_, i) =>
      i === 0 || i === plies.plies - 1 ? plies.outerPlyMm : (plies.innerPlyMm ?? plies.outerPlyMm),
    );
    const takenTopMm = (plies.toTakeOffMm * typed.fromTop) / 100;
    const glued = plies.plies > 1;
    const face = { lengthMm: typed.length, widthMm: typed.width };
    const clamps = glued
      ? clampsFor(face, typed.pressure, forceN(typed.force, units), typed.caul + plies.outerPlyMm)
      : null;
    const alike = Array.from({ length: typed.blanks }, (_, i) => ({ id: String(i + 1), clamps: clamps?.clamps ?? 1 }));
    const { batches, tooMany } = clamps
      ? glueBatches(alike, typed.clamps, typed.minutes)
      : { batches: [], tooMany: [] };
    return {
      finishedMm: typed.finished,
      plies,
      pliesMm,
      takenTopMm,
      lines: glueLines(pliesMm, takenTopMm, plies.toTakeOffMm - takenTopMm),
      clamps,
      glue: glueGrams(face, plies.plies - 1),
      batches,
      tooMany: tooMany.length > 0,
      cautions: cautionsFor({ piece: { ...face, thicknessMm: plies.outerPlyMm } }),
    };
  });
}

export const glueUpFormula = [
  "glued = plies × stock − 2 × (plies − 1) × jointing; plies is the least that leaves the finished thickness and the allowance",
  "a glue line lies as deep as the plies above it, less what is taken off the top",
  "force = pressure × width × length; clamps = force ÷ force of one, or length ÷ (2 × pad to glue line), whichever is more",
  "glue = glue lines × area × 170 to 250 g/m²",
  "batches: the most clamps first, each where clamps are left",
];

export const glueUpSources: Source[] = [
  { of: "Pressure, hardwood 175 to 250 psi", text: "makers of PVA glue", confidence: "confirmed-secondary" },
  {
    of: "Pressure by density, 100 to 250 psi",
    text: "Wood Handbook chapter 10, Assembly and Pressing",
    confidence: "memory",
  },
  { of: "Force of clamps", text: "clamp makers' figures as quoted", confidence: "confirmed-secondary" },
  { of: "45° spread from the pad", text: "benches", confidence: "practice" },
  { of: "Spread of 170 to 250 g/m²", text: "makers of PVA glue", confidence: "memory" },
];
