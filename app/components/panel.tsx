import { type ReactNode, useEffect } from "react";
import { Link } from "react-router";

interface PanelProps {
  title: string;
  /** Where "Close" leads: the page underneath. */
  closeTo: string;
  children: ReactNode;
}

/** The part of an address that brings an opened panel into view. */
export const toPanel = "#panel";

/** A form opened inside a page, where the thing it changes stands. It has an address of its own, so it works without JavaScript and survives a reload. */
export function Panel({ title, closeTo, children }: PanelProps) {
  // Whoever saves or closes by keyboard goes on from the page, not from the top of the browser's window.
  useEffect(() => {
    return () => {
      if (document.activeElement === document.body) document.getElementById("content")?.focus({ preventScroll: true });
    };
  }, []);
  return (
    <section
      id="panel"
      aria-label={title}
      className="my-4 scroll-mt-4 rounded-xl border-2 border-action bg-surface p-4 sm:p-5"
    >
      <header className="mb-3 flex items-center justify-between gap-4">
        <h2 className="text-xl">{title}</h2>
        <Link
          to={closeTo}
          preventScrollReset
          className="inline-flex min-h-11 items-center rounded-lg px-3 font-semibold text-link underline-offset-4 hover:underline"
        >
          Close
        </Link>
      </header>
      {children}
    </section>
  );
}
