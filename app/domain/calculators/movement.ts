import { z } from "zod";
import { type MovedSection, moveSection } from "#app/domain/movement/section-movement.ts";
import { lengthField } from "#app/domain/shop/length-field.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { type Asked, ask, inUnits, type ShopForCalculators } from "./ask.ts";
import { numberField, speciesField } from "./number-field.ts";
import { type RingBox, ringFields, ringStart, typedField } from "./ring-boxes.ts";

export type MovementBox = RingBox | "species" | "width" | "thickness" | "from" | "to" | "basis";

export interface MovementAnswer {
  species: string;
  moved: MovedSection;
}

/** Moves a board's section from one moisture to another, all of it from the page's address. */
export function askMovement(
  params: URLSearchParams,
  { units }: ShopForCalculators,
): Asked<MovementBox, MovementAnswer> {
  const schema = z.object({
    species: speciesField(),
    width: lengthField(units, { name: "width", leastMm: 5, mostMm: 2000 }),
    thickness: lengthField(units, { name: "thickness", leastMm: 1, mostMm: 500 }),
    from: numberField({ name: "moisture now", least: 0, most: 100, unit: "%" }),
    to: numberField({ name: "moisture later", least: 0, most: 100, unit: "%" }),
    basis: z.enum(["coefficient-table", "shrinkage-table"], "Choose the table."),
    ...ringFields(units),
  });
  const start = {
    species: "northern-red-oak",
    width: inUnits(units, "8", "200"),
    thickness: inUnits(units, "1", "25"),
    from: "12",
    to: "7",
    basis: "coefficient-table",
    ...ringStart(units),
  };
  return ask(params, start, schema, (typed) => {
    const field = typedField(typed, { widthMm: typed.width, thicknessMm: typed.thickness });
    const moved = moveSection({
      field,
      species: typed.species,
      fromPct: typed.from,
      toPct: typed.to,
      basis: typed.basis,
    });
    if (!moved) throw new RangeError(`No shrinkage is published for ${typed.species.commonName}.`);
    return { species: typed.species.code, moved };
  });
}

export const movementFormula = [
  "6 to 14 %: change = size × C × (later − now), C along the rings C_T, across them C_R",
  "otherwise: change = size × (later − now) ÷ (3000/S − 30 + now), S the shrinkage green to ovendry in %, neither moisture above 30 %",
  "at ring angle a: width C_T cos²a + C_R sin²a, thickness C_T sin²a + C_R cos²a, slice by slice across the width",
  "corners leave square by (C_T − C_R) × points × sin 2a; cup from how the rings turn across the width, an upper bound",
];

export const movementSources: Source[] = [
  { of: "6 to 14 %", text: "Wood Handbook FPL-GTR-190 (2010), Eq. 13-2 and Table 13-5", confidence: "confirmed" },
  {
    of: "Outside it",
    text: "Wood Handbook, Eq. 13-3; algebra derived again from the straight line",
    confidence: "confirmed",
  },
  {
    of: "Blend by ring angle",
    text: "plane strain; the problem is MacLean's, FPL Report R1473 (1945)",
    confidence: "derived",
  },
  {
    of: "Cup",
    text: "own geometry for a board free to move; no published estimate found to check it against",
    confidence: "derived",
  },
  { of: "Bark face hollow when drying", text: "trade texts", confidence: "confirmed-secondary" },
  { of: "Single boards stray 20 to 30 %", text: "Wood Handbook, chapter 4", confidence: "memory" },
];
