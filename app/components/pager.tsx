import { Link, useLocation, useSearchParams } from "react-router";
import { buttonClass } from "./button.tsx";

/** Earlier and later pages of a list; the page is in the URL beside whatever filters the list. */
export function Pager({ page, pages, label }: { page: number; pages: number; label: string }) {
  const [params] = useSearchParams();
  const { pathname } = useLocation();
  if (pages <= 1) return null;
  const to = (n: number) => {
    const next = new URLSearchParams(params);
    if (n === 1) next.delete("page");
    else next.set("page", String(n));
    return `${pathname}?${next}`;
  };
  return (
    <nav aria-label={label} className="mt-4 flex items-center justify-between gap-3" data-screen-only>
      {page > 1 ? (
        <Link to={to(page - 1)} rel="prev" className={buttonClass("plain")}>
          Earlier
        </Link>
      ) : (
        <span />
      )}
      <span className="text-ink-soft">
        Page {page} of {pages}
      </span>
      {page < pages ? (
        <Link to={to(page + 1)} rel="next" className={buttonClass("plain")}>
          Later
        </Link>
      ) : (
        <span />
      )}
    </nav>
  );
}
