import { useQuery } from "@tanstack/react-query";
import { useEffect } from "react";
import { useRevalidator } from "react-router";
import { availabilityQuery } from "./boards.queries.ts";
import { LengthText } from "./size-text.tsx";

interface AvailabilityProps {
  boardId: string;
  lengthMm: number;
  /** What this page was drawn with: when the answer differs, the page is drawn anew. */
  drawn: { state: string; holdIds: string[]; freeMm: number };
}

/**
 * How much of the board is free at this moment, though the page may have been open for an hour. The words are those of the page as drawn, so that they
 * never disagree with the holds beside them; the answer to the question asked every few seconds only tells when to draw it anew.
 */
export function Availability({ boardId, lengthMm, drawn }: AvailabilityProps) {
  const { data } = useQuery(availabilityQuery(boardId));
  const { revalidate } = useRevalidator();
  const seen = data ? `${data.state} ${data.holds.map((hold) => hold.holdId).join(" ")}` : null;
  const shown = `${drawn.state} ${drawn.holdIds.join(" ")}`;
  useEffect(() => {
    if (seen !== null && seen !== shown) revalidate();
  }, [seen, shown, revalidate]);
  return (
    <span aria-live="polite">
      {drawn.freeMm >= lengthMm - 0.5 ? (
        "all of it free"
      ) : drawn.freeMm < 1 ? (
        "nothing free"
      ) : (
        <>
          <LengthText mm={drawn.freeMm} /> free
        </>
      )}
    </span>
  );
}
