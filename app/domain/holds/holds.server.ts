import type { Knex } from "knex";
import { exactMm } from "#app/core/lengths/length-unit.ts";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import { writeEvent } from "#app/domain/boards/board-events.server.ts";
import { holdMarks, listSimilar, lockBoard } from "#app/domain/boards/boards.sql.server.ts";
import { projectName } from "#app/domain/projects/projects.sql.server.ts";
import { type Actor, actorCan } from "#app/domain/shop/actor.ts";
import { isDuplicateKey, withTransaction } from "#app/services/db.server.ts";
import { freeStretches, type HoldRefusal, type Stretch } from "./hold.ts";
import { endHolds, getHold, type HoldRow, insertHold, listHoldsOfBoard, updateHold } from "./holds.sql.server.ts";

const dayMs = 86_400_000;

export interface HoldRequest extends Stretch {
  boardId: string;
  projectId: string;
  note: string;
  expiresAt: Date;
}

/**
 * Speaks for a board, or a length of it, for a project. Decided under the board's row lock: of two people asking at once, exactly one gets it,
 * and the other is told who has it, until when, and what else would do.
 */
export async function placeHold(
  db: Knex,
  actor: Actor,
  request: HoldRequest,
  now: Date,
): Promise<{ ok: true; holdId: string } | HoldRefusal> {
  try {
    return await withTransaction(db, async (trx) => {
      const board = await lockBoard(trx, actor, request.boardId);
      const project = await projectName(trx, actor, request.projectId);
      if (!board || !project) return { ok: false, why: "missing" };
      if (board.state !== "racked") return { ok: false, why: "not racked", state: board.state };
      // Without the noise of binary arithmetic, so that what is measured from the far end may touch what is held from the near one.
      const asked = {
        ...request,
        fromMm: exactMm(request.fromMm),
        toMm: exactMm(Math.min(request.toMm, board.lengthMm)),
      };
      if (asked.fromMm < 0 || asked.toMm <= asked.fromMm || request.toMm > board.lengthMm + 0.05)
        return { ok: false, why: "length", lengthMm: board.lengthMm };
      await lapseHolds(trx, actor, request.boardId, now);
      const claimed = await listHoldsOfBoard(trx, actor, request.boardId, ["held", "out"]);
      if (claimed.some((hold) => hold.fromMm < asked.toMm && asked.fromMm < hold.toMm))
        return heldRefusal(trx, actor, asked, board.lengthMm);
      const holdId = await insertHold(trx, actor, asked);
      await writeEvent(trx, actor, request.boardId, "reserved", {
        project,
        "from (mm)": asked.fromMm,
        "to (mm)": asked.toMm,
        until: request.expiresAt.toISOString().slice(0, 10),
        note: request.note,
      });
      return { ok: true, holdId };
    });
  } catch (error) {
    if (!isDuplicateKey(error, "hold_spans_one_claim")) throw error;
    const board = await lockBoard(db, actor, request.boardId);
    return board ? heldRefusal(db, actor, request, board.lengthMm) : { ok: false, why: "missing" };
  }
}

async function heldRefusal(db: Knex, actor: Actor, request: HoldRequest, lengthMm: number): Promise<HoldRefusal> {
  const marks = (await holdMarks(db, actor, [request.boardId])).get(request.boardId) ?? [];
  const by = marks.filter((mark) => mark.fromMm < request.toMm && request.fromMm < mark.toMm);
  const others = await listSimilar(db, actor, request.boardId, request.toMm - request.fromMm, 3);
  return { ok: false, why: "held", by, free: freeStretches(lengthMm, marks), others };
}

/** Ends the holds of a board whose time has passed. The caller holds the board's lock. */
export async function lapseHolds(trx: Knex, actor: Actor, boardId: string, now: Date): Promise<void> {
  const late = (await listHoldsOfBoard(trx, actor, boardId, ["held"])).filter((hold) => hold.expiresAt <= now);
  await endHolds(
    trx,
    actor,
    boardId,
    late.map((hold) => hold.id),
    "lapsed",
  );
  for (const hold of late)
    await writeEvent(trx, actor, boardId, "lapsed", { project: await projectName(trx, actor, hold.projectId) });
}

export type HoldChange = { ok: true } | { ok: false; why: "missing" | "not yours" | "ended" };

/** Finds a hold under its board's lock and runs a change on it, if this person may: makers their own, owners any. */
async function changeHold(
  db: Knex,
  actor: Actor,
  holdId: string,
  change: (trx: Knex, hold: HoldRow) => Promise<HoldChange>,
): Promise<HoldChange> {
  const seen = await getHold(db, actor, holdId);
  if (!seen) return { ok: false, why: "missing" };
  return withTransaction(db, async (trx) => {
    await lockBoard(trx, actor, seen.boardId);
    const hold = await getHold(trx, actor, holdId);
    if (!hold) return { ok: false, why: "missing" };
    const mine = hold.placedBy === actor.personId;
    if (!actorCan(actor, "hold:change-any") && !(mine && actorCan(actor, "hold:change-own")))
      return { ok: false, why: "not yours" };
    return change(trx, hold);
  });
}

/** Gives a hold more days, counted from now or from its present end, whichever is later. A lapsed hold must be placed again. */
export function extendHold(db: Knex, actor: Actor, holdId: string, days: number, now: Date): Promise<HoldChange> {
  return changeHold(db, actor, holdId, async (trx, hold) => {
    if (hold.state !== "held" || hold.expiresAt <= now) return { ok: false, why: "ended" };
    const until = new Date(Math.max(hold.expiresAt.getTime(), now.getTime()) + days * dayMs);
    await updateHold(trx, actor, hold.id, { expires_at: until });
    await writeEvent(trx, actor, hold.boardId, "hold extended", {
      project: await projectName(trx, actor, hold.projectId),
      until: [hold.expiresAt.toISOString().slice(0, 10), until.toISOString().slice(0, 10)],
    });
    return { ok: true };
  });
}

/** Lets a hold go: the length is free again at once. */
export function letGo(db: Knex, actor: Actor, holdId: string): Promise<HoldChange> {
  return changeHold(db, actor, holdId, async (trx, hold) => {
    if (hold.state !== "held" && hold.state !== "out") return { ok: false, why: "ended" };
    await endHolds(trx, actor, hold.boardId, [hold.id], "let go");
    await writeEvent(trx, actor, hold.boardId, "let go", { project: await projectName(trx, actor, hold.projectId) });
    return { ok: true };
  });
}

export type TakeDownResult =
  | { ok: true }
  | { ok: false; why: "missing" }
  | { ok: false; why: "state"; state: BoardSummary["state"] };

/** Takes a board off the rack to the bench. Its live holds go out with it; its place is remembered for putting it back. */
export async function takeDown(db: Knex, actor: Actor, boardId: string, now: Date): Promise<TakeDownResult> {
  return moveState(db, actor, boardId, "racked", async (trx) => {
    await lapseHolds(trx, actor, boardId, now);
    for (const hold of await listHoldsOfBoard(trx, actor, boardId, ["held"]))
      await updateHold(trx, actor, hold.id, { state: "out" });
    await trx("boards")
      .where({ id: boardId, shop_id: actor.shopId })
      .update({ state: "out", version: trx.raw("version + 1") });
    await writeEvent(trx, actor, boardId, "taken down");
  });
}

/** Puts a board back where it lay. Holds that went out with it are held again, for the shop's usual time at least. */
export async function putBack(
  db: Knex,
  actor: Actor,
  boardId: string,
  holdDays: number,
  now: Date,
): Promise<TakeDownResult> {
  return moveState(db, actor, boardId, "out", async (trx) => {
    const least = new Date(now.getTime() + holdDays * dayMs);
    for (const hold of await listHoldsOfBoard(trx, actor, boardId, ["out"]))
      await updateHold(trx, actor, hold.id, {
        state: "held",
        expires_at: hold.expiresAt > least ? hold.expiresAt : least,
      });
    await trx("boards")
      .where({ id: boardId, shop_id: actor.shopId })
      .update({ state: "racked", version: trx.raw("version + 1") });
    await writeEvent(trx, actor, boardId, "put back");
  });
}

function moveState(
  db: Knex,
  actor: Actor,
  boardId: string,
  from: BoardSummary["state"],
  move: (trx: Knex) => Promise<void>,
): Promise<TakeDownResult> {
  return withTransaction(db, async (trx) => {
    const board = await lockBoard(trx, actor, boardId);
    if (!board) return { ok: false, why: "missing" };
    if (board.state !== from) return { ok: false, why: "state", state: board.state };
    await move(trx);
    return { ok: true };
  });
}
