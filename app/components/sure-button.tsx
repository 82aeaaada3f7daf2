import { type ComponentProps, useEffect, useState } from "react";
import { Button } from "./button.tsx";

const forgetMs = 4_000;

/** A button for what cannot be taken back: the first press asks, the second does. It forgets after a few seconds, or when one goes elsewhere. */
export function SureButton({ children, sure, onClick, ...rest }: ComponentProps<typeof Button> & { sure: string }) {
  const [asked, setAsked] = useState(false);
  useEffect(() => {
    if (!asked) return;
    const timer = setTimeout(() => setAsked(false), forgetMs);
    return () => clearTimeout(timer);
  }, [asked]);
  return (
    <Button
      {...rest}
      {...(asked ? { look: "danger" as const, "aria-label": undefined } : {})}
      aria-live="polite"
      onBlur={() => setAsked(false)}
      onClick={(event) => {
        onClick?.(event);
        if (asked) return;
        event.preventDefault();
        setAsked(true);
      }}
    >
      {asked ? sure : children}
    </Button>
  );
}
