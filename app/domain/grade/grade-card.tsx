import { gradeBoard } from "#app/core/grade/grade-board.ts";
import type { Board } from "#app/domain/boards/board.ts";
import type { Defect } from "#app/domain/boards/defect.ts";
import { speciesTints } from "#app/domain/species/species-tints.ts";
import { GradeFigures } from "./grade-figures.tsx";

/** The grade helper on a board's page, from the defects recorded on it; nothing while none are, as a board nobody has looked over is not clear. */
export function GradeCard({ board, defects }: { board: Board; defects: Defect[] }) {
  if (defects.length === 0) return null;
  const on = (face: "heart" | "bark") => defects.filter((defect) => defect.face === face || defect.face === "both");
  const sized = {
    widthMm: board.widthMm,
    widthFarMm: board.widthFarMm,
    lengthMm: board.lengthMm,
    heartFace: on("heart"),
    barkFace: on("bark"),
  };
  return <GradeFigures board={sized} graded={gradeBoard(sized)} tint={speciesTints(board.species).base} />;
}
