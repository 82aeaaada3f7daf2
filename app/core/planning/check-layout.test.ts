import { describe, expect, it } from "vitest";
import { checkPlan } from "./check-layout.ts";
import type { BoardLayout, Plan } from "./layout.ts";
import { type ProblemInput, readProblem } from "./problem.ts";

function problemOf(input: ProblemInput) {
  const read = readProblem(input);
  if (!read.ok) throw new Error(read.error);
  return read.problem;
}

const base: ProblemInput = {
  kerf: 3,
  endTrim: 10,
  edgeTrim: 5,
  minOffcut: { length: 200, width: 50 },
  offcutCredit: 0.5,
  boardCharge: 2,
  boards: [
    {
      id: "b",
      species: "cherry",
      quarters: "4/4",
      length: 1020,
      width: 210,
      cost: 21.42,
      rings: [10, 45, 45, 10],
      defects: [{ x: 700, y: 120, length: 20, width: 20 }],
    },
  ],
  parts: [
    { id: "leg", quantity: 1, plies: 2, sameBoard: true, length: 400, width: 60, species: ["cherry"], quarters: 4 },
    { id: "rail", quantity: 1, length: 300, width: 80 },
  ],
};

/** Two strips ripped first: legs in the near one, a rail in the far one, 200 × 800 … left beside them. */
function goodLayout(): BoardLayout {
  return {
    id: "b",
    cost: 21.42 * (1 - (0.5 * (191 * 60 + 697 * 80)) / (1020 * 210)) + 2,
    pieces: [
      { part: "leg", x: 10, y: 5, length: 400, width: 60 },
      { part: "leg", x: 413, y: 5, length: 400, width: 60 },
      { part: "rail", x: 10, y: 68, length: 300, width: 80 },
    ],
    cuts: [
      { kind: "rip", stage: 1, at: 65, from: 10, to: 1010 },
      { kind: "rip", stage: 1, at: 148, from: 10, to: 1010 },
      { kind: "crosscut", stage: 2, at: 410, from: 5, to: 65 },
      { kind: "crosscut", stage: 2, at: 813, from: 5, to: 65 },
      { kind: "crosscut", stage: 2, at: 310, from: 68, to: 148 },
    ],
    offcuts: [
      { x: 816, y: 5, length: 194, width: 60 },
      { x: 313, y: 68, length: 697, width: 80 },
    ].filter((offcut) => offcut.length >= 200),
  };
}

function planOf(change: (layout: BoardLayout, plan: Plan) => unknown = () => undefined): Plan {
  const layout = goodLayout();
  layout.cost = 21.42 * (1 - (0.5 * 697 * 80) / (1020 * 210)) + 2;
  const plan: Plan = { status: "feasible", cost: layout.cost, bound: 10, gap: 0, boards: [layout], unplaced: [] };
  change(layout, plan);
  plan.gap = plan.cost > 0 ? (plan.cost - plan.bound) / plan.cost : 0;
  return plan;
}

function faults(change?: (layout: BoardLayout, plan: Plan) => unknown, input: Partial<ProblemInput> = {}) {
  return checkPlan(problemOf({ ...base, ...input }), planOf(change)).join("\n");
}

const legs = (change: object) => ({ parts: [{ ...base.parts[0]!, ...change }, base.parts[1]!] });

describe("checking a plan", () => {
  it("accepts one that holds", () => expect(faults()).toBe(""));

  it("accepts pieces a kerf apart and no less", () => {
    expect(faults(undefined, { kerf: 3.01 })).toMatch(/less than a kerf/);
  });

  it.each<[string, RegExp, (layout: BoardLayout, plan: Plan) => unknown]>([
    ["a piece in the end trim", /leaves the usable board/, ({ pieces }) => Object.assign(pieces[0]!, { x: 9 })],
    ["a piece in the edge trim", /leaves the usable board/, ({ pieces }) => Object.assign(pieces[0]!, { y: 4 })],
    ["pieces one on the other", /less than a kerf/, ({ pieces }) => Object.assign(pieces[1]!, { x: 300 })],
    ["a piece of another size", /not its part's size/, ({ pieces }) => Object.assign(pieces[2]!, { width: 79 })],
    [
      "a piece turned that may not be",
      /not its part's size/,
      ({ pieces }) => Object.assign(pieces[2]!, { length: 80, width: 300 }),
    ],
    ["a piece over a defect", /has the defect/, ({ pieces }) => Object.assign(pieces[2]!, { x: 650 })],
    ["a missing ply", /whole blanks/, ({ pieces }) => pieces.shift()],
    ["a missing piece", /placed and 0 unplaced/, ({ pieces }) => pieces.pop()],
    ["a piece too many", /2 placed and 0 unplaced of 1/, ({ pieces }) => pieces.push({ ...pieces[2]!, x: 413 })],
    ["an unknown part", /no part knob/, ({ pieces }) => Object.assign(pieces[2]!, { part: "knob" })],
    ["an offcut too small", /too small/, ({ offcuts }) => offcuts.push({ x: 816, y: 5, length: 194, width: 60 })],
    ["an offcut nobody sawed", /leave no offcut/, ({ offcuts }) => Object.assign(offcuts[0]!, { length: 690 })],
    ["a saw line that stops short", /runs through no blank/, ({ cuts }) => Object.assign(cuts[0]!, { to: 900 })],
    ["a saw line left out", /do not give rail/, ({ cuts }) => cuts.pop()],
    ["a stage too many", /stage 4/, ({ cuts }) => Object.assign(cuts[4]!, { stage: 4 })],
    [
      "a cost that is wrong",
      /cost .* should be/,
      (layout, plan) => [layout, plan].map((wrong) => Object.assign(wrong, { cost: 20 })),
    ],
    ["a sum that is wrong", /is not the boards'/, (_, plan) => Object.assign(plan, { cost: plan.cost + 1 })],
    ["a bound above the cost", /above the cost/, (_, plan) => Object.assign(plan, { bound: plan.cost + 1 })],
    ["a claim to be best without proof", /Called optimal/, (_, plan) => Object.assign(plan, { status: "optimal" })],
    ["a board used twice", /used twice/, (layout, plan) => plan.boards.push(layout)],
    ["an unknown board", /no board c/, (layout) => Object.assign(layout, { id: "c" })],
    ["an empty board", /nothing is cut/, ({ pieces }) => pieces.splice(0)],
  ])("refuses %s", (_, words, change) => expect(faults(change)).toMatch(words));

  it("refuses wood of another kind, thickness, grain or board", () => {
    expect(faults(undefined, legs({ species: ["walnut", "ash"] }))).toMatch(/another species/);
    expect(faults(undefined, legs({ quarters: "8/4" }))).toMatch(/another thickness/);
    expect(faults(undefined, legs({ rings: { min: 30, max: 60, share: 0.5 } }))).toMatch(/0\.2083 of its width/);
    expect(faults(undefined, legs({ rings: { min: 30, max: 60, share: 0.2 } }))).toBe("");
    const second = { ...base.boards[0]!, id: "c" };
    expect(faults(undefined, { boards: [base.boards[0]!, second], ...legs({ boards: ["c"] }) })).toMatch(
      /fixed to other/,
    );
  });

  it("refuses what through cuts cannot give: four pieces round a fifth", () => {
    const parts = [
      { id: "long", quantity: 2, length: 200, width: 100 },
      { id: "tall", quantity: 2, length: 100, width: 200 },
      { id: "middle", quantity: 1, length: 100, width: 100 },
    ];
    const problem = problemOf({ stages: 3, boards: [{ id: "b", length: 300, width: 300, cost: 1 }], parts });
    const pieces = [
      { part: "long", x: 0, y: 0, length: 200, width: 100 },
      { part: "tall", x: 200, y: 0, length: 100, width: 200 },
      { part: "long", x: 100, y: 200, length: 200, width: 100 },
      { part: "tall", x: 0, y: 100, length: 100, width: 200 },
      { part: "middle", x: 100, y: 100, length: 100, width: 100 },
    ];
    const boards = [{ id: "b", cost: 1, pieces, cuts: [], offcuts: [] }];
    const plan: Plan = { status: "optimal", cost: 1, bound: 1, gap: 0, boards, unplaced: [] };
    expect(checkPlan(problem, plan).join()).toMatch(/through cuts in 3 stages/);
  });

  it("counts stages: sections, strips and pieces again are three", () => {
    const parts = [
      { id: "a", quantity: 1, length: 100, width: 100 },
      { id: "b", quantity: 2, length: 50, width: 50 },
      { id: "c", quantity: 1, length: 100, width: 49 },
    ];
    const pieces = [
      { part: "a", x: 0, y: 0, length: 100, width: 100 },
      { part: "b", x: 100, y: 0, length: 50, width: 50 },
      { part: "b", x: 150, y: 0, length: 50, width: 50 },
      { part: "c", x: 100, y: 50, length: 100, width: 49 },
    ];
    const cuts = [
      { kind: "crosscut" as const, stage: 1, at: 100, from: 0, to: 100 },
      { kind: "rip" as const, stage: 2, at: 50, from: 100, to: 200 },
      { kind: "rip" as const, stage: 2, at: 99, from: 100, to: 200 },
      { kind: "crosscut" as const, stage: 3, at: 150, from: 0, to: 50 },
    ];
    const boards = [{ id: "b", cost: 1, pieces, cuts, offcuts: [] }];
    const plan: Plan = { status: "optimal", cost: 1, bound: 1, gap: 0, boards, unplaced: [] };
    const input = {
      minOffcut: { length: 201, width: 101 },
      boards: [{ id: "b", length: 200, width: 100, cost: 1 }],
      parts,
    };
    expect(checkPlan(problemOf({ ...input, stages: 3 }), plan)).toEqual([]);
    expect(checkPlan(problemOf({ ...input, stages: 2 }), plan).join()).toMatch(/in 2 stages do not give it/);
  });
});
