import { execFile } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync } from "node:fs";
import { readdir, readFile, writeFile } from "node:fs/promises";
import path from "node:path";
import { promisify } from "node:util";
import { WantedError } from "./run-script.ts";

/** What the build is made of. */
const sources = [
  "app",
  "fonts",
  "public",
  "package-lock.json",
  "react-router.config.ts",
  "tsconfig.json",
  "vite.config.ts",
];

/**
 * Makes the production build, unless the one that is there was made from these very sources.
 *
 * @param say is called when there is something to wait for.
 */
export async function buildIfChanged(say: (line: string) => void, signal?: AbortSignal): Promise<void> {
  const mark = path.resolve("build/made-from");
  const hash = await hashOfSources();
  if (existsSync(mark) && (await readFile(mark, "utf8")) === hash) return;
  say("Building…");
  try {
    const env = { ...process.env, NODE_ENV: "production" };
    await promisify(execFile)(process.execPath, ["node_modules/@react-router/dev/bin.js", "build"], {
      env,
      signal,
      maxBuffer: 64 << 20,
    });
  } catch (error) {
    throw new WantedError(`The build failed:\n${(error as { stderr?: string }).stderr ?? error}`);
  }
  await writeFile(mark, hash);
}

async function hashOfSources(): Promise<string> {
  const hash = createHash("sha256");
  for (const source of sources) {
    for (const file of await filesUnder(source)) hash.update(`${file}\0`).update(await readFile(file));
  }
  return hash.digest("hex");
}

async function filesUnder(name: string): Promise<string[]> {
  const entries = await readdir(name, { withFileTypes: true, recursive: true }).catch(() => null);
  if (!entries) return [name];
  const files = entries.filter((entry) => entry.isFile()).map((entry) => path.join(entry.parentPath, entry.name));
  return files.filter((file) => !/\.test\.tsx?$/.test(file)).sort();
}
