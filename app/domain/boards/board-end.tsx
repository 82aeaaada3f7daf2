import { crayonInk } from "#app/components/crayon.tsx";
import type { HoldMark } from "./board.ts";
import { type DrawnEnd, EndDrawing } from "./end-drawing.tsx";
import { crayonWave } from "./length-strip.tsx";

interface BoardEndProps {
  board: DrawnEnd & { holds?: Pick<HoldMark, "holdId" | "crayon">[] };
  /** Height of the drawing before the page scales it; the width follows from the board. */
  heightPx: number;
  /** Stretch over the whole width there is, as on the head of a board's page. */
  fill?: boolean;
}

const widestPx = 176;

/** A board's end as it stands beside its name, with crayon across it where it is spoken for. */
export function BoardEnd({ board, heightPx, fill }: BoardEndProps) {
  const ratio = board.widthMm / board.thicknessMm;
  const height = fill ? heightPx : Math.max(10, Math.min(heightPx, widestPx / ratio));
  const width = height * ratio;
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      width={fill ? undefined : width}
      height={fill ? undefined : height}
      className={fill ? "block h-auto w-full" : "block shrink-0"}
      role="presentation"
    >
      <EndDrawing board={board} width={width} height={height} />
      {board.holds?.[0] ? (
        <path
          d={crayonWave(width * 0.06, width * (fill ? 0.4 : 0.94), height / 2, height * 0.16)}
          fill="none"
          stroke={crayonInk[board.holds[0].crayon]}
          strokeWidth={height * (fill ? 0.1 : 0.16)}
          strokeLinecap="round"
        />
      ) : null}
    </svg>
  );
}
