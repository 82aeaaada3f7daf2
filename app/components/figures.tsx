import type { ReactNode } from "react";
import { Card } from "./card.tsx";
import { Facts } from "./facts.tsx";
import { Notice } from "./notice.tsx";

interface FiguresProps {
  title: ReactNode;
  /** Beside the title: a link or a count. */
  aside?: ReactNode;
  /** The one figure asked for, set large. */
  main?: { label: string; value: ReactNode };
  /** A plot or drawing, above the figures. */
  drawing?: ReactNode;
  rows?: { label: string; value: ReactNode }[];
  /** What the formulas say about lying outside a published range, or about what they left out. */
  beyond?: (string | null | undefined)[];
  children?: ReactNode;
}

/** One answer of a calculator or a card: drawing, the figure asked for, the figures behind it, and any caution on them. */
export function Figures({ title, aside, main, drawing, rows = [], beyond = [], children }: FiguresProps) {
  return (
    <Card title={title} aside={aside}>
      {main ? (
        <p className="mb-3">
          <span className="block text-ink-soft">{main.label}</span>
          <strong className="font-display text-3xl tabular-nums">{main.value}</strong>
        </p>
      ) : null}
      {drawing ? <div className="mb-3">{drawing}</div> : null}
      {rows.length > 0 ? <Facts rows={rows} /> : null}
      {children}
      <Beyond says={beyond} />
    </Card>
  );
}

/** What lies outside a published range is said on the screen, beside the figures it concerns. */
export function Beyond({ says }: { says: (string | null | undefined)[] }) {
  const said = [...new Set(says.filter((text) => text != null && text !== ""))];
  if (said.length === 0) return null;
  return (
    <Notice kind="caution" title="Outside what was published, or known less well" className="mt-3">
      {said.map((text) => (
        <p key={text}>{text}</p>
      ))}
    </Notice>
  );
}
