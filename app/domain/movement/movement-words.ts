import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import { pieceSpread } from "#app/core/movement/growth.ts";
import { confidenceWords } from "#app/domain/sources/source.ts";
import { printChange, printSmall } from "./change-text.ts";
import { hasCup, type MovedSection } from "./section-movement.ts";

/** Height and direction of the cup, or why there is none: "0.06 in, bark face hollow". */
export function cupWords({ cup }: Pick<MovedSection, "cup">, units: LengthUnit): string {
  if (!hasCup(cup)) return cup.why;
  if (!cup.hollowFace) return "stays flat";
  const face = cup.hollowSide ? `${cup.hollowSide} face` : `${cup.hollowFace} face as drawn`;
  return `${printSmall(cup.heightMm, units)} at most, ${face} hollow`;
}

/** Which table and formula, how well they are known, and how far single boards stray. */
export function basisWords({ growth }: Pick<MovedSection, "growth">): string {
  const spread = Math.round(pieceSpread * 100);
  return `${growth.source}, ${growth.formula} (${confidenceWords(growth.confidence)}). Average clear wood: single boards stray ${spread} % either way (from memory: check it).`;
}

/** What is known less well, or lies outside a published range. */
export function movementCautions({ growth, otherTable }: MovedSection, units: LengthUnit): (string | null)[] {
  const other = otherTable?.basis === "coefficient-table" ? "coefficient" : "shrinkage";
  return [
    growth.outsideRange,
    growth.note,
    otherTable
      ? `The tables disagree on this species: by the ${other} table the width changes ${printChange(otherTable.widthChangeMm, units)}.`
      : null,
  ];
}
