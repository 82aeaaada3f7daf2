import { useId } from "react";
import { describeEnd } from "#app/core/rings/describe.ts";
import { ringPath } from "#app/core/rings/end-drawing.ts";
import { speciesTints } from "#app/domain/species/species-tints.ts";
import type { BoardSummary } from "./board.ts";

export type DrawnEnd = Pick<
  BoardSummary,
  "species" | "widthMm" | "thicknessMm" | "rings" | "ringClass" | "ringMinDeg" | "ringMaxDeg"
>;

interface EndDrawingProps {
  board: DrawnEnd;
  x?: number;
  y?: number;
  /** In the units of whatever it is drawn in: pixels on a page, millimetres on the rack. */
  width: number;
  height: number;
  /** Screen pixels to one of those units, roughly: rings are thinned so that they never run together. */
  pxPerUnit?: number;
  /** True where the words stand beside it already. */
  decorative?: boolean;
  className?: string;
}

/**
 * The board's end grain as its sign: width by thickness to proportion, rings as its reading says, in the tint of its species. Without a reading it is
 * blank and dashed: grain is never invented. The one drawing used at every size, from a list row to the rack.
 */
export function EndDrawing({ board, x, y, width, height, pxPerUnit = 1, decorative, className }: EndDrawingProps) {
  const clip = useId();
  const tints = speciesTints(board.species);
  const line = Math.max(1.1, Math.min(2.4, (height * pxPerUnit) / 26)) / pxPerUnit;
  return (
    <svg
      x={x}
      y={y}
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      className={className}
      overflow="hidden"
      role={decorative ? "presentation" : "img"}
      aria-label={decorative ? undefined : endWords(board)}
    >
      {board.rings ? (
        <>
          <clipPath id={clip}>
            <rect width={width} height={height} rx={Math.min(2, height / 12)} />
          </clipPath>
          <g clipPath={`url(#${clip})`}>
            <rect width={width} height={height} fill={tints.base} />
            <path
              d={ringPath(board.rings, { widthPx: width, heightPx: height, minSpacingPx: line * 2.9 })}
              fill="none"
              stroke={tints.latewood}
              strokeWidth={line}
            />
          </g>
          <rect
            x="0.5"
            y="0.5"
            width={width - 1}
            height={height - 1}
            rx={Math.min(2, height / 12)}
            fill="none"
            stroke="#00000066"
          />
        </>
      ) : (
        <rect
          x="1"
          y="1"
          width={Math.max(1, width - 2)}
          height={Math.max(1, height - 2)}
          rx={Math.min(2, height / 12)}
          fill={tints.base}
          fillOpacity="0.25"
          stroke="currentColor"
          strokeOpacity="0.6"
          strokeWidth={Math.max(1, height / 30)}
          strokeDasharray={`${Math.max(4, height / 5)} ${Math.max(3, height / 7)}`}
        />
      )}
    </svg>
  );
}

/** What the drawing shows, for those who cannot see it. */
export function endWords(board: DrawnEnd): string {
  const { ringClass, ringMinDeg, ringMaxDeg } = board;
  return describeEnd(ringClass && { ringClass, leastDeg: ringMinDeg ?? 0, greatestDeg: ringMaxDeg ?? 0 });
}
