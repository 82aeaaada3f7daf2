/** A board seen from its end, lying flat. */
export interface StackedBoard {
  id: string;
  widthMm: number;
  thicknessMm: number;
}

/** Where a board is drawn on its arm: from the upright, and up from the arm. */
export interface PlacedBoard {
  id: string;
  xMm: number;
  /** Underside above the arm. */
  upMm: number;
}

export interface StackLayout {
  boards: PlacedBoard[];
  /** Stickers under each layer but the lowest, drawn end on where they meet boards. */
  stickers: { xMm: number; upMm: number; widthMm: number }[];
  heightMm: number;
}

/** Stickers are 3/4 in thick by common practice (trade reference, section 9). */
export const stickerMm = 19;

const gapMm = 6;

/**
 * Stacks boards on an arm as they lie: in order from the upright out, a new layer when one would reach past the arm, stickers between layers.
 * A board wider than the arm still gets a layer of its own.
 *
 * @param armWidthMm usable reach of the arm, seen end on.
 */
export function stackOnArm(boards: StackedBoard[], armWidthMm: number): StackLayout {
  const layers: StackedBoard[][] = [];
  let used = Number.POSITIVE_INFINITY;
  for (const board of boards) {
    if (used + board.widthMm > armWidthMm) {
      layers.push([]);
      used = 0;
    }
    layers.at(-1)?.push(board);
    used += board.widthMm + gapMm;
  }
  const placed: PlacedBoard[] = [];
  const stickers: StackLayout["stickers"] = [];
  let upMm = 0;
  layers.forEach((layer, index) => {
    if (index > 0) {
      stickers.push(...stickersUnder(layer, upMm));
      upMm += stickerMm;
    }
    let xMm = gapMm;
    for (const board of layer) {
      placed.push({ id: board.id, xMm, upMm });
      xMm += board.widthMm + gapMm;
    }
    upMm += Math.max(...layer.map((board) => board.thicknessMm));
  });
  return { boards: placed, stickers, heightMm: upMm };
}

function stickersUnder(layer: StackedBoard[], upMm: number): StackLayout["stickers"] {
  const widthMm = layer.reduce((sum, board) => sum + board.widthMm + gapMm, 0) - gapMm;
  return [{ xMm: gapMm, upMm, widthMm }];
}
