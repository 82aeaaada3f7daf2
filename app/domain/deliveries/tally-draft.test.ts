import { describe, expect, it } from "vitest";
import { chooseDraft, sameRows } from "./tally-draft.ts";

const row = (width: string) => ({ count: "", width, length: "8'", quarters: "4", species: "white-oak" });
const blank = { ...row(""), length: "" };
const server = (more: object = {}) => ({
  rows: [row("7")],
  version: 3,
  writer: "desk",
  byName: "Ann",
  at: null,
  ...more,
});
const local = (more: object = {}) => ({ rows: [row("8")], base: 3, writer: "phone", unsent: true, ...more });

describe("the tally a page begins with", () => {
  it.each([
    ["nothing on this device", null, server(), "server"],
    ["everything sent, and another device went on since", local({ unsent: false, base: 2 }), server(), "server"],
    ["typed without a connection, nobody else meanwhile", local(), server(), "local"],
    ["typed without a connection, another device meanwhile", local({ base: 2 }), server(), "ask"],
    ["sent, but the answer was lost", local({ base: 2 }), server({ writer: "phone" }), "local"],
    ["the same on both", local({ base: 2, rows: [row("7"), blank] }), server(), "server"],
    ["nothing but blank rows here", local({ base: 2, rows: [blank] }), server(), "server"],
    ["nothing but blank rows there", local({ base: 2 }), server({ rows: [blank] }), "local"],
  ])("%s", (_, here, there, expected) => expect(chooseDraft(here, there)).toBe(expected));
});

describe("two tallies", () => {
  it("are the same when they differ by blank rows only", () => {
    expect(sameRows([row("7"), blank], [row("7")])).toBe(true);
    expect(sameRows([row("7")], [row("8")])).toBe(false);
    expect(sameRows([row("7")], [row("7"), row("7")])).toBe(false);
  });
});
