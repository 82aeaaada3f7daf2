import { type Measured, measurePlan } from "#scripts/planning/measure-plan.ts";
import { type PublishedInstance, publishedInstances } from "#scripts/planning/published.ts";
import { makeRack } from "#scripts/planning/rack-maker.ts";

/**
 * Measures the planner: shop racks of several sizes beside first fit decreasing, and the published instances when they are here.
 * Every plan is checked by the independent checker. `npm run bench:plan -- racks` or `-- published` runs one half.
 */
function main(): void {
  const [half] = process.argv.slice(2);
  let faults = 0;
  if (half !== "published") faults += benchRacks();
  if (half !== "racks") faults += benchPublished();
  console.log(faults === 0 ? "Every plan holds and none is dearer than first fit decreasing." : `${faults} faults.`);
  process.exitCode = faults === 0 ? 0 : 1;
}

const SIZES = [
  { parts: 20, pieces: 20, boards: 50, timeLimit: 0.5 },
  { parts: 60, pieces: 300, boards: 1000, timeLimit: 5 },
  { parts: 300, pieces: 300, boards: 1000, timeLimit: 5 },
];

interface Variant {
  words: string;
  seed?: number;
  grain?: boolean;
  stages?: 2 | 3;
  offcutCredit?: number;
  boardCharge?: number;
}

const VARIANTS: Variant[] = [
  { words: "plain" },
  { words: "plain", seed: 2 },
  { words: "three stages", stages: 3 },
  { words: "grain, defects, plies", grain: true },
  { words: "credit for offcuts", offcutCredit: 0.5, boardCharge: 2 },
];

function benchRacks(): number {
  console.log(
    "Shop racks made by seed: parts / pieces on boards, stages, what else    cost   bound    gap   first fit    ms",
  );
  let faults = 0;
  for (const size of SIZES)
    for (const { words, seed = 1, grain = false, ...rules } of VARIANTS) {
      const found = measurePlan({ ...makeRack({ seed, grain, ...size }), ...rules });
      faults += report(`${size.parts} / ${size.pieces} on ${size.boards}, ${words}`, found);
    }
  return faults;
}

function report(title: string, { plan, ms, firstFit, faults }: Measured): number {
  const left = plan.unplaced.reduce((sum, { quantity }) => sum + quantity, 0);
  console.log(
    [
      `  ${title}`.padEnd(52),
      plan.cost.toFixed(2).padStart(9),
      plan.bound.toFixed(2).padStart(9),
      `${(100 * plan.gap).toFixed(2)} %`.padStart(9),
      firstFit.cost.toFixed(2).padStart(9),
      ms.toFixed(0).padStart(6),
      left > 0 || firstFit.unplaced > 0 ? `unplaced ${left}, by first fit ${firstFit.unplaced}` : "",
    ].join(" "),
  );
  for (const fault of faults) console.log(`    ${fault}`);
  return faults.length;
}

function benchPublished(): number {
  let faults = 0;
  for (const set of ["one-dimensional", "two-dimensional", "rack"] as const) {
    const instances = publishedInstances(set);
    if (instances.length === 0) {
      console.log(`The published set ${set} is not here: 0 measured.`);
      continue;
    }
    console.log(
      `Published, ${set}: instances, at the mark, below it, proven, mean ms, longest ms; first fit at the mark`,
    );
    const groups = [...new Set(instances.map(({ group }) => group))];
    const all = instances.map((instance) => ({ instance, ...measurePlan(instance.problem) }));
    for (const group of groups)
      if (groups.length > 1)
        printGroup(
          group,
          all.filter(({ instance }) => instance.group === group),
        );
    printGroup("all", all);
    for (const { instance, plan, ms, faults: found } of all) {
      faults += found.length;
      for (const fault of found) console.log(`    ${instance.name}: ${fault}`);
      if (plan.cost > instance.mark || (set === "one-dimensional" && plan.status !== "optimal"))
        console.log(
          `    ${instance.name}: cost ${plan.cost}, bound ${plan.bound}, mark ${instance.mark}, ${ms.toFixed(0)} ms`,
        );
    }
  }
  return faults;
}

function printGroup(name: string, found: (Measured & { instance: PublishedInstance })[]): void {
  const count = (test: (one: (typeof found)[number]) => boolean) => String(found.filter(test).length).padStart(4);
  const times = found.map(({ ms }) => ms);
  console.log(
    [
      `  ${name}`.padEnd(20),
      String(found.length).padStart(4),
      count(({ plan, instance }) => plan.cost === instance.mark),
      count(({ plan, instance }) => plan.cost < instance.mark),
      count(({ plan }) => plan.status === "optimal"),
      (times.reduce((sum, ms) => sum + ms, 0) / found.length).toFixed(0).padStart(7),
      Math.max(...times)
        .toFixed(0)
        .padStart(7),
      count(({ firstFit, instance }) => firstFit.cost === instance.mark),
    ].join(" "),
  );
}

main();
