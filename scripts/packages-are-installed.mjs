// Plain JavaScript, as it runs before anything is installed. Ends with 0 when node_modules holds what package-lock.json asks for.
import { readFileSync } from "node:fs";

function versions(file) {
  try {
    const { packages } = JSON.parse(readFileSync(file, "utf8"));
    return new Map(Object.entries(packages).filter(([name]) => name));
  } catch {
    return new Map();
  }
}

const installed = versions("node_modules/.package-lock.json");
// Optional ones are for other machines, or npm could do without.
const wanted = [...versions("package-lock.json")].filter(
  ([, entry]) => !entry.optional && !entry.peerOptional && !entry.devOptional,
);
const present = wanted.every(([name, { version }]) => installed.get(name)?.version === version);
process.exit(installed.size > 0 && present ? 0 : 1);
