import { PageHead } from "#app/components/card.tsx";
import { Tile } from "#app/components/facts.tsx";
import { printQuarters } from "#app/core/lengths/quarters.ts";
import { speciesName } from "#app/domain/species/species-tints.ts";
import type { Board } from "./board.ts";
import { BoardEnd } from "./board-end.tsx";
import { boardMeasure, printBoardFeet } from "./board-measure.ts";
import { LengthText } from "./size-text.tsx";

const stateWords = { racked: null, out: "taken down", used: "used up", sold: "sold", lost: "not found" } as const;

/** The head of a board's page: its tag, where it lies, its end grain across the page, and the four figures asked for most. */
export function BoardHero({ board }: { board: Board }) {
  const where = [board.place ?? "no place recorded", stateWords[board.state]].filter(Boolean).join(" · ");
  return (
    <div>
      <PageHead title={board.tag} over={where} lead={speciesName(board.species)} />
      <BoardEnd board={board} heightPx={84} fill />
      <RingLine board={board} />
      <div className="mt-3 grid grid-cols-2 gap-2.5 md:grid-cols-4">
        <Tile label="Size">
          {printQuarters(board.quarters)} × <LengthText mm={board.widthMm} unit={false} /> ×{" "}
          <LengthText mm={board.lengthMm} />
        </Tile>
        <Tile label="Measure">{printBoardFeet(boardMeasure(board))}</Tile>
        <Tile label="Moisture">
          {board.moisturePct === null ? "not read yet" : `${board.moisturePct.toFixed(1)} %`}
        </Tile>
        <Tile label="Figure">
          {board.figureKind
            ? `${["", "light ", "clear ", "strong "][board.figureStrength]}${board.figureKind}`
            : "none noted"}
        </Tile>
      </div>
    </div>
  );
}

/** Ring angle at both edges and the class between, under the drawing as they lie in it. */
function RingLine({ board }: { board: Board }) {
  if (!board.rings || !board.ringClass)
    return <p className="mt-1 text-ink-soft">No ring reading yet. Photograph an end, or set the angle by eye.</p>;
  const { stations } = board.rings;
  return (
    <p className="mt-1 flex justify-between font-mono text-lg">
      <span>{Math.round(stations[0]?.angleDeg ?? 0)}°</span>
      <span>{board.ringClass}</span>
      <span>{Math.round(stations.at(-1)?.angleDeg ?? 0)}°</span>
    </p>
  );
}
