import type { LengthUnit } from "#app/core/lengths/length-unit.ts";

/** How a tally is typed, folded away. */
export function TallyHelp({ unit }: { unit: LengthUnit }) {
  const examples =
    unit === "in"
      ? [
          ["8 1/4, then 10'6\"", "width, Enter, length, Enter: on to the next board"],
          ["8.25, then 10", "a bare length under 24 is feet, from there up inches"],
          ["8 1/4 x 10'6\"", "the whole size in the width’s box"],
          ["3 @ 8 x 10", "three boards alike"],
          ["210 x 3050", "millimetres, where inches cannot be meant"],
        ]
      : [
          ["210, then 3050", "width, Enter, length, Enter: on to the next board"],
          ["210, then 3.05", "a bare length under 20 is metres"],
          ["210 x 3050", "the whole size in the width’s box"],
          ["3 @ 210 x 3050", "three boards alike"],
          ["8 1/4 x 10'6\"", "inches and feet, as marked"],
        ];
  return (
    <details className="mb-3">
      <summary className="inline-flex min-h-11 cursor-pointer items-center text-link underline-offset-4 hover:underline">
        How to type it
      </summary>
      <dl className="grid gap-x-6 gap-y-1 sm:grid-cols-[auto_minmax(0,1fr)]">
        {[
          ...examples,
          ["9 to 7", "a board that tapers: width at the near end, then the far"],
          ["↑ ↓", "the same box of the board above or below"],
          ["several lines", "paste them into a width’s box: from a note or a sheet"],
        ].map(([typed, means]) => (
          <div key={typed} className="contents">
            <dt className="font-mono">{typed}</dt>
            <dd className="mb-1 text-ink-soft sm:mb-0">{means}</dd>
          </div>
        ))}
      </dl>
    </details>
  );
}
