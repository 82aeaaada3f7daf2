import { existsSync, readFileSync } from "node:fs";
import type { ProblemInput } from "#app/core/planning/problem.ts";

/** A published instance and what is known of it. */
export interface PublishedInstance {
  name: string;
  group: string;
  /** The proven least cost, or the mark that a plan must not be above. */
  mark: number;
  problem: ProblemInput;
}

const FOLDER = "../shared/cutting";

/** Reads a set of published instances (sources in their folder's README); none when it is not here. */
export function publishedInstances(set: "one-dimensional" | "two-dimensional" | "rack"): PublishedInstance[] {
  const path = `${FOLDER}/${set}.json`;
  if (!existsSync(path)) return [];
  const rows: { name: string; class?: string; optimum?: number; bestTwoStage?: number; problem: ProblemInput }[] =
    JSON.parse(readFileSync(path, "utf8"));
  return rows.map((row) => ({
    name: row.name,
    group: row.class ?? set,
    mark: (row.optimum ?? row.bestTwoStage)!,
    problem: row.problem,
  }));
}
