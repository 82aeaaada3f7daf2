/** One calculator: where it is and what it answers. */
export interface Calculator {
  path: string;
  title: string;
  lead: string;
}

/** Every calculator by name, in the order of the job. None needs a record; each keeps its figures in its address. */
export const calculators = {
  measure: {
    path: "/calculators/measure",
    title: "Board feet",
    lead: "Surface measure and board feet as the trade rounds them, and as they are.",
  },
  claim: {
    path: "/calculators/claim",
    title: "Claimed against measured",
    lead: "A lot's tally beside what its supplier says, with the difference in money.",
  },
  rings: {
    path: "/calculators/rings",
    title: "Ring angle",
    lead: "What the rings do across a board's end, what it is called, and where to rip it.",
  },
  leg: {
    path: "/calculators/leg",
    title: "Leg from thicker stock",
    lead: "How straight each side of a leg will look, and whether turning it helps.",
  },
  air: {
    path: "/calculators/air",
    title: "Air and wood",
    lead: "What moisture wood settles at in a room, and what air a moisture means.",
  },
  meter: {
    path: "/calculators/meter",
    title: "Meter reading",
    lead: "A reading corrected for the temperature of the wood.",
  },
  ready: {
    path: "/calculators/ready",
    title: "When it will be ready",
    lead: "Readings over time, and the day the wood comes within its target.",
  },
  movement: {
    path: "/calculators/movement",
    title: "Movement and cup",
    lead: "How a board's width, thickness and shape change with its moisture.",
  },
  weight: {
    path: "/calculators/weight",
    title: "Weight",
    lead: "A board, a stack, and what each arm of the rack bears.",
  },
  grade: {
    path: "/calculators/grade",
    title: "Grade helper",
    lead: "Which grades a board's clear cuttings could make.",
  },
  glueUp: {
    path: "/calculators/glue-up",
    title: "Plies and glue-up",
    lead: "How many plies, where the glue line lies, how many clamps, how much glue.",
  },
  milling: {
    path: "/calculators/milling",
    title: "Milling steps",
    lead: "The size at each step from rough to finished, and the cautions it calls for.",
  },
} as const satisfies Record<string, Calculator>;

export type CalculatorName = keyof typeof calculators;
