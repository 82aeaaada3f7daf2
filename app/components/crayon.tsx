/** The crayons a project can have. Names are words people say; the colour never stands alone. */
export const crayons = ["blue", "red", "ochre", "green", "black", "violet"] as const;
export type Crayon = (typeof crayons)[number];

/** Crayon on wood: the same in a lit and a dim shop, since the wood is. */
export const crayonInk: Record<Crayon, string> = {
  blue: "var(--color-crayon-blue)",
  red: "var(--color-crayon-red)",
  ochre: "var(--color-crayon-ochre)",
  green: "var(--color-crayon-green)",
  black: "var(--color-crayon-black)",
  violet: "var(--color-crayon-violet)",
};

/** A project's name with its crayon beside it: a short waxy stroke, on a scrap of wood so that it shows in the dark too. */
export function ProjectMark({ name, crayon }: { name: string; crayon: Crayon }) {
  return (
    <span className="inline-flex items-center gap-2">
      <svg viewBox="0 0 28 16" className="h-4 w-7 shrink-0" aria-hidden="true">
        <rect width="28" height="16" rx="2" fill="#e2c79b" />
        <path
          d="M4 10c4-5 7-4 10-2s6 2 10-3"
          fill="none"
          stroke={crayonInk[crayon]}
          strokeWidth="3.4"
          strokeLinecap="round"
        />
      </svg>
      <span>{name}</span>
    </span>
  );
}
