import { type Dispatch, useCallback, useEffect, useMemo, useRef, useState } from "react";
import { Button } from "#app/components/button.tsx";
import type { LengthUnit } from "#app/core/lengths/length-unit.ts";
import { isBlank, type RowField } from "./tally.ts";
import { boxId, type RowDoings, type Step, TallyRowFields, tallyColumns } from "./tally-row.tsx";
import { type Grid, type GridAction, settled } from "./tally-rows.ts";
import type { TallyTotals } from "./tally-totals.ts";

interface TallyGridProps {
  grid: Grid;
  change: Dispatch<GridAction>;
  totals: TallyTotals;
  unit: LengthUnit;
  isReady: boolean;
  isTried: boolean;
  /** Enter in a blank last row: nothing more to type. */
  onEnd: () => void;
}

/** The rows of a tally, made for speed: width, Enter, length, Enter, and on the next row is the width again. */
export function TallyGrid({ grid, change, totals, unit, isReady, isTried, onEnd }: TallyGridProps) {
  const [said, setSaid] = useState("");
  const [inHand, setInHand] = useState<number | null>(null);
  // The keys read the rows as they are when pressed, and stay the same functions, so that one row's typing redraws one row.
  const now = useRef(grid.rows);
  useEffect(() => {
    now.current = grid.rows;
  });

  const onStep = useCallback(
    (key: number, field: RowField, step: Step) => {
      const rows = now.current;
      const index = rows.findIndex((row) => row.key === key);
      const row = rows[index];
      if (!row) return;
      if (step !== "on") {
        const beside = rows[index + (step === "up" ? -1 : 1)];
        if (beside) focusBox(beside.key, field);
        return;
      }
      if (isBlank(row) && index === rows.length - 1) return onEnd();
      const after = settled(row, unit);
      if (field === "width" && after.length.trim() === "") return focusBox(key, "length");
      if (field === "length" && after.width.trim() === "") return focusBox(key, "width");
      const next = rows[index + 1];
      if (next) focusBox(next.key, "width");
    },
    [unit, onEnd],
  );
  const doings = useMemo<RowDoings>(
    () => ({
      onStep,
      onEnter: setInHand,
      onType: (key, field, value) => change({ do: "type", key, field, value }),
      onLeave: (key) => change({ do: "settle", key, unit }),
      onPaste: (key, text) => change({ do: "paste", key, text }),
      onRemove: (key) => {
        const rows = now.current;
        const index = rows.findIndex((row) => row.key === key);
        change({ do: "remove", key });
        const beside = rows[index + 1] ?? rows[index - 1];
        if (beside) focusBox(beside.key, "width");
      },
    }),
    [change, onStep, unit],
  );

  const last = grid.rows.at(-1)?.key;
  const isFirstLook = useRef(true);
  useEffect(() => {
    if (!isReady || !isFirstLook.current || last === undefined) return;
    isFirstLook.current = false;
    if (window.matchMedia("(pointer: fine)").matches) focusBox(last, "width");
  }, [isReady, last]);
  const words = `${totals.count} boards, ${totals.boardFeet} board feet`;
  useEffect(() => {
    const rest = setTimeout(() => setSaid(words), 1_500);
    return () => clearTimeout(rest);
  }, [words]);

  return (
    <fieldset disabled={!isReady} className="min-w-0">
      <legend className="sr-only">Boards of the delivery</legend>
      <div
        aria-hidden="true"
        className={`${tallyColumns} border-line border-b pb-1 font-semibold text-ink-soft text-sm`}
      >
        <span>Row</span>
        <span>Width</span>
        <span>Length</span>
        <span>Pieces</span>
        <span className="hidden md:block">Quarters</span>
        <span className="hidden md:block">Species</span>
      </div>
      <ol>
        {grid.rows.map((row, index) => (
          <TallyRowFields
            key={row.key}
            row={row}
            number={index + 1}
            boardFeet={totals.rows[index]?.boardFeet ?? null}
            isTried={isTried}
            isInHand={row.key === inHand}
            doings={doings}
          />
        ))}
      </ol>
      {grid.removed ? (
        <p role="status" className="mt-2 flex flex-wrap items-center gap-3">
          Row {grid.removed.index + 1} is deleted.
          <Button type="button" onClick={() => change({ do: "bring back" })}>
            Bring it back
          </Button>
        </p>
      ) : null}
      <p aria-live="polite" className="sr-only">
        {said}
      </p>
    </fieldset>
  );
}

function focusBox(key: number, field: RowField): void {
  const box = document.getElementById(boxId(key, field));
  box?.focus();
  if (box instanceof HTMLInputElement) box.select();
}
