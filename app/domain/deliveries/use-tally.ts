import { type Dispatch, useCallback, useEffect, useReducer, useRef, useState } from "react";
import type { TallyRow } from "./tally.ts";
import { chooseDraft, type KeptDraft } from "./tally-draft.ts";
import { createTallyKeeper, type KeeperState, type TallyKeeper } from "./tally-keeper.ts";
import { readOnDevice, writeOnDevice } from "./tally-on-device.ts";
import { lookAtDraft, sendDraft, type TallyOf } from "./tally-requests.ts";
import { changeGrid, type Grid, type GridAction, openGrid } from "./tally-rows.ts";

export interface OpenTally {
  grid: Grid;
  change: Dispatch<GridAction>;
  /** False until this device has looked what it holds; typing before that could be lost. */
  isReady: boolean;
  state: KeeperState;
  /** Makes sure that the server has all of it and nobody has newer: before the tally is saved. */
  flush: () => Promise<KeeperState>;
  keepMine: () => void;
  takeTheirs: () => void;
}

/** The rows of a tally being typed, kept on this device and on the server. */
export function useTally(
  { deliveryId, after }: TallyOf,
  server: KeptDraft,
  carried: Pick<TallyRow, "quarters" | "species">,
): OpenTally {
  const [grid, change] = useReducer(changeGrid, null, () => openGrid(server.rows, carried));
  const [state, setState] = useState<KeeperState>({ at: "kept" });
  const [isReady, setReady] = useState(false);
  const keeper = useRef<TallyKeeper | null>(null);
  // What the page began with; the server's answers come through the keeper from then on.
  const opened = useRef({ server, carried });

  useEffect(() => {
    const { server, carried } = opened.current;
    const of = { deliveryId, after };
    const local = readOnDevice(of);
    const choice = chooseDraft(local, server);
    const rows = choice === "server" || !local ? server.rows : local.rows;
    const own = createTallyKeeper(
      {
        writer: crypto.randomUUID(),
        send: (draft) => sendDraft(of, draft),
        look: () => lookAtDraft(of),
        write: (draft) => writeOnDevice(of, draft),
        onState: setState,
      },
      { rows, base: server.version, unsent: choice === "local" },
    );
    keeper.current = own;
    if (choice !== "server") change({ do: "replace", rows, carried });
    if (choice === "ask") own.offer(server);
    setReady(true);
    const back = () => document.visibilityState === "visible" && void own.lookAgain();
    if (choice === "local") void own.flush();
    document.addEventListener("visibilitychange", back);
    window.addEventListener("online", back);
    return () => {
      document.removeEventListener("visibilitychange", back);
      window.removeEventListener("online", back);
      own.stop();
    };
  }, [deliveryId, after]);

  useEffect(() => {
    if (isReady) keeper.current?.typed(grid.rows.map(withoutKey));
  }, [grid.rows, isReady]);

  return {
    grid,
    change,
    isReady,
    state,
    flush: useCallback(async () => (await keeper.current?.flush()) ?? { at: "offline" }, []),
    keepMine: () => void keeper.current?.keepMine(),
    takeTheirs: () => {
      const rows = keeper.current?.takeTheirs();
      if (rows) change({ do: "replace", rows, carried: opened.current.carried });
    },
  };
}

function withoutKey({ count, width, length, quarters, species }: TallyRow): TallyRow {
  return { count, width, length, quarters, species };
}
