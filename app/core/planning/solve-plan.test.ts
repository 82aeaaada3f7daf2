import { existsSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { checkPlan } from "./check-layout.ts";
import { type Problem, type ProblemInput, readProblem } from "./problem.ts";
import { solvePlan } from "./solve-plan.ts";

function problemOf(input: ProblemInput): Problem {
  const read = readProblem(input);
  if (!read.ok) throw new Error(read.error);
  return read.problem;
}

function planOf(input: ProblemInput) {
  const problem = problemOf(input);
  const plan = solvePlan(problem);
  expect(checkPlan(problem, plan)).toEqual([]);
  return plan;
}

const INCH = 25.4;

describe("plans that can be reckoned by hand", () => {
  it("takes two plies of one blank from an 86 in board at least 3 3/4 in wide, split at 43 in (common practice)", () => {
    const legBlank = {
      id: "leg",
      quantity: 1,
      plies: 2,
      sameBoard: true,
      length: 42 * INCH,
      width: (3 + 5 / 8) * INCH,
    };
    const plan = planOf({
      kerf: INCH / 8,
      boards: [{ id: "b", length: 86 * INCH, width: 3.75 * INCH, cost: 10 }],
      parts: [legBlank],
      minOffcut: { length: 300, width: 50 },
    });
    expect(plan).toMatchObject({ status: "optimal", cost: 10, unplaced: [] });
    expect(plan.boards[0]!.pieces).toHaveLength(2);
  });

  it("says which limit bars a part, and plans the rest", () => {
    const board = { id: "b", species: "oak", length: 1000, width: 100, cost: 1, quarters: "4/4", rings: [10, 10, 10] };
    const part = { quantity: 1, length: 500, width: 50 };
    const plan = planOf({
      boards: [board],
      parts: [
        { ...part, id: "fits" },
        { ...part, id: "long", length: 1001 },
        { ...part, id: "wide", width: 101 },
        { ...part, id: "ash", species: "ash" },
        { ...part, id: "thick", quarters: 8 },
        { ...part, id: "rift", rings: { min: 30, max: 60, share: 0.8 } },
      ],
    });
    expect(plan.status).toBe("short");
    expect(plan.boards).toHaveLength(1);
    expect(plan.unplaced.map(({ part, reason }) => [part, reason])).toEqual([
      ["long", "length"],
      ["wide", "width"],
      ["ash", "species"],
      ["thick", "quarters"],
      ["rift", "grain"],
    ]);
  });
});

const published = "../shared/cutting/one-dimensional.json";

describe.skipIf(!existsSync(published))("published one-dimensional instances (sources in that folder's README)", () => {
  const quick = ["falkenauer-t60_08", "falkenauer-u120_02", "scholl1-N2C2W4_I", "schwerin1-BPP81", "waescher-TEST0044"];
  const instances: { name: string; optimum: number; problem: ProblemInput }[] = existsSync(published)
    ? JSON.parse(readFileSync(published, "utf8"))
    : [];

  it.each(instances.filter(({ name }) => quick.includes(name)))("$name is solved to proof", ({ optimum, problem }) => {
    expect(planOf(problem)).toMatchObject({ status: "optimal", cost: optimum });
  });
});
