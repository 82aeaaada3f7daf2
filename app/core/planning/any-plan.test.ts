import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkPlan } from "./check-layout.ts";
import { firstFitPlan } from "./first-fit-plan.ts";
import type { Plan } from "./layout.ts";
import { type ProblemInput, readProblem } from "./problem.ts";
import { solvePlan } from "./solve-plan.ts";

const size = (min: number, max: number) => fc.integer({ min: min * 4, max: max * 4 }).map((quarters) => quarters / 4);
const rings = fc.array(fc.integer({ min: 0, max: 90 }), { minLength: 2, maxLength: 9 });

const board = fc.record({
  length: size(600, 2500),
  width: size(80, 300),
  cost: fc.integer({ min: 5, max: 60 }),
  rings: fc.option(rings, { nil: undefined }),
  species: fc.constantFrom("oak", "ash"),
  defects: fc.option(
    fc.array(fc.record({ x: size(0, 600), y: size(0, 80), length: size(10, 60), width: size(5, 30) }), {
      maxLength: 2,
    }),
    { nil: undefined },
  ),
});

const part = fc.record({
  quantity: fc.integer({ min: 1, max: 4 }),
  length: size(120, 900),
  width: size(30, 140),
  rotate: fc.boolean(),
  rings: fc.option(fc.constant({ min: 20, max: 70, share: 0.7 }), { nil: undefined }),
  species: fc.option(fc.constantFrom("oak", "ash"), { nil: undefined }),
  plies: fc.constantFrom(1, 1, 1, 2, 3),
  sameBoard: fc.boolean(),
});

const problem = fc
  .record({
    kerf: fc.constantFrom(0, 3, 3.175),
    endTrim: fc.constantFrom(0, 12.5),
    edgeTrim: fc.constantFrom(0, 4),
    minOffcut: fc.constant({ length: 250, width: 40 }),
    offcutCredit: fc.constantFrom(0, 0.4, 1),
    boardCharge: fc.constantFrom(0, 3),
    stages: fc.constantFrom(2 as const, 3 as const),
    boards: fc.array(board, { minLength: 1, maxLength: 7 }),
    parts: fc.array(part, { minLength: 1, maxLength: 6 }),
  })
  .map(
    ({ boards, parts, ...rules }): ProblemInput => ({
      ...rules,
      boards: boards.map((one, i) => ({ id: `b${i}`, ...one })),
      parts: parts.map((one, i) => ({ id: `p${i}`, ...one })),
    }),
  );

/** Stops by count, not by the clock, so that a plan is the same each time. */
function planOf(input: ProblemInput, asks = 1500): { plan: Plan; firstFit: Plan; faults: string[] } {
  const read = readProblem(input);
  if (!read.ok) throw new Error(read.error);
  let asked = 0;
  const plan = solvePlan(read.problem, { shouldStop: () => asked++ > asks });
  const firstFit = firstFitPlan(read.problem);
  return { plan, firstFit, faults: [...checkPlan(read.problem, plan), ...checkPlan(read.problem, firstFit)] };
}

const left = (plan: Plan) => plan.unplaced.reduce((sum, { quantity }) => sum + quantity, 0);

describe("any problem", () => {
  it("gets a plan that holds, no dearer than first fit and no cheaper than its bound", () => {
    fc.assert(
      fc.property(problem, (input) => {
        const { plan, firstFit, faults } = planOf(input);
        expect(faults).toEqual([]);
        if (left(firstFit) === 0) expect(left(plan)).toBe(0);
        if (left(plan) === 0 && left(firstFit) === 0) expect(plan.cost).toBeLessThanOrEqual(firstFit.cost + 1e-6);
        if (left(plan) === 0) expect(plan.cost).toBeGreaterThanOrEqual(plan.bound - 1e-6);
      }),
      { numRuns: 120, seed: 11 },
    );
  });

  it("keeps its bound under every plan that is found: longer search never ends below an earlier bound", () => {
    fc.assert(
      fc.property(problem, (input) => {
        const [short, long] = [planOf(input, 20).plan, planOf(input, 3000).plan];
        if (left(short) > 0 || left(long) > 0) return;
        expect(short.bound).toBeLessThanOrEqual(long.cost + 1e-6);
        expect(long.bound).toBeLessThanOrEqual(short.cost + 1e-6);
      }),
      { numRuns: 40, seed: 12 },
    );
  });

  it("gives the same plan for the same problem", () => {
    fc.assert(
      fc.property(problem, (input) => {
        expect(planOf(input).plan).toEqual(planOf(input).plan);
      }),
      { numRuns: 15, seed: 13 },
    );
  });
});
