import { execFile } from "node:child_process";
import { chmod, mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { promisify } from "node:util";
import { afterAll, beforeAll, expect, it } from "vitest";

let programs: string;

/** A folder of programs that stand in for a machine's. */
beforeAll(async () => {
  programs = await mkdtemp(path.join(tmpdir(), "rayfleck-programs-"));
});
afterAll(() => rm(programs, { recursive: true }));

async function program(name: string, script: string) {
  const file = path.join(programs, name);
  await writeFile(file, `#!/bin/bash\n${script}\n`);
  await chmod(file, 0o755);
}

/** Runs a step of prepare.sh on that machine. @returns what it told on standard error and its exit code. */
async function prepare(step: string) {
  const command = promisify(execFile)(
    "/bin/bash",
    ["--norc", "-c", `set -euo pipefail; . scripts/prepare.sh; ${step}`],
    {
      env: { PATH: programs },
    },
  );
  return command.then(
    ({ stderr }) => ({ told: stderr, code: 0 }),
    (error: { stderr: string; code: number }) => ({ told: error.stderr, code: error.code }),
  );
}

it("asks for Node in one line when there is none", async () => {
  expect(await prepare("need_node")).toEqual({
    told: "Node is not installed: Node 20.19 or newer is needed, below 23.\n",
    code: 1,
  });
});

it.each([
  ["18.20.4", 1],
  ["20.18.9", 1],
  ["20.19.0", 0],
  ["22.1.0", 0],
  ["23.0.0", 1],
])("Node %s ends with %i, and one line where it is refused", async (version, code) => {
  await program("node", `echo ${version}`);
  const told = code === 0 ? "" : `Node ${version} is here; 20.19 or newer is needed, below 23.\n`;
  expect(await prepare("need_node")).toEqual({ told, code });
});

it("names the missing package in one line when it may not install", async () => {
  await program("id", "echo 1000");
  const told = "The package a-package is missing: run this as root, or first apt-get install a-package.\n";
  expect(await prepare("need_package a-missing-program a-package")).toEqual({ told, code: 1 });
});

it("installs nothing that is there", async () => {
  await program("a-present-program", "true");
  expect(await prepare("need_package a-present-program a-package")).toEqual({ told: "", code: 0 });
});
