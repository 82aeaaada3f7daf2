import type { Knex } from "knex";
import { href } from "react-router";
import { isIdentifier } from "#app/core/identifiers/identifier.ts";
import { printLength } from "#app/core/lengths/print-length.ts";
import { printQuarters } from "#app/core/lengths/quarters.ts";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import { readBoardFilter } from "#app/domain/boards/board-filter.ts";
import { listByIds, listSummaries } from "#app/domain/boards/boards.sql.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { ShopSettings } from "#app/domain/shop/shop.ts";
import { speciesName } from "#app/domain/species/species-tints.ts";
import type { TagText } from "./tag-pdf.server.ts";

/** More than this in one go is a slip, and a long wait. */
export const mostTags = 500;

/** The boards a tag page speaks of: named one by one, or as a filter of the board list, in tag order. */
export async function boardsToTag(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  params: URLSearchParams,
  shop: ShopSettings,
): Promise<BoardSummary[]> {
  const ids = params.getAll("board").filter(isIdentifier).slice(0, mostTags);
  if (ids.length > 0) return listByIds(db, actor, ids);
  const filter = { ...readBoardFilter(params, shop.units), sort: "tag" as const };
  return listSummaries(db, actor, filter, { limit: mostTags, offset: 0 });
}

/** What is printed on a board's tag. */
export function tagText(board: BoardSummary, shop: ShopSettings, publicUrl: string): TagText {
  const print = (mm: number) => printLength(mm, shop.units);
  return {
    board,
    species: speciesName(board.species),
    size: `${printQuarters(board.quarters)} × ${print(board.widthMm)} × ${print(board.lengthMm)} ${shop.units}`,
    rings: board.ringClass
      ? `${board.ringClass}, ${Math.round(board.ringMinDeg ?? 0)}° to ${Math.round(board.ringMaxDeg ?? 0)}°`
      : "",
    address: `${publicUrl}${href("/boards/:boardId", { boardId: board.id })}`,
  };
}
