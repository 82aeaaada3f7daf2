import type { Availability } from "#app/domain/boards/boards.queries.ts";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { freeLengthMm } from "#app/domain/holds/hold.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/availability.ts";

/** What of a board is free right now, for a page that stays open beside the rack. */
export async function loader({ params, context }: Route.LoaderArgs): Promise<Availability> {
  const { actor } = requireRole(context, "board:see");
  const board = requireFound(await getBoard(context.get(dbContext), actor, params.boardId));
  return {
    state: board.state,
    freeMm: freeLengthMm(board.lengthMm, board.holds),
    holds: board.holds.map((hold) => ({ holdId: hold.holdId, expiresAt: hold.expiresAt.toISOString() })),
  };
}
