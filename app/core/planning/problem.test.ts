import { describe, expect, it } from "vitest";
import { readProblem } from "./problem.ts";

const board = { id: "b", length: 1000, width: 100, cost: 5 };
const part = { id: "p", quantity: 1, length: 400, width: 100 };

function errorOf(input: unknown): string {
  const read = readProblem(input);
  return read.ok ? "" : read.error;
}

describe("reading a problem", () => {
  it("fills in what may be left out", () => {
    const read = readProblem({ boards: [board], parts: [part] });
    expect(read).toMatchObject({
      ok: true,
      problem: { kerf: 0, endTrim: 0, edgeTrim: 0, offcutCredit: 0, boardCharge: 0, stages: 2, timeLimit: 10 },
    });
    expect(read.ok && read.problem.parts[0]).toMatchObject({ rotate: false, plies: 1, sameBoard: false });
  });

  it.each([
    ["a zero size", { boards: [board], parts: [{ ...part, length: 0 }] }, /^parts\[0\]\.length: /],
    ["no size", { boards: [{ id: "b", width: 3, cost: 1 }], parts: [part] }, /^boards\[0\]\.length: /],
    ["a quantity that is no count", { boards: [board], parts: [{ ...part, quantity: 1.5 }] }, /quantity/],
    ["no parts", { boards: [board], parts: [] }, /^parts: /],
    ["a part twice", { boards: [board], parts: [part, part] }, /"p" is there twice/],
    ["a board twice", { boards: [board, board], parts: [part] }, /"b" is there twice/],
    ["a window upside down", { boards: [board], parts: [{ ...part, rings: { min: 60, max: 30 } }] }, /ring angle/],
    ["a part fixed to no board of the rack", { boards: [board], parts: [{ ...part, boards: ["c"] }] }, /no board "c"/],
    ["trims that leave nothing", { edgeTrim: 50, boards: [board], parts: [part] }, /after the trims/],
    ["four stages", { stages: 4, boards: [board], parts: [part] }, /^stages: /],
    ["a list", [], /JSON object/],
    ["a quantity out of reason", { boards: [board], parts: [{ ...part, quantity: 100_000 }] }, /too many/],
  ])("refuses %s, and says where", (_, input, words) => {
    expect(errorOf(input)).toMatch(words);
  });

  it("refuses a hundred thousand parts at once", () => {
    const parts = Array.from({ length: 100_000 }, (_, i) => ({ ...part, id: `p${i}` }));
    const started = performance.now();
    expect(errorOf({ boards: [board], parts })).toMatch(/^parts: 100000 are too many/);
    expect(performance.now() - started).toBeLessThan(100);
  });
});
