import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type ProblemInput, readProblem } from "./problem.ts";
import { solvePlan } from "./solve-plan.ts";
import { boardYields } from "./yield.ts";

function read(input: ProblemInput) {
  const found = readProblem(input);
  if (!found.ok) throw new Error(found.error);
  return found.problem;
}

const INCH = 25.4;

function yieldOf(
  board: Partial<ProblemInput["boards"][number]>,
  part: Partial<ProblemInput["parts"][number]>,
  rules = {},
) {
  const problem = read({
    ...rules,
    boards: [{ id: "b", length: 1000, width: 100, cost: 1, ...board }],
    parts: [{ id: "p", quantity: 1, length: 100, width: 100, ...part }],
  });
  return boardYields(problem, problem.boards, problem.parts[0]!).get("b");
}

describe("what a board gives", () => {
  it("counts pieces with a kerf between them and trims off", () => {
    expect(yieldOf({}, {})).toBe(10);
    expect(yieldOf({}, {}, { kerf: 1 })).toBe(9);
    expect(yieldOf({ length: 1029, width: 108 }, {}, { kerf: 1, endTrim: 10, edgeTrim: 4 })).toBe(10);
    expect(yieldOf({ width: 203 }, {}, { kerf: 3 })).toBe(18);
  });

  it("gives the two plies of one leg blank from an 86 in board, and none from one just too short (common practice)", () => {
    const leg = { length: 42 * INCH, width: (3 + 5 / 8) * INCH, plies: 2, sameBoard: true };
    expect(yieldOf({ length: 86 * INCH, width: 3.75 * INCH }, leg, { kerf: INCH / 8 })).toBe(2);
    expect(yieldOf({ length: 84 * INCH, width: 3.75 * INCH }, leg, { kerf: INCH / 8 })).toBe(0);
  });

  it("keeps ring windows, defects, species and thickness", () => {
    const rings = [10, 40, 40, 40, 10];
    expect(yieldOf({ width: 500, rings }, { rings: { min: 30, max: 60, share: 1 } })).toBe(30);
    expect(yieldOf({ width: 500 }, { rings: { min: 30, max: 60, share: 1 } })).toBe(0);
    expect(yieldOf({ defects: [{ x: 150, y: 10, length: 10, width: 10 }] }, {})).toBe(9);
    expect(yieldOf({ species: "ash" }, { species: ["oak", "ash"] })).toBe(10);
    expect(yieldOf({ species: "elm" }, { species: ["oak", "ash"] })).toBe(0);
    expect(yieldOf({ quarters: "4/4" }, { quarters: 8 })).toBe(0);
  });

  it("never promises more than a plan then finds", () => {
    fc.assert(
      fc.property(
        fc.record({ length: fc.integer({ min: 400, max: 1500 }), width: fc.integer({ min: 60, max: 300 }) }),
        fc.record({
          length: fc.integer({ min: 90, max: 700 }),
          width: fc.integer({ min: 30, max: 120 }),
          rotate: fc.boolean(),
        }),
        fc.option(fc.array(fc.integer({ min: 0, max: 90 }), { minLength: 3, maxLength: 9 }), { nil: undefined }),
        (board, part, rings) => {
          const window = rings && { min: 20, max: 70, share: 0.7 };
          const input = {
            kerf: 3,
            boards: [{ id: "b", cost: 1, rings, ...board }],
            parts: [{ id: "p", quantity: 1, rings: window, ...part }],
          };
          const problem = read(input);
          const count = boardYields(problem, problem.boards, problem.parts[0]!).get("b")!;
          if (count === 0) return;
          const plan = solvePlan(read({ ...input, parts: [{ ...input.parts[0]!, quantity: count }] }));
          expect(plan.unplaced).toEqual([]);
        },
      ),
      { numRuns: 60, seed: 5 },
    );
  });

  it("looks at a thousand boards in half a second", () => {
    const problem = read({
      kerf: 3,
      boards: Array.from({ length: 1000 }, (_, i) => ({
        id: `b${i}`,
        length: 1800 + ((i * 37) % 1900),
        width: 110 + ((i * 13) % 190),
        cost: 1,
        rings: Array.from({ length: 9 }, (_, s) => (i * 7 + s * 9) % 90),
      })),
      parts: [{ id: "p", quantity: 1, length: 700, width: 60, rings: { min: 30, max: 60, share: 0.8 } }],
    });
    boardYields(problem, problem.boards.slice(0, 50), problem.parts[0]!);
    const started = performance.now();
    const yields = boardYields(problem, problem.boards, problem.parts[0]!);
    expect(performance.now() - started).toBeLessThan(500);
    expect([...yields.values()].filter((count) => count > 0).length).toBeGreaterThan(300);
  });
});
