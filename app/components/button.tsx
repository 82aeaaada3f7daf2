import type { ButtonHTMLAttributes } from "react";
import { Link, type LinkProps } from "react-router";

const look = {
  /** The one main action of a screen. */
  main: "bg-action text-action-ink hover:bg-action-hover",
  plain: "border border-line-strong bg-surface text-ink hover:bg-sunk",
  quiet: "text-link underline-offset-4 hover:underline",
  danger: "border border-wrong text-wrong hover:bg-wrong-ground",
} as const;

export type ButtonLook = keyof typeof look;

const shape =
  "inline-flex min-h-11 items-center justify-center gap-2 rounded-lg px-4 font-semibold no-underline transition-colors disabled:cursor-not-allowed disabled:opacity-55 print:hidden";

/** The class names of a button, for elements that are buttons only in looks. */
export function buttonClass(kind: ButtonLook = "plain", more = ""): string {
  return `${shape} ${look[kind]} ${more}`;
}

interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  look?: ButtonLook;
}

/** A button at least 44 px high, for hands in gloves. `type` is "submit" unless told otherwise. */
export function Button({ look: kind = "plain", className = "", type = "submit", ...rest }: ButtonProps) {
  return <button type={type} className={buttonClass(kind, className)} {...rest} />;
}

interface ButtonLinkProps extends LinkProps {
  look?: ButtonLook;
  className?: string;
}

/** A link that leads to the next step, drawn as a button. */
export function ButtonLink({ look: kind = "plain", className = "", ...rest }: ButtonLinkProps) {
  return <Link className={buttonClass(kind, className)} {...rest} />;
}
