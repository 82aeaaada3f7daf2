import { printLength } from "#app/core/lengths/print-length.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { speciesTints } from "#app/domain/species/species-tints.ts";
import type { BoardSummary } from "./board.ts";
import { LengthStrip } from "./length-strip.tsx";
import { LengthText } from "./size-text.tsx";

type Drawn = Pick<BoardSummary, "lengthMm" | "widthMm" | "widthFarMm" | "species" | "holds">;

/** The drawing of a board's length with its holds, its two ends named underneath. */
export function BoardLength({ board, chosen }: { board: Drawn; chosen?: { fromMm: number; toMm: number } | null }) {
  const { units } = useShop();
  const print = (mm: number) => `${printLength(mm, units)} ${units}`;
  const label =
    board.holds.length === 0
      ? `Length of the board, ${print(board.lengthMm)}, all of it free`
      : `Length of the board, ${print(board.lengthMm)}. ${board.holds
          .map((hold) => `${print(hold.fromMm)} to ${print(hold.toMm)} from the near end held for ${hold.projectName}`)
          .join("; ")}`;
  return (
    <figure>
      <LengthStrip {...board} tint={speciesTints(board.species).base} chosen={chosen} label={label} />
      <figcaption className="mt-1 flex justify-between font-mono text-ink-soft text-sm">
        <span>near end</span>
        <LengthText mm={board.lengthMm} />
        <span>far end</span>
      </figcaption>
    </figure>
  );
}
