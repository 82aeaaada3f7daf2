import { readFileSync } from "node:fs";
import { readProblem } from "#app/core/planning/problem.ts";
import { solvePlan } from "#app/core/planning/solve-plan.ts";

/** Time for starting, reading and writing, so that the limit holds for the whole command. Seconds. */
const RESERVE = 0.35;

/** Plans the problem in a file, or from standard input for "-", and prints the answer as JSON; leaves with 1 on bad input. */
function main(): void {
  const startedMs = performance.now();
  const read = readCommand(process.argv.slice(2));
  if (!read.ok) {
    console.log(JSON.stringify({ status: "error", error: read.error }));
    process.exitCode = 1;
    return;
  }
  const { timeLimit } = read.problem;
  // performance.now() counts from the start of the process, so loading the program is in it.
  const endMs = timeLimit * 1000 - Math.min(RESERVE, timeLimit / 4) * 1000;
  const plan = solvePlan(read.problem, { shouldStop: () => performance.now() >= endMs });
  console.log(JSON.stringify({ ...plan, ms: Math.round(performance.now() - startedMs) }));
}

function readCommand([path, ...more]: string[]): ReturnType<typeof readProblem> {
  if (!path || more.length > 0)
    return { ok: false, error: "Usage: npm run -s plan -- PROBLEM.json (or - for standard input)" };
  let text: string;
  try {
    text = readFileSync(path === "-" ? 0 : path, "utf8");
  } catch {
    return { ok: false, error: `${path}: there is no such file, or it cannot be read.` };
  }
  try {
    return readProblem(JSON.parse(text));
  } catch (error) {
    return { ok: false, error: `${path}: no JSON: ${error instanceof Error ? error.message : "it cannot be read"}` };
  }
}

main();
