import type { ReactNode } from "react";

/** The page of somebody who is not at work yet: signing in, opening a shop, accepting an invitation. */
export function FrontDoor({ title, lead, children }: { title: string; lead?: ReactNode; children: ReactNode }) {
  return (
    <>
      <header className="bg-bar px-4 py-3 text-bar-ink">
        <p className="mx-auto flex max-w-md items-center gap-2.5 font-bold font-display text-xl">
          <img src="/icon.svg" alt="" className="h-8 w-8" />
          Rayfleck
        </p>
      </header>
      <main className="mx-auto grid max-w-md gap-4 px-4 py-8">
        <title>{`${title} · Rayfleck`}</title>
        <LadderOfEnds />
        <h1 className="text-3xl">{title}</h1>
        {lead ? <p className="text-ink-soft">{lead}</p> : null}
        {children}
      </main>
    </>
  );
}

/** Three board ends on stickers: flat, rift and quartered, drawn by hand as a sign, not from any record. */
function LadderOfEnds() {
  return (
    <svg viewBox="0 0 448 120" className="w-full" aria-hidden="true">
      <defs>
        <clipPath id="door-end">
          <rect width="200" height="30" rx="1.5" />
        </clipPath>
      </defs>
      <rect y="108" width="448" height="12" rx="3" className="fill-iron-700" />
      <End
        x={8}
        y={78}
        d={[60, 74, 88, 102, 116, 130]
          .map((r) => `M${100 - r * 1.6} 34A${r * 1.7} ${r} 0 0 1 ${100 + r * 1.6} 34`)
          .join("")}
        base="#dcc59a"
        line="#b0905c"
      />
      <End
        x={226}
        y={78}
        d={Array.from({ length: 19 }, (_, i) => `M${i * 14 - 40} 34 ${i * 14} -4`).join("")}
        base="#d3a877"
        line="#a5743f"
      />
      <rect x="8" y="66" width="420" height="8" className="fill-iron-500" opacity="0.7" />
      <End
        x={60}
        y={34}
        d={Array.from({ length: 22 }, (_, i) => `M${i * 9.5 + 2} 34 ${i * 9.5 + 4} -2`).join("")}
        base="#8a5f42"
        line="#5d3d29"
      />
      <path
        d="M276 50c16-9 30-7 46-1s30 7 52-3"
        fill="none"
        className="stroke-crayon-blue"
        strokeWidth="6"
        strokeLinecap="round"
      />
    </svg>
  );
}

function End({ x, y, d, base, line }: { x: number; y: number; d: string; base: string; line: string }) {
  return (
    <g transform={`translate(${x} ${y})`}>
      <rect width="200" height="30" rx="1.5" fill={base} />
      <path d={d} clipPath="url(#door-end)" fill="none" stroke={line} strokeWidth="2" />
    </g>
  );
}
