import { crayonInk } from "#app/components/crayon.tsx";
import type { HoldMark } from "./board.ts";

interface LengthStripProps {
  lengthMm: number;
  widthMm: number;
  widthFarMm?: number | null;
  holds: Pick<HoldMark, "fromMm" | "toMm" | "crayon" | "projectName" | "holdId">[];
  /** Base tint of the species. */
  tint: string;
  /** A stretch being chosen, drawn dashed. */
  chosen?: { fromMm: number; toMm: number } | null;
  /** In words what the drawing shows. */
  label: string;
}

const drawnLength = 1000;
const drawnWidth = 72;

/** A board's length from the near end on the left, with crayon where it is spoken for. Not to scale across: a board is long. */
export function LengthStrip({ lengthMm, widthMm, widthFarMm, holds, tint, chosen, label }: LengthStripProps) {
  const x = (mm: number) => (mm / lengthMm) * drawnLength;
  const far = Math.max(0.3, Math.min(1.6, (widthFarMm ?? widthMm) / widthMm));
  const tallest = Math.max(1, far);
  const near = drawnWidth / tallest;
  const outline = `M0 ${(drawnWidth - near) / 2}L${drawnLength} ${(drawnWidth - near * far) / 2}V${(drawnWidth + near * far) / 2}L0 ${(drawnWidth + near) / 2}Z`;
  return (
    <svg
      viewBox={`-2 -2 ${drawnLength + 4} ${drawnWidth + 4}`}
      className="block h-auto w-full"
      role="img"
      aria-label={label}
      preserveAspectRatio="none"
    >
      <path d={outline} fill={tint} stroke="#5b4a33" strokeWidth="2" vectorEffect="non-scaling-stroke" />
      {holds.map((hold) => (
        <g key={hold.holdId}>
          <rect
            x={x(hold.fromMm)}
            width={x(hold.toMm) - x(hold.fromMm)}
            y="0"
            height={drawnWidth}
            fill={crayonInk[hold.crayon]}
            opacity="0.22"
          />
          <path
            d={crayonWave(x(hold.fromMm) + 10, x(hold.toMm) - 10, drawnWidth / 2)}
            fill="none"
            stroke={crayonInk[hold.crayon]}
            strokeWidth="9"
            strokeLinecap="round"
          />
          <path d={`M${x(hold.toMm)} 0V${drawnWidth}`} stroke="#1b211f" strokeWidth="2" strokeDasharray="7 6" />
        </g>
      ))}
      {chosen ? (
        <rect
          x={x(chosen.fromMm)}
          width={Math.max(2, x(chosen.toMm) - x(chosen.fromMm))}
          y="2"
          height={drawnWidth - 4}
          fill="#ffffff55"
          stroke="#1b211f"
          strokeWidth="3"
          strokeDasharray="10 7"
        />
      ) : null}
    </svg>
  );
}

/** A hand's wavering stroke between two points; short stretches get a dab. */
export function crayonWave(from: number, to: number, y: number, swing = 9): string {
  if (to - from < 12) return `M${(from + to) / 2 - 3} ${y}h6`;
  const waves = Math.max(1, Math.round((to - from) / 160));
  const step = (to - from) / (waves * 2);
  let d = `M${from.toFixed(1)} ${y}`;
  for (let i = 0; i < waves * 2; i++) d += `q${(step / 2).toFixed(1)} ${i % 2 ? swing : -swing} ${step.toFixed(1)} 0`;
  return d;
}
