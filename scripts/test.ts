import { spawn } from "node:child_process";
import { mkdtemp, readFile, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { buildIfChanged } from "./build-if-changed.ts";
import { type Counts, countCheck, countPlaywright, countRun, countsLine, countVitest, sum } from "./test-results.ts";

const bin = (name: string) => path.join("node_modules", ".bin", name);
const reports = await mkdtemp(path.join(tmpdir(), "rayfleck-reports-"));

/** Runs a program, showing what it says. @returns its exit code. */
function run(program: string, args: string[], env: Record<string, string> = {}): Promise<number> {
  const child = spawn(program, args, { stdio: ["ignore", "inherit", "inherit"], env: { ...process.env, ...env } });
  return new Promise((resolve, reject) => {
    child.once("error", reject);
    child.once("exit", (code) => resolve(code ?? 1));
  });
}

async function report(file: string) {
  const text = await readFile(file, "utf8").catch(() => null);
  return text === null ? null : JSON.parse(text);
}

async function check(program: string, args: string[]): Promise<Counts> {
  return countCheck((await run(program, args)) === 0);
}

async function build(): Promise<Counts> {
  try {
    await buildIfChanged(console.log);
    return countCheck(true);
  } catch (error) {
    console.error((error as Error).message);
    return countCheck(false);
  }
}

async function vitest(project: string): Promise<Counts> {
  const file = path.join(reports, `vitest-${project}.json`);
  const args = ["run", `--project=${project}`, "--reporter=dot", "--reporter=json", `--outputFile.json=${file}`];
  const code = await run(bin("vitest"), args);
  const written = await report(file);
  return countRun(code, written && countVitest(written));
}

async function browser(): Promise<Counts> {
  const file = path.join(reports, "playwright.json");
  const args = ["test", "--config", "tests/e2e/playwright.config.ts", "--reporter=list,json"];
  const code = await run(bin("playwright"), args, { PLAYWRIGHT_JSON_OUTPUT_FILE: file });
  const written = await report(file);
  return countRun(code, written && countPlaywright(written));
}

/** Every check and test there is, in the order in which one wants to hear of it. All run, whatever fails before. */
const steps: [name: string, step: () => Promise<Counts>][] = [
  ["format and lint", () => check(bin("biome"), ["check", "."])],
  ["imports", () => check(process.execPath, ["--import", "tsx", "scripts/check-imports.ts"])],
  ["route types", () => check(bin("react-router"), ["typegen"])],
  ["types", () => check(bin("tsc"), [])],
  ["unit tests", () => vitest("!db")],
  ["database tests", () => vitest("db")],
  ["build", build],
  ["browser tests", browser],
];

const ended: { name: string; counts: Counts; seconds: number }[] = [];
for (const [name, step] of steps) {
  console.log(`\n== ${name}`);
  const began = Date.now();
  ended.push({ name, counts: await step(), seconds: Math.round((Date.now() - began) / 1000) });
}
await rm(reports, { recursive: true });

console.log("");
for (const { name, counts, seconds } of ended) console.log(`${name}: ${countsLine(counts)} (${seconds} s)`);
const all = sum(ended.map(({ counts }) => counts));
console.log(`\n${countsLine(all)}`);
process.exitCode = all.failed ? 1 : 0;
