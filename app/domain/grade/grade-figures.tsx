import { Figures } from "#app/components/figures.tsx";
import type { FaceArea } from "#app/core/grade/clear-cuttings.ts";
import type { BoardGrade, FaceGrade } from "#app/core/grade/grade-board.ts";

interface GradeFiguresProps {
  board: { widthMm: number; lengthMm: number; heartFace: readonly FaceArea[]; barkFace: readonly FaceArea[] };
  graded: BoardGrade;
  /** Wood of the drawing. */
  tint?: string;
}

/** What a board could be graded, each face with its cuttings drawn and why the next grade up is not made; and that it is no certificate. */
export function GradeFigures({ board, graded, tint = "#d9b98a" }: GradeFiguresProps) {
  const faces = [graded.better, graded.poorer];
  return (
    <Figures
      title="Grade helper"
      aside={`surface measure ${graded.surfaceMeasure}`}
      main={{ label: "By its clear cuttings it could be", value: graded.boardGrade ?? "below No. 3B Common" }}
    >
      {faces.map((face) => (
        <div key={face.face} className="mt-3">
          <p>
            <strong>{face.face} face</strong>: {face.grade ?? "none of the grades tried"}
          </p>
          <FaceDrawing face={face} board={board} tint={tint} />
          <WhyNotBetter face={face} />
        </div>
      ))}
      <p className="mt-3 text-ink-soft">{graded.notice}</p>
    </Figures>
  );
}

function WhyNotBetter({ face }: { face: FaceGrade }) {
  const missed = face.tries.filter((one) => !one.passes).at(-1);
  const made = face.tries.find((one) => one.passes);
  const heuristic = face.tries.some((one) => !one.isProven);
  return (
    <p className="text-ink-soft text-sm">
      {made?.unitsFound == null
        ? ""
        : `${made.unitsFound.toFixed(1)} clear units in ${made.found?.cuttings.length ?? 0} cuttings, ${made.unitsNeeded} asked. `}
      {missed?.why ? `Not ${missed.grade}: ${missed.why} ` : ""}
      {heuristic ? "Cuttings were found by search; there may be better ones." : ""}
    </p>
  );
}

function FaceDrawing({ face, board, tint }: { face: FaceGrade; board: GradeFiguresProps["board"]; tint: string }) {
  const cuttings = face.tries.at(-1)?.found?.cuttings ?? [];
  const defects = face.face === "heart" ? board.heartFace : board.barkFace;
  return (
    <svg
      viewBox={`0 0 ${board.lengthMm} ${board.widthMm}`}
      preserveAspectRatio="none"
      className="my-1 block h-16 w-full rounded border border-line-strong"
      role="img"
      aria-label={`The ${face.face} face with ${defects.length} defects and ${cuttings.length} clear cuttings`}
    >
      <rect width={board.lengthMm} height={board.widthMm} fill={tint} />
      {cuttings.map((area) => (
        <rect
          key={`c${area.alongMm} ${area.acrossMm}`}
          x={area.alongMm}
          y={area.acrossMm}
          width={area.lengthMm}
          height={area.widthMm}
          fill="#ffffff"
          fillOpacity="0.35"
          stroke="#1d4ed8"
          strokeWidth="2"
          vectorEffect="non-scaling-stroke"
        />
      ))}
      {defects.map((area) => (
        <rect
          key={`d${area.alongMm} ${area.acrossMm} ${area.lengthMm}`}
          x={area.alongMm}
          y={area.acrossMm}
          width={area.lengthMm}
          height={area.widthMm}
          fill="#4a2d16"
          fillOpacity="0.7"
        />
      ))}
    </svg>
  );
}
