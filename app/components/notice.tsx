import { type ReactNode, useEffect, useRef } from "react";

const looks = {
  wrong: "border-wrong bg-wrong-ground text-wrong",
  caution: "border-caution bg-caution-ground text-caution",
  good: "border-good bg-good-ground text-good",
  plain: "border-line-strong bg-sunk text-ink",
} as const;

interface NoticeProps {
  kind?: keyof typeof looks;
  title?: string;
  children?: ReactNode;
  className?: string;
}

/**
 * Something that must be read: a refusal, a caution, or word that a thing was done. Announced when it appears; a refusal comes into view too, since the
 * button that was pressed may be a screen below it on a phone. It never moves the page under somebody who is typing.
 */
export function Notice({ kind = "plain", title, children, className = "" }: NoticeProps) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (kind === "wrong" && !document.activeElement?.matches("input, select, textarea"))
      box.current?.scrollIntoView({ block: "nearest" });
  }, [kind]);
  return (
    <div
      ref={box}
      role={kind === "wrong" ? "alert" : "status"}
      className={`scroll-my-4 rounded-lg border-l-4 px-4 py-3 ${looks[kind]} ${className}`}
    >
      {title ? <p className="font-semibold">{title}</p> : null}
      {children ? <div className="text-ink">{children}</div> : null}
    </div>
  );
}

interface EmptyProps {
  title: string;
  children: ReactNode;
  action?: ReactNode;
}

/** An empty list says what to do next. */
export function Empty({ title, children, action }: EmptyProps) {
  return (
    <div className="grid justify-items-center gap-3 rounded-xl border border-line-strong border-dashed px-6 py-10 text-center">
      <h2 className="text-xl">{title}</h2>
      <p className="max-w-prose text-ink-soft">{children}</p>
      {action}
    </div>
  );
}
