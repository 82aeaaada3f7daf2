import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { TallyRow } from "./tally.ts";
import type { KeptDraft, LocalDraft } from "./tally-draft.ts";
import { createTallyKeeper, type KeeperState, type SendAnswer } from "./tally-keeper.ts";

const row = (width: string): TallyRow => ({ count: "", width, length: "8'", quarters: "4", species: "white-oak" });
const theirs: KeptDraft = { rows: [row("7")], version: 9, writer: "desk", byName: "Ann", at: null };

function open(answers: SendAnswer[], start = { rows: [] as TallyRow[], base: 0, unsent: false }) {
  const sent: { rows: TallyRow[]; version: number }[] = [];
  const kept: LocalDraft[] = [];
  const states: KeeperState["at"][] = [];
  const seen = { isTallied: false, draft: theirs, isReached: true };
  const keeper = createTallyKeeper(
    {
      writer: "phone",
      send: async ({ rows, version }) => {
        sent.push({ rows, version });
        return answers.shift() ?? { at: "unreachable" };
      },
      look: async () => (seen.isReached ? seen : null),
      write: (draft) => kept.push(draft),
      onState: ({ at }) => states.push(at),
      delaysMs: { rest: 100, again: 1_000 },
    },
    start,
  );
  return { keeper, sent, kept, states, seen };
}

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe("a tally while it is typed", () => {
  it("is on this device at once, and on the server when typing rests", async () => {
    const { keeper, sent, kept } = open([{ at: "kept", version: 1 }]);
    keeper.typed([row("8")]);
    keeper.typed([row("8"), row("9")]);
    expect(kept.at(-1)).toMatchObject({ rows: [row("8"), row("9")], unsent: true, base: 0 });
    expect(sent).toEqual([]);
    await vi.advanceTimersByTimeAsync(100);
    expect(sent).toEqual([{ rows: [row("8"), row("9")], version: 0 }]);
    expect(kept.at(-1)).toMatchObject({ unsent: false, base: 1 });
  });

  it("survives a lost connection: it tries again by itself until the server has it", async () => {
    const { keeper, sent, kept, states } = open([
      { at: "unreachable" },
      { at: "unreachable" },
      { at: "kept", version: 1 },
    ]);
    keeper.typed([row("8")]);
    await vi.advanceTimersByTimeAsync(100);
    expect(states.at(-1)).toBe("offline");
    expect(kept.at(-1)).toMatchObject({ rows: [row("8")], unsent: true });
    await vi.advanceTimersByTimeAsync(2_000);
    expect(sent).toHaveLength(3);
    expect(states.at(-1)).toBe("kept");
  });

  it("never overwrites what another page kept: it offers that, and sends nothing until somebody chose", async () => {
    const { keeper, sent, kept, states } = open([
      { at: "newer", draft: theirs },
      { at: "kept", version: 10 },
    ]);
    keeper.typed([row("8")]);
    await vi.advanceTimersByTimeAsync(100);
    expect(states.at(-1)).toBe("newer elsewhere");
    keeper.typed([row("8"), row("9")]);
    await vi.advanceTimersByTimeAsync(5_000);
    expect(sent).toHaveLength(1);
    expect(kept.at(-1)).toMatchObject({ rows: [row("8"), row("9")], unsent: true });

    await keeper.keepMine();
    expect(sent.at(-1)).toEqual({ rows: [row("8"), row("9")], version: 9 });
    expect(states.at(-1)).toBe("kept");
  });

  it("takes theirs when that is chosen", async () => {
    const { keeper, sent, kept } = open([{ at: "newer", draft: theirs }]);
    keeper.typed([row("8")]);
    await vi.advanceTimersByTimeAsync(100);
    expect(keeper.takeTheirs()).toEqual(theirs.rows);
    expect(kept.at(-1)).toMatchObject({ rows: theirs.rows, base: 9, unsent: false });
    await vi.advanceTimersByTimeAsync(5_000);
    expect(sent).toHaveLength(1);
  });

  it("knows its own sending again when only the answer was lost", async () => {
    const own = { ...theirs, writer: "phone" };
    const { keeper, sent, states } = open([
      { at: "newer", draft: own },
      { at: "kept", version: 10 },
    ]);
    keeper.typed([row("8")]);
    await vi.advanceTimersByTimeAsync(100);
    expect(sent.map(({ version }) => version)).toEqual([0, 9]);
    expect(states).not.toContain("newer elsewhere");
  });

  it("is offered what another page kept when this one comes back, and stops when the delivery is tallied", async () => {
    const { keeper, states, seen } = open([], { rows: [row("8")], base: 4, unsent: false });
    await keeper.lookAgain();
    expect(states.at(-1)).toBe("newer elsewhere");
    keeper.takeTheirs();
    seen.isTallied = true;
    await keeper.lookAgain();
    expect(states.at(-1)).toBe("tallied");
  });

  it("finds out before it is saved that there is no connection, or that somebody has newer, though nothing was left to send", async () => {
    const { keeper, seen, states } = open([], { rows: [row("8")], base: 9, unsent: false });
    expect((await keeper.flush()).at).toBe("kept");
    seen.isReached = false;
    expect((await keeper.flush()).at).toBe("offline");
    seen.isReached = true;
    await vi.advanceTimersByTimeAsync(1_000);
    expect(states.at(-1)).toBe("kept");
    seen.draft = { ...theirs, version: 10 };
    expect((await keeper.flush()).at).toBe("newer elsewhere");
  });

  it("says before it is saved whether the server has all of it", async () => {
    const { keeper } = open([{ at: "kept", version: 1 }, { at: "unreachable" }]);
    keeper.typed([row("8")]);
    expect((await keeper.flush()).at).toBe("kept");
    keeper.typed([row("9")]);
    expect((await keeper.flush()).at).toBe("offline");
    keeper.stop();
  });

  it("does not send what says the same", async () => {
    const { keeper, sent } = open([], { rows: [row("8")], base: 4, unsent: false });
    keeper.typed([row("8"), { ...row(""), length: "" }]);
    await vi.advanceTimersByTimeAsync(5_000);
    expect(sent).toEqual([]);
  });
});
