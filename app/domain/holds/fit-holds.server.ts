import type { Knex } from "knex";
import { projectName } from "#app/domain/projects/projects.sql.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { listHoldsOfBoard, moveEnd } from "./holds.sql.server.ts";

/**
 * Fits the live holds of a board to its corrected length. What reached to the far end still does; what would reach past it ends there. The caller holds
 * the board's lock.
 *
 * @returns the projects whose hold would have no length left: then nothing is changed, and the board keeps its length.
 */
export async function fitHolds(
  trx: Knex,
  actor: Pick<Actor, "shopId">,
  boardId: string,
  length: { beforeMm: number; afterMm: number },
): Promise<string[]> {
  const live = await listHoldsOfBoard(trx, actor, boardId, ["held", "out"]);
  const lost = live.filter((hold) => hold.fromMm >= length.afterMm);
  if (lost.length > 0) {
    const names = await Promise.all(lost.map((hold) => projectName(trx, actor, hold.projectId)));
    return [...new Set(names.flatMap((name) => name ?? []))];
  }
  for (const hold of live)
    if (hold.toMm > length.afterMm || hold.toMm === length.beforeMm) await moveEnd(trx, actor, hold, length.afterMm);
  return [];
}
