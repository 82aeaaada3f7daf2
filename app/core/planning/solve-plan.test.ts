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

describe("small racks with a least cost that is plain to see", () => {
  const parts = [{ id: "p", quantity: 2, length: 500, width: 100 }];

  it("takes one long board before two short ones when it is cheaper, and two short ones when they are", () => {
    const boards = (long: number) => [
      { id: "long", length: 1003, width: 100, cost: long },
      { id: "short 1", length: 500, width: 100, cost: 4 },
      { id: "short 2", length: 500, width: 100, cost: 4 },
    ];
    expect(planOf({ kerf: 3, boards: boards(7), parts })).toMatchObject({ status: "optimal", cost: 7 });
    expect(planOf({ kerf: 3, boards: boards(9), parts })).toMatchObject({ status: "optimal", cost: 8 });
    expect(planOf({ kerf: 3.01, boards: boards(7), parts })).toMatchObject({ status: "optimal", cost: 8 });
  });

  it("reckons an offcut's worth and a board's charge", () => {
    const boards = [{ id: "b", length: 2000, width: 100, cost: 10 }];
    const rules = { minOffcut: { length: 900, width: 100 }, offcutCredit: 0.5, boardCharge: 1 };
    expect(planOf({ ...rules, boards, parts }).cost).toBeCloseTo(10 - 0.5 * 5 + 1);
    expect(planOf({ ...rules, minOffcut: { length: 1001, width: 100 }, boards, parts }).cost).toBeCloseTo(11);
  });

  it("lays a strip where its ring angles are", () => {
    const boards = [{ id: "b", length: 600, width: 200, cost: 1, rings: [5, 5, 45, 45] }];
    const rift = { ...parts[0]!, quantity: 1, rings: { min: 30, max: 60, share: 1 } };
    const plan = planOf({ boards, parts: [rift] });
    expect(plan.boards[0]!.pieces[0]!.y).toBe(100);
  });

  it("turns a piece only when its part allows it", () => {
    const boards = [{ id: "b", length: 100, width: 500, cost: 1 }];
    expect(planOf({ boards, parts })).toMatchObject({ status: "short" });
    expect(planOf({ boards, parts: [{ ...parts[0]!, quantity: 1, rotate: true }] })).toMatchObject({
      status: "optimal",
    });
  });

  it("cuts some boards lengthwise first and others across when that saves one", () => {
    const boards = ["b1", "b2", "b3"].map((id) => ({ id, length: 100, width: 100, cost: 1 }));
    const mixed = [
      { id: "long", quantity: 2, length: 100, width: 50 },
      { id: "tall", quantity: 2, length: 50, width: 100 },
    ];
    expect(planOf({ boards, parts: mixed })).toMatchObject({ status: "optimal", cost: 2 });
  });
});

interface Published {
  name: string;
  optimum?: number;
  bestTwoStage?: number;
  problem: ProblemInput;
}

const folder = "../shared/cutting";

function published(set: string): Published[] {
  const path = `${folder}/${set}.json`;
  return existsSync(path) ? JSON.parse(readFileSync(path, "utf8")) : [];
}

describe.skipIf(!existsSync(folder))(
  "published instances (sources in that folder's README); all of them: bench:plan",
  () => {
    const quick = [
      "falkenauer-t60_08",
      "falkenauer-u120_02",
      "scholl1-N2C2W4_I",
      "schwerin1-BPP81",
      "waescher-TEST0044",
    ];

    it.each(published("one-dimensional").filter(({ name }) => quick.includes(name)))(
      "$name is solved to proof",
      ({ optimum, problem }) => {
        expect(planOf(problem)).toMatchObject({ status: "optimal", cost: optimum });
      },
    );

    it.each(published("two-dimensional"))("$name takes no more boards than the best in two stages", (instance) => {
      const plan = planOf(instance.problem);
      expect(plan.cost).toBeLessThanOrEqual(instance.bestTwoStage!);
      expect(plan.unplaced).toEqual([]);
    });

    it.each(published("rack"))("$name is solved to proof", ({ optimum, problem }) => {
      expect(planOf(problem)).toMatchObject({ status: "optimal", cost: optimum });
    });
  },
);
