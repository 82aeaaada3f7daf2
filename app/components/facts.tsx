import type { ReactNode } from "react";

/** Label and value pairs, a rule between them: the record beside the board. */
export function Facts({ rows }: { rows: { label: string; value: ReactNode }[] }) {
  return (
    <dl className="divide-y divide-line">
      {rows.map(({ label, value }) => (
        <div key={label} className="flex flex-wrap items-baseline justify-between gap-x-4 gap-y-0.5 py-2.5">
          <dt className="text-ink-soft">{label}</dt>
          <dd className="text-right font-semibold tabular-nums">{value}</dd>
        </div>
      ))}
    </dl>
  );
}

/** One figure in a tile, for a phone's two columns. */
export function Tile({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="rounded-xl border border-line bg-surface px-3.5 py-3">
      <p className="text-ink-soft text-sm">{label}</p>
      <p className="font-semibold text-lg tabular-nums leading-snug">{children}</p>
    </div>
  );
}
