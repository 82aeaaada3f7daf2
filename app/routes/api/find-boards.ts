import { readBoardFilter } from "#app/domain/boards/board-filter.ts";
import type { FoundBoard } from "#app/domain/boards/boards.queries.ts";
import { listSummaries } from "#app/domain/boards/boards.sql.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/find-boards.ts";

const most = 8;

/** Boards whose tag or words begin as typed, for finding one while typing. */
export async function loader({ context, url }: Route.LoaderArgs): Promise<{ boards: FoundBoard[] }> {
  const { actor, shop } = requireRole(context, "board:see");
  const typed = (url.searchParams.get("q") ?? "").trim();
  if (typed === "") return { boards: [] };
  const filter = readBoardFilter(new URLSearchParams({ q: typed, state: "any" }), shop.units);
  const boards = await listSummaries(context.get(dbContext), actor, filter, { limit: most, offset: 0 });
  return {
    boards: boards.map(({ id, tag, species, quarters, widthMm, lengthMm, place, state }) => ({
      id,
      tag,
      species,
      quarters,
      widthMm,
      lengthMm,
      place,
      state,
    })),
  };
}
