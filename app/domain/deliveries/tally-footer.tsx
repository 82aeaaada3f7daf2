import { Button } from "#app/components/button.tsx";
import type { KeeperState } from "./tally-keeper.ts";
import type { TallyTotals } from "./tally-totals.ts";

interface TallyFooterProps {
  totals: TallyTotals;
  /** "12 bf short (−5.7 %)", or null where nothing was claimed. */
  difference: string | null;
  state: KeeperState;
  isSaving: boolean;
  maySave: boolean;
}

/** Where the focus goes when there is nothing more to type. */
export const saveButtonId = "tally-save";

const stateWords: Record<KeeperState["at"], string> = {
  kept: "Kept",
  sending: "Keeping",
  offline: "No connection: kept on this device",
  refused: "Kept on this device only",
  "newer elsewhere": "Another device kept a newer tally",
  tallied: "Tallied meanwhile",
};

/** What the tally comes to so far, always in view, and the way to save it. */
export function TallyFooter({ totals, difference, state, isSaving, maySave }: TallyFooterProps) {
  return (
    <div className="sticky bottom-0 z-10 -mx-4 mt-auto border-line border-t bg-surface px-4 py-2.5 shadow-[0_-4px_12px_rgb(0_0_0/0.08)] sm:mx-0 sm:rounded-t-xl sm:border-x">
      <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2">
        <dl className="flex flex-1 flex-wrap items-baseline gap-x-5 gap-y-0">
          <Figure label={totals.count === 1 ? "board" : "boards"} value={String(totals.count)} />
          <Figure label="bf" value={String(totals.boardFeet)} />
          <Figure label="bf unrounded" value={totals.unroundedBoardFeet.toFixed(1)} soft />
          {difference === null ? null : <Figure label="against the claim" value={difference} soft="quiet" />}
        </dl>
        <p role="status" className="text-ink-soft text-sm">
          {totals.unread > 0 ? `${totals.unread} ${totals.unread === 1 ? "row" : "rows"} not read yet. ` : ""}
          {stateWords[state.at]}
        </p>
        <Button id={saveButtonId} look="main" disabled={isSaving || !maySave} className="w-full sm:w-auto">
          {isSaving
            ? "Saving"
            : totals.count === 0
              ? "Save"
              : `Save ${totals.count} ${totals.count === 1 ? "board" : "boards"}`}
        </Button>
      </div>
    </div>
  );
}

function Figure({ label, value, soft }: { label: string; value: string; soft?: boolean | "quiet" }) {
  return (
    <div className="flex flex-row-reverse items-baseline gap-1.5">
      <dt className={`text-ink-soft text-sm ${soft === "quiet" ? "sr-only sm:not-sr-only" : ""}`}>{label}</dt>
      <dd className={`tabular-nums ${soft ? "" : "font-bold text-xl"}`}>{value}</dd>
    </div>
  );
}
