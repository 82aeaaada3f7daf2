import { evenField } from "#app/core/movement/ring-course.ts";
import { speciesByCode } from "#app/core/species/species.ts";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import type { Place } from "#app/domain/moisture/places.ts";
import { type MovedSection, moveSection } from "./section-movement.ts";

/** One step that a board's moisture is expected to take. */
export interface MovementStep {
  words: string;
  moved: MovedSection;
}

/** How a board will move from its moisture now, or what is missing to say so. */
export type BoardMovement =
  | { ok: false; why: string }
  | {
      ok: true;
      steps: MovementStep[];
      /** True where nobody has read the rings: each step is then there twice, all flat and all quartered. */
      isRange: boolean;
      placeWords: string;
      source: string;
    };

type MovedBoard = Pick<BoardSummary, "species" | "widthMm" | "thicknessMm" | "rings" | "moisturePct">;

/**
 * A board's section from its moisture now to the target of the place where its piece will live, and to the driest and dampest season
 * there. Without a reading of its rings the two extremes are given and nothing is drawn.
 */
export function boardMovement(board: MovedBoard, place: Place): BoardMovement {
  const species = speciesByCode(board.species);
  if (!species) return { ok: false, why: "No figures are published for this species here." };
  const fromPct = board.moisturePct;
  if (fromPct === null) return { ok: false, why: "Meter it first: movement counts from its moisture now." };
  const { widthMm, thicknessMm, rings } = board;
  const fields = rings
    ? [{ field: { ...rings, widthMm, thicknessMm }, way: "" }]
    : [
        { field: evenField(widthMm, thicknessMm, 0), way: ", all flat" },
        { field: evenField(widthMm, thicknessMm, 90), way: ", all quartered" },
      ];
  const goals = [
    { words: `to the target, ${place.target.targetPct.toFixed(1)} %`, toPct: place.target.targetPct },
    { words: `driest season, ${place.driestPct.toFixed(1)} %`, toPct: place.driestPct },
    { words: `dampest season, ${place.dampestPct.toFixed(1)} %`, toPct: place.dampestPct },
  ];
  const steps = goals.flatMap(({ words, toPct }) =>
    fields.flatMap(({ field, way }) => {
      const moved = moveSection({ field, species, fromPct, toPct });
      return moved ? [{ words: words + way, moved }] : [];
    }),
  );
  if (steps.length === 0) return { ok: false, why: "No shrinkage is published for this species." };
  return { ok: true, steps, isRange: !rings, placeWords: place.words, source: place.seasonSource };
}

/** The step that moves the board most: the one to draw. */
export function largestStep(steps: readonly MovementStep[]): MovementStep | undefined {
  const size = ({ moved }: MovementStep) => Math.abs(moved.section.widthChangeMm);
  return steps.toSorted((a, b) => size(b) - size(a))[0];
}
