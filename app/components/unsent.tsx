import { useEffect, useState } from "react";

/**
 * Holds a form back while the device has no connection, instead of losing the page to an error and what was typed with it. Says so at the foot of the
 * screen, where the thumb is, until the connection is back.
 */
export function Unsent() {
  const [isHeldBack, setHeldBack] = useState(false);
  useEffect(() => {
    function holdBack(event: SubmitEvent) {
      if (navigator.onLine) return;
      event.preventDefault();
      event.stopPropagation();
      setHeldBack(true);
    }
    const goOn = () => setHeldBack(false);
    // Before the router hears of it.
    window.addEventListener("submit", holdBack, { capture: true });
    window.addEventListener("online", goOn);
    return () => {
      window.removeEventListener("submit", holdBack, { capture: true });
      window.removeEventListener("online", goOn);
    };
  }, []);
  return (
    <div role="status" className="sticky bottom-0 z-10" data-screen-only>
      {isHeldBack ? (
        <p className="border-caution border-t-4 bg-caution-ground px-4 py-3 text-ink">
          <strong className="block text-caution">No connection: not sent</strong>
          What you typed is still here. Send it again when the connection is back.
        </p>
      ) : null}
    </div>
  );
}
