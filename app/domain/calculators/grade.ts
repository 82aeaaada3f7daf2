import { z } from "zod";
import type { FaceArea } from "#app/core/grade/clear-cuttings.ts";
import { type BoardGrade, gradeBoard } from "#app/core/grade/grade-board.ts";
import { type LengthUnit, parseLength } from "#app/core/lengths/parse-length.ts";
import { lengthField } from "#app/domain/shop/length-field.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { type Asked, ask, inUnits, type ShopForCalculators } from "./ask.ts";

export type GradeBox = "width" | "length" | "heart" | "bark";

export interface GradeAnswer {
  widthMm: number;
  lengthMm: number;
  heartFace: FaceArea[];
  barkFace: FaceArea[];
  graded: BoardGrade;
}

const mostDefects = 40;

/** Defects a line each: along, across, long, wide. */
function defectsField(unit: LengthUnit) {
  return z.string().transform((text, context): FaceArea[] => {
    const areas: FaceArea[] = [];
    for (const line of text
      .split("\n")
      .map((one) => one.trim())
      .filter(Boolean)) {
      const sizes = line.split(/\s*[,;]\s*/).map((part) => parseLength(part, unit, { zero: true }));
      const [along, across, long, wide] = sizes.map((size) => (size.ok ? size.mm : null));
      const whole =
        sizes.length === 4 && along != null && across != null && long != null && wide != null && long > 0 && wide > 0;
      if (!whole || areas.length === mostDefects) {
        const message = whole
          ? `At most ${mostDefects} defects.`
          : `“${line.slice(0, 40)}”: four sizes with commas between, such as 30, 2, 4, 1 1/2.`;
        context.addIssue({ code: "custom", message });
        return z.NEVER;
      }
      areas.push({ alongMm: along, acrossMm: across, lengthMm: long, widthMm: wide });
    }
    return areas;
  });
}

/** Which grades a board's faces could make, from its size and the defects typed. */
export function askGrade(params: URLSearchParams, { units }: ShopForCalculators): Asked<GradeBox, GradeAnswer> {
  const schema = z.object({
    width: lengthField(units, { name: "width", leastMm: 40, mostMm: 1_000 }),
    length: lengthField(units, { name: "length", leastMm: 300, mostMm: 6_000 }),
    heart: defectsField(units),
    bark: defectsField(units),
  });
  const start = {
    width: inUnits(units, "8", "205"),
    length: inUnits(units, "12'", "3660"),
    heart: "",
    bark: inUnits(units, "36, 3, 5, 2\n96, 2, 5, 3", "914, 76, 127, 51\n2438, 51, 127, 76"),
  };
  return ask(params, start, schema, ({ width, length, heart, bark }) => {
    for (const area of [...heart, ...bark])
      if (area.alongMm + area.lengthMm > length + 1 || area.acrossMm + area.widthMm > width + 1)
        throw new RangeError("A defect lies past the edge of the board.");
    const graded = gradeBoard({ widthMm: width, lengthMm: length, heartFace: heart, barkFace: bark });
    return { widthMm: width, lengthMm: length, heartFace: heart, barkFace: bark, graded };
  });
}

export const gradeFormula = [
  "surface measure = width in inches × length in whole feet ÷ 12, rounded",
  "units of a cutting = its width in inches × its length in feet",
  "a face makes a grade when clear cuttings, none smaller and no more than it allows, hold the units it asks of the surface measure",
  "FAS asks for SM × 10, No. 1 Common × 8, No. 2A and 2B × 6, No. 3A × 4, No. 3B × 3; one cutting more for more units within limits",
];

export const gradeSources: Source[] = [
  {
    of: "No. 1 and 2A Common, cutting sizes, yields",
    text: "American Hardwood Export Council, grading guide",
    confidence: "confirmed",
  },
  {
    of: "FAS, extra cuttings, number of cuttings",
    text: "NHLA summary chart as trade reprints give it",
    confidence: "confirmed-secondary",
  },
  { of: "A division drops its fraction", text: "NHLA rules", confidence: "memory" },
  {
    of: "FAS One Face, Selects",
    text: "NHLA summary chart as trade reprints give it",
    confidence: "confirmed-secondary",
  },
];
