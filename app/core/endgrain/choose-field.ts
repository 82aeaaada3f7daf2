import { type EndField, fitEndField, fitScales, type ScaleFit } from "#app/core/endgrain/end-field.ts";
import type { Plane } from "#app/core/endgrain/pixels.ts";

/** A field with what speaks for it: the share of the picture its rings explain, less what any lines would explain by chance. */
export type JudgedField = EndField & { evidence: number };

/** The field to believe, and the strongest field that runs another way, if one was looked at. */
export type ChosenField = { chosen: JudgedField; rival: JudgedField | null };

/** With this much evidence no other direction is looked at: on the development photographs no rival came above 0.4. */
const BEYOND_DOUBT = 0.5;

/** Mean of cos 2(difference) over the picture below which two fits tell of different lines. */
const OTHER_LINES = 0.3;

/**
 * Chooses between the directions that different scales show. Rays and rows of pores run square to the rings and win at fine
 * scales in ring-porous wood; saw marks run anywhere and win at coarse ones. Rings are told from both by their length: only
 * along rings does the picture, unrolled, repeat itself for long, so the field that explains most of its own scale's picture is
 * taken, whatever its strength pixel by pixel.
 */
export function chooseField(picture: Plane, mask: Plane | null): ChosenField | null {
  const fits = fitScales(picture, mask);
  if (fits.length === 0) return null;
  const byExcess = [...fits].sort((a, b) => b.excess - a.excess);
  const directions: ScaleFit[] = [];
  for (const fit of byExcess) {
    if (directions.every((other) => sameLines(fit, other, picture) < OTHER_LINES)) directions.push(fit);
  }
  const judged: JudgedField[] = [];
  for (const best of directions.slice(0, 3)) {
    judged.push(judge(fitEndField(picture, mask, fits, best), picture));
    if (judged[0]!.evidence > BEYOND_DOUBT) break;
  }
  judged.sort((a, b) => b.evidence - a.evidence);
  return { chosen: judged[0]!, rival: judged[1] ?? null };
}

/** A profile averaged over a window explains noise too: by the noise's own length over the window's. */
function judge(field: EndField, picture: Plane): JudgedField {
  const noiseLength = Math.max(0.7, field.best.cells.scalePx / 2);
  const chance = noiseLength / (0.3 * picture.height);
  const typical = field.explained.typical;
  return { ...field, evidence: typical - chance };
}

/** Mean over the picture of cos 2(difference) between two fits' rings: 1 the same, −1 square to one another. */
function sameLines(a: ScaleFit, b: ScaleFit, size: { width: number; height: number }): number {
  let sum = 0;
  for (let j = 0; j < 8; j++) {
    for (let i = 0; i < 24; i++) {
      const x = (size.width * (i + 0.5)) / 24;
      const y = (size.height * (j + 0.5)) / 8;
      const turn = Math.atan2(y - a.pith.y, x - a.pith.x) - Math.atan2(y - b.pith.y, x - b.pith.x);
      sum += Math.cos(2 * turn);
    }
  }
  return sum / (24 * 8);
}
