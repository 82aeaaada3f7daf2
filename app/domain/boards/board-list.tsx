import { href, Link } from "react-router";
import { ProjectMark } from "#app/components/crayon.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import type { BoardSummary } from "./board.ts";
import { BoardEnd } from "./board-end.tsx";
import { boardMeasure, printBoardFeet } from "./board-measure.ts";
import { BoardSize } from "./size-text.tsx";

/** Boards one under another, each with its end drawn beside its name. The whole row opens the board. */
export function BoardList({ boards }: { boards: BoardSummary[] }) {
  return (
    <ul className="divide-y divide-line overflow-hidden rounded-xl border border-line bg-surface">
      {boards.map((board) => (
        <li key={board.id}>
          <Link
            to={href("/boards/:boardId", { boardId: board.id })}
            className="grid items-center gap-x-4 gap-y-1 px-4 py-3 text-ink no-underline hover:bg-sunk sm:grid-cols-[11rem_minmax(0,1fr)_auto]"
          >
            <BoardEnd board={board} heightPx={22} />
            <span className="min-w-0">
              <span className="flex flex-wrap items-baseline gap-x-3">
                <span className="font-bold font-display text-lg">{board.tag}</span>
                <span className="text-ink-soft">{speciesName(board.species)}</span>
                {board.state !== "racked" ? (
                  <span className="rounded bg-sunk px-2 font-semibold text-sm">{board.state}</span>
                ) : null}
              </span>
              <span className="flex flex-wrap gap-x-3">
                <BoardSize board={board} />
                <span className="text-ink-soft">{ringWords(board)}</span>
                {board.moisturePct === null ? null : (
                  <span className="text-ink-soft">{board.moisturePct.toFixed(1)} %</span>
                )}
                {board.figureKind ? <span className="text-ink-soft">{board.figureKind}</span> : null}
              </span>
              <Projects board={board} />
            </span>
            <span className="flex justify-between gap-x-4 text-right sm:block">
              <span className="font-mono">{printBoardFeet(boardMeasure(board))}</span>
              <span className="block text-ink-soft text-sm">{board.place ?? "no place"}</span>
            </span>
          </Link>
        </li>
      ))}
    </ul>
  );
}

/** The class never stands without its angles: published limits differ. */
function ringWords(board: BoardSummary): string {
  if (!board.ringClass) return "rings not read";
  return `${board.ringClass}, ${Math.round(board.ringMinDeg ?? 0)}° to ${Math.round(board.ringMaxDeg ?? 0)}°`;
}

function Projects({ board }: { board: BoardSummary }) {
  const projects = new Map(board.holds.map((hold) => [hold.projectId, hold]));
  if (projects.size === 0) return null;
  return (
    <span className="mt-0.5 flex flex-wrap gap-x-4">
      {[...projects.values()].map((hold) => (
        <ProjectMark key={hold.projectId} name={hold.projectName} crayon={hold.crayon} />
      ))}
    </span>
  );
}
