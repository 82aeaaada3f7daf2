import { isRouteErrorResponse, Link } from "react-router";

const words: Record<number, { title: string; text: string }> = {
  400: {
    title: "That did not come through right",
    text: "What was sent is not what this page sends. Go back, look at it again, and try once more.",
  },
  401: { title: "Sign in first", text: "This page belongs to a shop. Sign in and it opens where you left it." },
  403: {
    title: "Not yours to do",
    text: "Your role in this shop does not cover that. An owner can do it, or change your role.",
  },
  404: {
    title: "Nothing on this arm",
    text: "There is no such page or record in this shop. The tag may be from another shop, or the address was cut short.",
  },
  409: {
    title: "Somebody was quicker",
    text: "This record changed while you had it open. Go back and look at it again.",
  },
};

const broken = {
  title: "Something broke on our side",
  text: "What you did may not have been kept. Try once more; if it stays broken, tell the shop's owner what you were doing.",
};

const unreachable = {
  title: "No answer from the shop",
  text: "The connection is gone, or very slow. What was sent last may not have arrived: once the connection is back, open the page again and look.",
};

/** A browser's own error for a request that got no answer; none of ours has this type and these words. */
function isUnanswered(error: unknown): boolean {
  return error instanceof TypeError && /fetch|network|load failed/i.test(error.message);
}

/** What a person sees instead of a page: what happened, in words, and a way on. Status texts of the server are never shown. */
export function ErrorPage({ error }: { error: unknown }) {
  const status = isRouteErrorResponse(error) ? error.status : 500;
  const { title, text } = isUnanswered(error) ? unreachable : (words[status] ?? broken);
  return (
    <main className="page grid min-h-[70vh] content-center justify-items-center gap-4 text-center">
      <title>{`${title} · Rayfleck`}</title>
      <BlankEnd />
      {isUnanswered(error) ? null : <p className="font-mono text-ink-soft text-sm">{status}</p>}
      <h1 className="text-3xl">{title}</h1>
      <p className="max-w-prose text-ink-soft">{text}</p>
      <div className="flex flex-wrap justify-center gap-3">
        <Link
          to="/"
          className="inline-flex min-h-11 items-center rounded-lg bg-action px-5 font-semibold text-action-ink hover:bg-action-hover"
        >
          To the rack
        </Link>
        <Link
          to="/boards"
          className="inline-flex min-h-11 items-center rounded-lg border border-line-strong px-5 font-semibold hover:bg-sunk"
        >
          All boards
        </Link>
      </div>
    </main>
  );
}

/** A board with no reading: dashed, no grain invented. Nothing is known here, so nothing is drawn. */
function BlankEnd() {
  return (
    <svg viewBox="0 0 240 44" className="w-60" aria-hidden="true">
      <rect
        x="1"
        y="1"
        width="238"
        height="42"
        rx="2"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.5"
        strokeDasharray="6 5"
        opacity="0.5"
      />
    </svg>
  );
}
