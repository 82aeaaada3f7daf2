import { Link } from "react-router";
import { crayonInk } from "#app/components/crayon.tsx";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import { EndDrawing, endWords } from "#app/domain/boards/end-drawing.tsx";
import { crayonWave } from "#app/domain/boards/length-strip.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import { armName, type Bay } from "./rack.ts";
import { stackOnArm } from "./stack-layout.ts";

interface BayDrawingProps {
  bay: Bay;
  boardsByArm: ReadonlyMap<string, BoardSummary[]>;
  /** Share of the arm's rated load, 0 to 1 and above, where both load and rating are known. */
  loadByArm: ReadonlyMap<string, number>;
  chosen: string | null;
  /** Boards drawn faint because they do not match what is looked for. */
  faint: (board: BoardSummary) => boolean;
  /** The address that chooses a board. */
  linkTo: (boardId: string) => string;
}

const post = 26;
const armThickness = 26;
const labelBelow = 44;
const headroom = 70;
/** About how large a millimetre is on a desk's screen. */
const pxPerMm = 0.55;

/** One bay as one stands before it: the post, its arms, boards end on and to scale, stickers between layers. A unit is a millimetre. */
export function BayDrawing({ bay, boardsByArm, loadByArm, chosen, faint, linkTo }: BayDrawingProps) {
  const arms = [...bay.arms].sort((a, b) => b.level - a.level);
  const width = post + Math.max(...arms.map((arm) => arm.widthMm), 300) + 20;
  let y = 20;
  const levels = arms.map((arm) => {
    const boards = boardsByArm.get(arm.id) ?? [];
    const layout = stackOnArm(boards, arm.widthMm);
    const top = y + headroom + layout.heightMm;
    y = top + armThickness + labelBelow;
    return { arm, boards, layout, top };
  });
  const byId = new Map(levels.flatMap(({ boards }) => boards.map((board) => [board.id, board] as const)));
  return (
    <svg
      viewBox={`0 0 ${width} ${y + 10}`}
      className="block h-auto w-full max-w-2xl"
      role="group"
      aria-label={`Bay ${bay.name}`}
    >
      <rect width={post} height={y + 10} rx="3" className="fill-iron-900" />
      {levels.map(({ arm, layout, top }) => (
        <g key={arm.id}>
          <rect x={post} y={top} width={arm.widthMm + 16} height={armThickness} rx="4" className="fill-iron-700" />
          <text x={post + 12} y={top + armThickness + 32} fontSize="28" className="fill-ink-soft font-mono">
            {loadByArm.has(arm.id)
              ? `${Math.round((loadByArm.get(arm.id) ?? 0) * 100)} % of arm load`
              : "no rating entered"}
          </text>
          <text
            x={post + arm.widthMm + 8}
            y={top + armThickness + 32}
            fontSize="28"
            textAnchor="end"
            className="fill-ink-soft font-mono"
          >
            {armName(bay, arm).replace("Bay ", "").replace(", arm ", "")}
          </text>
          {layout.stickers.map((sticker) => (
            <rect
              key={sticker.upMm}
              x={post + sticker.xMm}
              y={top - sticker.upMm - 15}
              width={sticker.widthMm}
              height="11"
              className="fill-iron-500 opacity-60"
            />
          ))}
          {layout.boards.map((place) => {
            const board = byId.get(place.id);
            if (!board) return null;
            const x = post + place.xMm;
            const boardTop = top - place.upMm - board.thicknessMm;
            return (
              <Link
                key={board.id}
                to={linkTo(board.id)}
                preventScrollReset
                aria-label={`${board.tag}, ${speciesName(board.species)}, ${endWords(board)}`}
              >
                <g opacity={faint(board) ? 0.22 : 1}>
                  <EndDrawing
                    board={board}
                    x={x}
                    y={boardTop}
                    width={board.widthMm}
                    height={board.thicknessMm}
                    pxPerUnit={pxPerMm}
                    decorative
                  />
                  {board.holds[0] ? (
                    <path
                      d={crayonWave(x + 8, x + board.widthMm - 8, boardTop + board.thicknessMm / 2, 5)}
                      fill="none"
                      stroke={crayonInk[board.holds[0].crayon]}
                      strokeWidth="9"
                      strokeLinecap="round"
                    />
                  ) : null}
                </g>
                {chosen === board.id ? (
                  <rect
                    x={x - 5}
                    y={boardTop - 5}
                    width={board.widthMm + 10}
                    height={board.thicknessMm + 10}
                    rx="4"
                    fill="none"
                    className="stroke-focus"
                    strokeWidth="6"
                  />
                ) : null}
              </Link>
            );
          })}
        </g>
      ))}
    </svg>
  );
}
