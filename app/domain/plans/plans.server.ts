import type { Knex } from "knex";
import type { Plan } from "#app/core/planning/layout.ts";
import { boardMeasure } from "#app/domain/boards/board-measure.ts";
import { listRackOf } from "#app/domain/boards/boards.sql.server.ts";
import { listDefectsOf } from "#app/domain/boards/defects.sql.server.ts";
import type { HoldRefusal } from "#app/domain/holds/hold.ts";
import { placeHold } from "#app/domain/holds/holds.server.ts";
import type { Part } from "#app/domain/projects/project.ts";
import { listParts } from "#app/domain/projects/projects.sql.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { ShopSettings } from "#app/domain/shop/shop.ts";
import { withTransaction } from "#app/services/db.server.ts";
import type { Planner } from "#app/services/planner.server.ts";
import type { MadePlan, PlannedBoard } from "./made-plan.ts";
import { type PlanWeights, planProblem, type StretchOfBoard } from "./plan-problem.ts";

/** The most boards one plan looks at. */
const mostBoards = 2_000;

/** Seconds a person waits for a plan on the page. */
const timeLimit = 5;

export type PlanMade = { ok: true; plan: MadePlan } | { ok: false; why: string };

/**
 * Plans a project's parts on the boards of this rack, in a thread of its own. Nothing is held: a plan is a proposal until it is accepted.
 */
export async function makePlan(
  services: { db: Knex; planner: Planner },
  actor: Actor,
  shop: ShopSettings,
  projectId: string,
  weights: PlanWeights,
): Promise<PlanMade> {
  const { db, planner } = services;
  const parts = await listParts(db, actor, projectId);
  if (parts.length === 0) return { ok: false, why: "The project has no parts yet: list them first." };
  const found = await listRackOf(db, actor, [...new Set(parts.map((part) => part.species))], mostBoards);
  const defects = await listDefectsOf(
    db,
    actor,
    found.map(({ board }) => board.id),
  );
  const rack = found.map(({ board, costMinor }) => ({
    board,
    costMinor,
    boardFeet: boardMeasure(board),
    defects: defects.get(board.id) ?? [],
  }));
  const { problem, stretches, unmade } = planProblem(parts, rack, shop, weights, timeLimit);
  const boards = new Map(rack.map(({ board }) => [board.id, board]));
  const none = { cost: 0, bound: 0, gap: 0, boards: [], unplaced: [] };
  if (problem.parts.length === 0) return { ok: true, plan: { ...none, unmade: names(unmade) } };
  const answer = await planner.ask(problem);
  if (!answer.ok) return { ok: false, why: answer.error };
  const { plan } = answer;
  return {
    ok: true,
    plan: {
      cost: plan.cost,
      bound: plan.bound,
      gap: plan.gap,
      boards: plan.boards.flatMap((layout): PlannedBoard[] => {
        const stretch = stretches.get(layout.id);
        const board = stretch && boards.get(stretch.boardId);
        return stretch && board
          ? [{ board, stretch, layout: named(layout, parts), holds: heldStretch(layout, stretch, shop) }]
          : [];
      }),
      unplaced: plan.unplaced.map(({ part, quantity, why }) => ({
        part: nameOf(part, parts),
        quantity,
        why: why.replaceAll(part, nameOf(part, parts)),
      })),
      unmade: names(unmade),
    },
  };
}

function nameOf(partId: string, parts: Part[]): string {
  return parts.find((part) => part.id === partId)?.name ?? partId;
}

function names(parts: Part[]): string[] {
  return parts.map((part) => part.name);
}

function named(layout: Plan["boards"][number], parts: Part[]): PlannedBoard["layout"] {
  return { ...layout, pieces: layout.pieces.map((piece) => ({ ...piece, part: nameOf(piece.part, parts) })) };
}

/** What a layout needs of its stretch: from its near end to the last piece and the trim behind it; all of it when the rest is not worth keeping. */
function heldStretch(layout: Plan["boards"][number], stretch: StretchOfBoard, shop: ShopSettings): StretchOfBoard {
  const last = Math.max(...layout.pieces.map((piece) => piece.x + piece.length)) + shop.kerfMm + shop.endTrimMm;
  const toMm = Math.min(stretch.toMm, stretch.fromMm + last);
  return { ...stretch, toMm: stretch.toMm - toMm < shop.offcutMinLengthMm ? stretch.toMm : toMm };
}

export type PlanAccepted =
  | { ok: true; holds: number }
  | { ok: false; refused: { boardId: string; refusal: HoldRefusal }[] };

/** Undoes the transaction and carries out why. */
class NotAll extends Error {
  constructor(readonly refused: { boardId: string; refusal: HoldRefusal }[]) {
    super("not every board could be held");
  }
}

/**
 * Holds every stretch of a plan for its project, in one transaction: all of them or none. When a board changed meanwhile, nothing is held and the boards
 * that changed are named.
 */
export async function acceptPlan(
  db: Knex,
  actor: Actor,
  projectId: string,
  stretches: StretchOfBoard[],
  hold: { note: string; expiresAt: Date },
  now: Date,
): Promise<PlanAccepted> {
  // In one order for everybody, so that two plans accepted at once cannot wait for each other.
  const inOrder = [...stretches].sort((a, b) => a.boardId.localeCompare(b.boardId, "en") || a.fromMm - b.fromMm);
  try {
    return await withTransaction(db, async (trx) => {
      const refused: { boardId: string; refusal: HoldRefusal }[] = [];
      for (const stretch of inOrder) {
        const placed = await placeHold(trx, actor, { ...stretch, projectId, ...hold }, now);
        if (!placed.ok) refused.push({ boardId: stretch.boardId, refusal: placed });
      }
      if (refused.length > 0) throw new NotAll(refused);
      return { ok: true, holds: inOrder.length };
    });
  } catch (error) {
    if (error instanceof NotAll) return { ok: false, refused: error.refused };
    throw error;
  }
}
