import { href } from "react-router";
import { ButtonLink } from "#app/components/button.tsx";
import { ProjectMark } from "#app/components/crayon.tsx";
import { Facts } from "#app/components/facts.tsx";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import { BoardEnd } from "#app/domain/boards/board-end.tsx";
import { boardMeasure, printBoardFeet } from "#app/domain/boards/board-measure.ts";
import { BoardSize } from "#app/domain/boards/size-text.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";

/** The board picked out of the rack drawing. On a phone it stands at the bottom of the screen, under the thumb. */
export function ChosenBoard({ board, mayReserve }: { board: BoardSummary; mayReserve: boolean }) {
  const at = { boardId: board.id };
  return (
    <aside
      aria-label={`Chosen: ${board.tag}`}
      className="fixed inset-x-0 bottom-0 z-10 rounded-t-xl border border-line-strong bg-surface p-4 shadow-lg lg:sticky lg:inset-auto lg:top-4 lg:rounded-xl lg:border-line lg:shadow-none"
    >
      <p className="font-mono text-ink-soft text-sm">{board.place}</p>
      <h2 className="mb-2 text-2xl">{board.tag}</h2>
      <BoardEnd board={board} heightPx={44} fill />
      <Facts
        rows={[
          { label: speciesName(board.species), value: <BoardSize board={board} /> },
          {
            label: "Rings to face",
            value: board.ringClass
              ? `${Math.round(board.ringMinDeg ?? 0)}° to ${Math.round(board.ringMaxDeg ?? 0)}°, ${board.ringClass}`
              : "not read",
          },
          { label: "Moisture", value: board.moisturePct === null ? "not read" : `${board.moisturePct.toFixed(1)} %` },
          { label: "Measure", value: printBoardFeet(boardMeasure(board)) },
          ...board.holds.map((hold) => ({
            label: "Reserved for",
            value: <ProjectMark name={hold.projectName} crayon={hold.crayon} />,
          })),
        ]}
      />
      <div className="mt-3 flex gap-2">
        {mayReserve ? (
          <ButtonLink look="main" to={href("/boards/:boardId/reserve", at)} className="flex-1">
            Reserve
          </ButtonLink>
        ) : null}
        <ButtonLink to={href("/boards/:boardId", at)} className="flex-1">
          Open record
        </ButtonLink>
      </div>
    </aside>
  );
}
