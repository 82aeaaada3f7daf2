import type { TallyRow } from "./tally.ts";
import { type KeptDraft, type LocalDraft, sameRows } from "./tally-draft.ts";

/** How the tally on this screen stands with the server. */
export type KeeperState =
  | { at: "kept" }
  | { at: "sending" }
  /** The server cannot be reached: what is typed is kept on this device, and sent as soon as it can be. */
  | { at: "offline" }
  /** The server answers and will not take it: signed out, or the delivery is gone. */
  | { at: "refused" }
  /** Another page kept something else meanwhile: a person decides. */
  | { at: "newer elsewhere"; theirs: KeptDraft }
  | { at: "tallied" };

export type SendAnswer =
  | { at: "kept"; version: number }
  | { at: "newer"; draft: KeptDraft }
  | { at: "tallied" }
  | { at: "unreachable" }
  | { at: "refused" };

export interface KeeperOptions {
  /** This opened page; no other has the same. */
  writer: string;
  send: (draft: { rows: TallyRow[]; version: number; writer: string }) => Promise<SendAnswer>;
  /** What the server keeps now; null when it cannot be reached. */
  look: () => Promise<{ isTallied: boolean; draft: KeptDraft } | null>;
  write: (draft: LocalDraft) => void;
  onState: (state: KeeperState) => void;
  /** How long typing must rest before it is sent, and how long to wait before the server is tried again. */
  delaysMs?: { rest: number; again: number };
}

export type TallyKeeper = ReturnType<typeof createTallyKeeper>;

/**
 * Keeps a tally while it is typed: on this device at once, on the server soon after, one sending at a time. Whatever another page kept meanwhile is
 * never overwritten: it is offered, and nothing is sent until somebody has chosen.
 */
export function createTallyKeeper(options: KeeperOptions, start: { rows: TallyRow[]; base: number; unsent: boolean }) {
  const { writer, send, look, write, onState, delaysMs = { rest: 800, again: 5_000 } } = options;
  let { rows, base, unsent } = start;
  let state: KeeperState = { at: "kept" };
  let timer: ReturnType<typeof setTimeout> | undefined;
  let sending: Promise<void> | null = null;

  function become(next: KeeperState) {
    state = next;
    onState(next);
  }
  function keepHere() {
    write({ rows, base, writer, unsent });
  }
  function after(ms: number) {
    clearTimeout(timer);
    timer = setTimeout(() => void (unsent ? sendAll() : lookNow()), ms);
  }
  const isHalted = () => state.at === "newer elsewhere" || state.at === "tallied";

  async function sendAll(): Promise<void> {
    clearTimeout(timer);
    sending ??= sendUntilDone().finally(() => {
      sending = null;
    });
    await sending;
  }
  async function sendUntilDone() {
    while (unsent && !isHalted()) {
      const sent = rows;
      become({ at: "sending" });
      const answer = await send({ rows: sent, version: base, writer });
      if (answer.at === "kept") {
        base = answer.version;
        unsent = rows !== sent;
      } else if (answer.at === "newer") {
        meet(answer.draft);
      } else if (answer.at === "tallied") {
        become({ at: "tallied" });
      } else {
        keepHere();
        become(answer.at === "refused" ? { at: "refused" } : { at: "offline" });
        return after(delaysMs.again);
      }
      keepHere();
    }
    if (!isHalted()) become({ at: "kept" });
  }
  /** Asks what the server keeps, which also tells whether it can be reached. */
  async function lookNow() {
    const seen = await look();
    if (unsent || isHalted()) return;
    if (!seen) {
      become({ at: "offline" });
      return after(delaysMs.again);
    }
    if (seen.isTallied) return become({ at: "tallied" });
    if (seen.draft.version !== base) meet(seen.draft);
    if (!isHalted()) become({ at: "kept" });
  }
  /** The server has moved on: by this very page, whose answer was lost, or by another. */
  function meet(draft: KeptDraft) {
    if (draft.writer === writer) base = draft.version;
    else if (sameRows(draft.rows, rows)) {
      base = draft.version;
      unsent = false;
    } else become({ at: "newer elsewhere", theirs: draft });
  }

  return {
    /** The rows as they stand after something was typed. */
    typed(next: TallyRow[]) {
      if (sameRows(next, rows)) return;
      rows = next;
      unsent = true;
      keepHere();
      if (!isHalted()) after(delaysMs.rest);
    },
    /** Makes sure that the server has all of it and nobody has newer, and says how that went: before the tally is saved. */
    async flush(): Promise<KeeperState> {
      await sending;
      if (unsent) await sendAll();
      else if (!isHalted()) await lookNow();
      return state;
    },
    /** Looks whether another page went on: after this one was away. */
    async lookAgain() {
      if (isHalted()) return;
      await (unsent ? sendAll() : lookNow());
    },
    /** Puts these rows in the place of what another page kept. */
    async keepMine() {
      if (state.at !== "newer elsewhere") return;
      base = state.theirs.version;
      unsent = true;
      become({ at: "kept" });
      keepHere();
      await sendAll();
    },
    /** Lets what another page kept take the place of these rows. */
    takeTheirs(): TallyRow[] | null {
      if (state.at !== "newer elsewhere") return null;
      ({ rows, version: base } = state.theirs);
      unsent = false;
      keepHere();
      become({ at: "kept" });
      return rows;
    },
    /** Goes on with what this device holds while the server holds something else: a person decides. */
    offer(theirs: KeptDraft) {
      become({ at: "newer elsewhere", theirs });
    },
    stop() {
      clearTimeout(timer);
    },
  };
}
