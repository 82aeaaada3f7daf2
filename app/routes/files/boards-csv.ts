import { type CsvValue, csvLine } from "#app/core/csv/print-csv.ts";
import { printQuarters } from "#app/core/lengths/quarters.ts";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import { readBoardFilter } from "#app/domain/boards/board-filter.ts";
import { boardMeasure } from "#app/domain/boards/board-measure.ts";
import { listSummaries } from "#app/domain/boards/boards.sql.server.ts";
import { speciesName } from "#app/domain/species/species-tints.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/boards-csv.ts";

const block = 2_000;
const mmPerInch = 25.4;

/** The list as it is filtered and sorted, all of its pages, as CSV. Written block by block, so that a full rack takes no memory. */
export function loader({ context, url }: Route.LoaderArgs) {
  const { actor, shop } = requireRole(context, "board:see");
  const db = context.get(dbContext);
  const filter = readBoardFilter(url.searchParams, shop.units);
  const unit = shop.units;
  const size = (mm: number | null) => (mm === null ? null : unit === "in" ? round(mm / mmPerInch, 4) : round(mm, 2));
  const encoder = new TextEncoder();
  let offset = 0;
  const body = new ReadableStream<Uint8Array>({
    start: (controller) => controller.enqueue(encoder.encode(csvLine(heading(unit)))),
    async pull(controller) {
      const boards = await listSummaries(db, actor, filter, { limit: block, offset });
      offset += block;
      if (boards.length > 0)
        controller.enqueue(encoder.encode(boards.map((board) => csvLine(line(board, size))).join("")));
      if (boards.length < block) controller.close();
    },
  });
  return new Response(body, {
    headers: { "Content-Type": "text/csv; charset=utf-8", "Content-Disposition": 'attachment; filename="boards.csv"' },
  });
}

function heading(unit: string): string[] {
  return [
    "tag",
    "species",
    "quarters",
    `thickness (${unit})`,
    `width (${unit})`,
    `far width (${unit})`,
    `length (${unit})`,
    "board feet",
    "state",
    "place",
    "ring class",
    "least ring angle",
    "greatest ring angle",
    "moisture (%)",
    "figure",
    "reserved for",
  ];
}

function line(board: BoardSummary, size: (mm: number | null) => number | null): CsvValue[] {
  return [
    board.tag,
    speciesName(board.species),
    printQuarters(board.quarters),
    size(board.thicknessMm),
    size(board.widthMm),
    size(board.widthFarMm),
    size(board.lengthMm),
    round(boardMeasure(board), 2),
    board.state,
    board.place,
    board.ringClass,
    board.ringMinDeg,
    board.ringMaxDeg,
    board.moisturePct,
    board.figureKind,
    [...new Set(board.holds.map((hold) => hold.projectName))].join("; "),
  ];
}

function round(value: number, digits: number): number {
  return Number(value.toFixed(digits));
}
