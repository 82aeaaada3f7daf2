import { z } from "zod";
import { mmPerFoot } from "#app/core/lengths/length-unit.ts";
import { nominalThicknessMm } from "#app/core/lengths/quarters.ts";
import { bundleTally } from "#app/core/measure/bundle-tally.ts";
import { countedThicknessIn, type MeasuredBoard, tallyWidthMm } from "#app/core/measure/measured-board.ts";
import { surfaceMeasureFt2 } from "#app/core/measure/surface-measure.ts";
import { type Measure, tally } from "#app/core/measure/tally.ts";
import { trueBoardFeet } from "#app/core/measure/true-volume.ts";
import { lengthField, optionalLengthField } from "#app/domain/shop/length-field.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { type Asked, ask, inUnits, type ShopForCalculators } from "./ask.ts";
import { numberField } from "./number-field.ts";

export type MeasureBox = "quarters" | "width" | "widthFar" | "length" | "thickness" | "count" | "lengths";

export interface MeasureAnswer {
  board: MeasuredBoard;
  count: number;
  /** The width it is tallied by, a third from the narrow end. */
  tallyWidthMm: number;
  isTapered: boolean;
  /** One board's surface measure before rounding. */
  eachFt2: number;
  countedFeet: number;
  countedThicknessIn: number;
  measure: Measure;
  bundle: { widthIn: number; boardFeet: number };
  trueBoardFeet: number;
  beyond: string[];
}

function schema(units: ShopForCalculators["units"]) {
  return z.object({
    quarters: numberField({ name: "thickness in quarters", least: 1, most: 40, unit: "quarters", whole: true }),
    width: lengthField(units, { name: "width", mostMm: 2000 }),
    widthFar: optionalLengthField(units, { name: "width at the far end", mostMm: 2000 }),
    length: lengthField(units, { name: "length", leastMm: 25 }),
    thickness: optionalLengthField(units, { name: "measured thickness", mostMm: 300 }),
    count: numberField({ name: "number of boards", least: 1, most: 1000, whole: true }),
    lengths: z.enum(["whole", "measured"], "Choose how lengths count."),
  });
}

/** Measures boards alike from the page's address. The bare page measures AHEC's own example. */
export function askMeasure(params: URLSearchParams, { units }: ShopForCalculators): Asked<MeasureBox, MeasureAnswer> {
  const start = {
    quarters: "8",
    width: inUnits(units, "6 1/4", "158.8"),
    widthFar: "",
    length: inUnits(units, "8'", "2440"),
    thickness: "",
    count: "1",
    lengths: "whole",
  };
  return ask(params, start, schema(units), (typed) => {
    const board: MeasuredBoard = {
      quarters: typed.quarters,
      widthMm: typed.width,
      widthFarMm: typed.widthFar,
      lengthMm: typed.length,
      thicknessMm: typed.thickness,
    };
    const lengths = typed.lengths === "whole" ? "whole feet" : "as measured";
    const line = { ...board, count: typed.count };
    const counted = lengths === "whole feet" ? Math.floor(typed.length / mmPerFoot + 1e-4) : typed.length / mmPerFoot;
    return {
      board,
      count: typed.count,
      tallyWidthMm: tallyWidthMm(board),
      isTapered: typed.widthFar !== null && typed.widthFar !== typed.width,
      eachFt2: surfaceMeasureFt2(board, lengths),
      countedFeet: counted,
      countedThicknessIn: countedThicknessIn(typed.quarters),
      measure: tally([line], { lengths }),
      bundle: bundleTally([line]),
      trueBoardFeet: typed.count * trueBoardFeet(board),
      beyond: remarks(board, counted),
    };
  });
}

function remarks(board: MeasuredBoard, countedFeet: number): string[] {
  const said: string[] = [];
  if (board.quarters < 4) said.push("Stock under 4/4 is counted as an inch thick; its true volume is less.");
  if (countedFeet < 4) said.push("Standard lengths are 4 to 16 ft: a shorter board is not sold by this tally.");
  if (countedFeet > 16) said.push("Standard lengths are 4 to 16 ft; this board is longer.");
  if (board.thicknessMm != null && board.thicknessMm > nominalThicknessMm(board.quarters) * 1.15)
    said.push("The measured thickness is well over the nominal one: check the quarters.");
  return said;
}

export const measureFormula = [
  "surface measure = width (in) × length (ft) ÷ 12, rounded to whole ft²; exact halves alternately up and down",
  "board feet = surface measure × nominal thickness (in); under 4/4 counts as 1 in",
  "tapered: width = narrow end + ⅓ × (wide end − narrow end)",
  "m³ = thickness × mean width × length, nothing rounded; 1 m³ = 423.776 bf",
];

export const measureSources: Source[] = [
  {
    of: "Surface measure",
    text: "AHEC grading guide, Measurement; NHLA Rules 2015 p. 7 para. 16",
    confidence: "confirmed",
  },
  { of: "Board feet by surface measure", text: "NHLA Rules 2023 p. 9 para. 18", confidence: "confirmed" },
  {
    of: "Lengths down to whole feet, half inches of width alternately",
    text: "AHEC, Measurement",
    confidence: "confirmed",
  },
  { of: "Half feet alternately", text: "NHLA, Measurement & Tally", confidence: "memory" },
  { of: "Tapered boards", text: "NHLA, General Instructions", confidence: "memory" },
  { of: "Surface measure wins a dispute over an end tally", text: "NHLA Rules Corner", confidence: "confirmed" },
  { of: "Under 4/4 counts as 1 in", text: "hardwood-handbook glossary; Griffith 1912", confidence: "confirmed" },
];
