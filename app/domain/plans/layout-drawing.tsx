import { printLength } from "#app/core/lengths/print-length.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { speciesTints } from "#app/domain/species/species-tints.ts";
import type { PlannedBoard } from "./made-plan.ts";

const drawnLength = 1000;

/** The stretch of a board from its near end on the left, to scale along and three times as wide: pieces named, saw lines numbered in order, offcuts hatched. */
export function LayoutDrawing({ planned }: { planned: PlannedBoard }) {
  const { units } = useShop();
  const { board, stretch, layout } = planned;
  const length = stretch.toMm - stretch.fromMm;
  const across = 3;
  const scale = drawnLength / length;
  const y = (mm: number) => mm * scale * across;
  const height = y(board.widthMm);
  const print = (mm: number) => printLength(mm, units, { denominator: 16 });
  const label = `${board.tag}: ${layout.pieces.map((piece) => `${piece.part} ${print(piece.length)} by ${print(piece.width)} ${units}`).join(", ")}`;
  return (
    <svg
      viewBox={`-14 -14 ${drawnLength + 28} ${height + 28}`}
      className="block h-auto w-full"
      role="img"
      aria-label={label}
    >
      <rect
        width={drawnLength}
        height={height}
        fill={speciesTints(board.species).base}
        stroke="#5b4a33"
        strokeWidth="2"
      />
      {layout.offcuts.map((offcut) => (
        <rect
          key={`${offcut.x} ${offcut.y}`}
          x={offcut.x * scale}
          y={y(offcut.y)}
          width={offcut.length * scale}
          height={y(offcut.width)}
          fill="#ffffff"
          fillOpacity="0.35"
          stroke="#5b4a33"
          strokeDasharray="8 6"
        />
      ))}
      {layout.pieces.map((piece) => (
        <g key={`${piece.x} ${piece.y}`}>
          <rect
            x={piece.x * scale}
            y={y(piece.y)}
            width={piece.length * scale}
            height={y(piece.width)}
            fill="#2e4a42"
            fillOpacity="0.82"
            stroke="#ffffff"
            strokeWidth="1.5"
          />
          <text
            x={(piece.x + piece.length / 2) * scale}
            y={y(piece.y + piece.width / 2) + 6}
            textAnchor="middle"
            fontSize={Math.min(
              20,
              y(piece.width) * 0.6,
              (piece.length * scale) / Math.max(4, piece.part.length * 0.62),
            )}
            fill="#ffffff"
          >
            {piece.part}
          </text>
        </g>
      ))}
      {layout.cuts.map((cut, index) => {
        const [x1, y1, x2, y2] =
          cut.kind === "crosscut"
            ? [cut.at * scale, y(cut.from), cut.at * scale, y(cut.to)]
            : [cut.from * scale, y(cut.at), cut.to * scale, y(cut.at)];
        return (
          <g key={`${cut.kind} ${cut.at} ${cut.from}`}>
            <path d={`M${x1} ${y1}L${x2} ${y2}`} stroke="#c2301c" strokeWidth="2.5" />
            <circle cx={x1} cy={y1} r="10" fill="#ffffff" stroke="#c2301c" strokeWidth="1.5" />
            <text x={x1} y={y1 + 4.5} textAnchor="middle" fontSize="12" fill="#1b211f">
              {index + 1}
            </text>
          </g>
        );
      })}
    </svg>
  );
}
