import type { ReactNode } from "react";

interface CardProps {
  title?: ReactNode;
  /** Beside the title: a link or a count. */
  aside?: ReactNode;
  className?: string;
  children: ReactNode;
}

/** A sheet on the ground: one subject of a page. */
export function Card({ title, aside, className = "", children }: CardProps) {
  return (
    <section className={`rounded-xl border border-line bg-surface p-4 sm:p-5 ${className}`}>
      {title ? (
        <header className="mb-3 flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1">
          <h2 className="text-xl">{title}</h2>
          {aside ? <div className="text-ink-soft">{aside}</div> : null}
        </header>
      ) : null}
      {children}
    </section>
  );
}

interface PageHeadProps {
  title: string;
  /** One line under the title: counts, what this is. */
  lead?: ReactNode;
  /** Buttons to the right, below on a phone. */
  actions?: ReactNode;
  /** Small line above the title: where this is. */
  over?: ReactNode;
}

/** The head of a page; sets the document's title too. */
export function PageHead({ title, lead, actions, over }: PageHeadProps) {
  return (
    <header className="mb-5 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <title>{`${title} · Rayfleck`}</title>
      <div>
        {over ? <p className="font-mono text-ink-soft text-sm">{over}</p> : null}
        <h1 className="text-3xl">{title}</h1>
        {lead ? <p className="mt-1 text-ink-soft">{lead}</p> : null}
      </div>
      {actions ? <div className="flex flex-wrap gap-2">{actions}</div> : null}
    </header>
  );
}
