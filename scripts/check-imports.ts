import { readdir, readFile } from "node:fs/promises";
import path from "node:path";
import { findBadImports, routeModules } from "./import-rules.ts";

const folders = ["app", "db", "scripts", "tests"];

/** Fails with a line for each import that runs against the layers, as file:line. */
const names = (
  await Promise.all(folders.map((folder) => readdir(folder, { recursive: true, withFileTypes: true })))
).flat();
const paths = names
  .filter((entry) => entry.isFile() && /\.tsx?$/.test(entry.name))
  .map((entry) => path.join(entry.parentPath, entry.name));
const files = await Promise.all(paths.sort().map(async (file) => ({ file, text: await readFile(file, "utf8") })));
const findings = findBadImports(files, routeModules(await readFile("app/routes.ts", "utf8")));
for (const { file, line, rule } of findings) console.error(`${file}:${line} ${rule}`);
console.log(`${files.length} files, ${findings.length} imports against the rules`);
process.exitCode = findings.length ? 1 : 0;
