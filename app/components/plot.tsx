import type { ReactNode } from "react";

export interface Axis {
  from: number;
  to: number;
  ticks: number[];
  print: (tick: number) => string;
  /** What is measured, with its unit. */
  label: string;
}

/** Places in the drawing, 0 to 1000 each way, whatever its size on the screen. */
export interface PlotScale {
  x: (value: number) => number;
  y: (value: number) => number;
  /** The path of a line through points. */
  line: (points: readonly (readonly [number, number])[]) => string;
}

export interface PlotMark {
  x: number;
  y: number;
  text: ReactNode;
  /** Which side of the point the words stand on. */
  side?: "above" | "below";
}

interface PlotProps {
  x: Axis;
  y: Axis;
  /** In words what the plot shows, for those who cannot see it. */
  label: string;
  /** Words at points of the plot. */
  marks?: PlotMark[];
  /** Lines and areas; strokes keep their width at any size with `vectorEffect="non-scaling-stroke"`. */
  children: (scale: PlotScale) => ReactNode;
}

const size = 1000;

/**
 * A plot that fills the width it has: lines stretch, words do not, so that it reads on a phone as on a desk. Axis words
 * are HTML beside the drawing.
 */
export function Plot({ x, y, label, marks = [], children }: PlotProps) {
  const xAt = (value: number) => ((value - x.from) / (x.to - x.from)) * size;
  const yAt = (value: number) => ((y.to - value) / (y.to - y.from)) * size;
  const scale: PlotScale = {
    x: xAt,
    y: yAt,
    line: (points) =>
      points.map(([a, b], i) => `${i === 0 ? "M" : "L"}${xAt(a).toFixed(1)} ${yAt(b).toFixed(1)}`).join(""),
  };
  return (
    <figure className="m-0">
      <p className="mb-1 text-ink-soft text-sm">{y.label}</p>
      <div className="grid grid-cols-[auto_minmax(0,1fr)]">
        <div className="relative mr-2 w-12 text-right font-mono text-ink-soft text-xs" aria-hidden="true">
          {y.ticks.map((tick) => (
            <span key={tick} className="absolute right-0 -translate-y-1/2" style={{ top: `${yAt(tick) / 10}%` }}>
              {y.print(tick)}
            </span>
          ))}
        </div>
        <div className="relative h-52 sm:h-64">
          <svg
            viewBox={`0 0 ${size} ${size}`}
            preserveAspectRatio="none"
            className="absolute inset-0 h-full w-full"
            role="img"
            aria-label={label}
          >
            {y.ticks.map((tick) => (
              <path
                key={tick}
                d={`M0 ${yAt(tick)}H${size}`}
                stroke="currentColor"
                opacity="0.15"
                vectorEffect="non-scaling-stroke"
              />
            ))}
            <path
              d={`M0 0V${size}H${size}`}
              fill="none"
              stroke="currentColor"
              opacity="0.4"
              vectorEffect="non-scaling-stroke"
            />
            {children(scale)}
          </svg>
          {marks.map((mark) => (
            <PlotWords key={`${mark.x} ${mark.y}`} left={xAt(mark.x) / 10} top={yAt(mark.y) / 10} mark={mark} />
          ))}
        </div>
        <span />
        <div className="relative mt-1 h-5 font-mono text-ink-soft text-xs" aria-hidden="true">
          {x.ticks.map((tick) => (
            <span
              key={tick}
              className={`absolute whitespace-nowrap ${shift(xAt(tick) / 10)}`}
              style={{ left: `${xAt(tick) / 10}%` }}
            >
              {x.print(tick)}
            </span>
          ))}
        </div>
      </div>
      <figcaption className="text-right text-ink-soft text-sm">{x.label}</figcaption>
    </figure>
  );
}

/** Words near an edge of the plot lean inwards, so that none is cut off. */
function shift(leftPct: number): string {
  if (leftPct < 8) return "";
  return leftPct > 92 ? "-translate-x-full" : "-translate-x-1/2";
}

function PlotWords({ left, top, mark }: { left: number; top: number; mark: PlotMark }) {
  const below = mark.side === "below";
  const across = left < 30 ? "" : left > 70 ? "-translate-x-full" : "-translate-x-1/2";
  return (
    <span
      className={`absolute whitespace-nowrap rounded bg-surface/80 px-1 font-semibold text-sm ${across} ${below ? "mt-1.5" : "-mt-1.5 -translate-y-full"}`}
      style={{ left: `${left}%`, top: `${top}%` }}
    >
      {mark.text}
    </span>
  );
}

/** A dot that stays round however the plot is stretched. */
export function PlotDot({ x, y, className = "stroke-action" }: { x: number; y: number; className?: string }) {
  return (
    <path
      d={`M${x} ${y}h0.01`}
      strokeWidth="11"
      strokeLinecap="round"
      vectorEffect="non-scaling-stroke"
      className={className}
    />
  );
}

/** Round ticks from a range: about `count` of them, at steps of 1, 2 or 5 and their tens. */
export function roundTicks(from: number, to: number, count = 5): number[] {
  const rough = (to - from) / count;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((multiple) => multiple * power).find((size) => size >= rough) ?? rough;
  const first = Math.ceil(from / step - 1e-9) * step;
  const ticks: number[] = [];
  for (let tick = first; tick <= to + step * 1e-6; tick += step) ticks.push(Math.round(tick * 1e6) / 1e6 + 0);
  return ticks;
}
