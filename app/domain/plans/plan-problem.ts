import type { ProblemInput } from "#app/core/planning/problem.ts";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import type { Defect } from "#app/domain/boards/defect.ts";
import { freeStretches } from "#app/domain/holds/hold.ts";
import type { Part } from "#app/domain/projects/project.ts";
import type { ShopSettings } from "#app/domain/shop/shop.ts";
import { pliesFor } from "./plies-for.ts";

/** A free stretch of a board, as the planner sees a board. */
export interface StretchOfBoard {
  boardId: string;
  fromMm: number;
  toMm: number;
}

const separator = "@";

/** Names a free stretch to the planner and back. */
export function stretchId({ boardId, fromMm }: StretchOfBoard): string {
  return `${boardId}${separator}${fromMm}`;
}

export interface PlanWeights {
  /** What opening one more board costs, in minor units of money. */
  boardChargeMinor: number;
  /** Share of an offcut's cost that counts as saved, 0 to 1. */
  offcutCredit: number;
  /** Least share of a part's width that must keep its ring window. */
  ringShare: number;
}

/** Boards whose cost nobody knows are planned at this, per board foot, so that they are neither free nor shunned. */
const unknownCostMinor = 800;

interface Planned {
  board: BoardSummary;
  costMinor: number | null;
  boardFeet: number;
  defects: Defect[];
}

/**
 * The planner's problem for a project: each part at its rough size by the shop's allowances, with as many plies as the stock's thickness needs; each
 * board as its free stretches, width at its narrower end, defects in their places, ring angles from the near end's reading.
 *
 * A part is cut from one thickness of stock: that of the fewest board feet by its plies, among those on the rack in its species.
 *
 * @returns the problem, the stretches its boards stand for, and parts that no thickness on the rack can make.
 */
export function planProblem(
  parts: Part[],
  rack: Planned[],
  shop: ShopSettings,
  weights: PlanWeights,
  timeLimit: number,
): { problem: ProblemInput; stretches: Map<string, StretchOfBoard>; unmade: Part[] } {
  const stretches = new Map<string, StretchOfBoard>();
  const boards: ProblemInput["boards"] = [];
  for (const { board, costMinor, boardFeet, defects } of rack) {
    const width = Math.min(board.widthMm, board.widthFarMm ?? board.widthMm);
    const whole = costMinor ?? Math.round(boardFeet * unknownCostMinor);
    for (const { fromMm, toMm } of freeStretches(board.lengthMm, board.holds, 2 * shop.endTrimMm + 50)) {
      const stretch = { boardId: board.id, fromMm, toMm };
      stretches.set(stretchId(stretch), stretch);
      boards.push({
        id: stretchId(stretch),
        species: board.species,
        quarters: board.quarters,
        length: toMm - fromMm,
        width,
        cost: Math.round((whole * (toMm - fromMm)) / board.lengthMm),
        rings: board.rings?.stations.map((station) => station.angleDeg),
        defects: defects.flatMap((defect) => within(defect, stretch, width)),
      });
    }
  }
  const unmade: Part[] = [];
  const problemParts = parts.flatMap((part) => {
    const stock = [
      ...new Set(rack.filter(({ board }) => board.species === part.species).map(({ board }) => board.quarters)),
    ];
    const choice = pliesFor(part.thicknessMm, stock, shop);
    if (!choice) {
      unmade.push(part);
      return [];
    }
    const asksRings = part.ringMinDeg > 0 || part.ringMaxDeg < 90;
    return [
      {
        id: part.id,
        quantity: part.quantity,
        length: part.lengthMm + shop.allowanceLengthMm,
        width: part.widthMm + shop.allowanceWidthMm,
        species: part.species,
        quarters: choice.quarters,
        plies: choice.plies,
        // Plies of one blank move alike only when they come from one board.
        sameBoard: choice.plies > 1,
        rings: asksRings ? { min: part.ringMinDeg, max: part.ringMaxDeg, share: weights.ringShare } : undefined,
      },
    ];
  });
  const problem: ProblemInput = {
    kerf: shop.kerfMm,
    endTrim: shop.endTrimMm,
    edgeTrim: shop.allowanceWidthMm / 2,
    minOffcut: { length: shop.offcutMinLengthMm, width: shop.offcutMinWidthMm },
    boards,
    parts: problemParts,
    offcutCredit: weights.offcutCredit,
    boardCharge: weights.boardChargeMinor,
    timeLimit,
  };
  return { problem, stretches, unmade };
}

/** A defect as it lies on a stretch, cut to it; nothing when it lies elsewhere. */
function within(defect: Defect, { fromMm, toMm }: StretchOfBoard, width: number) {
  const x = Math.max(0, defect.alongMm - fromMm);
  const end = Math.min(toMm, defect.alongMm + defect.lengthMm) - fromMm;
  const y = Math.max(0, defect.acrossMm);
  const across = Math.min(width, defect.acrossMm + defect.widthMm) - y;
  return end > x && across > 0 ? [{ x, y, length: end - x, width: across }] : [];
}
