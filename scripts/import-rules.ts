import path from "node:path";
import ts from "typescript";

export interface SourceFile {
  /** From the project's top, such as "app/core/measure/board-feet.ts". */
  file: string;
  text: string;
}

/** Something that breaks a rule, where, and which. */
export interface Finding {
  file: string;
  line: number;
  rule: string;
}

/** Which folders of app/ a folder may import from, besides itself: only to the left of it. */
const leftOf: Record<string, readonly string[]> = {
  core: [],
  components: ["core"],
  services: ["core"],
  domain: ["core", "components", "services"],
  server: ["core", "components", "services", "domain"],
  routes: ["core", "components", "services", "domain", "server"],
};

/** What core must not know: whatever makes the same call answer differently, or reaches outside. */
const impurePackages = /^(node:|react|knex|mysql2|@aws-sdk\/|nodemailer|pino|express|sharp)/;
const impureCalls = /\b(Math\.random|Date\.now|performance\.now|crypto\.)|\bnew Date\(\)|\bfetch\(/;

/** The route modules named in app/routes.ts. */
export function routeModules(routesText: string): Set<string> {
  return new Set([...routesText.matchAll(/"(routes\/[^"]+)"/g)].map(([, file]) => `app/${file}`));
}

/** Every break of the import rules of DEVELOPERS.md in these files. */
export function findBadImports(files: SourceFile[], routes: Set<string>): Finding[] {
  return files.flatMap((source) => [...badImports(source, routes), ...badLines(source)]);
}

function badImports({ file, text }: SourceFile, routes: Set<string>): Finding[] {
  return ts.preProcessFile(text, true, true).importedFiles.flatMap(({ fileName, pos }) => {
    const rule = brokenRule(file, fileName, routes);
    return rule ? [{ file, line: lineAt(text, pos), rule }] : [];
  });
}

function brokenRule(file: string, specifier: string, routes: Set<string>): string | null {
  const imported = projectFile(file, specifier);
  const from = layerOf(file);
  if (!imported)
    return from === "core" && !isTest(file) && impurePackages.test(specifier)
      ? `core is pure and does not import ${specifier}`
      : null;
  if (isTest(file)) return null;
  if (routes.has(imported)) return `nothing imports a route (${imported})`;
  if (!from) return null;

  const [top] = imported.split("/");
  if (top === "scripts" || top === "tests" || top === "db") return `the app does not import ${top}/ (${imported})`;
  if ((from === "core" || from === "components") && /\.server\.tsx?$/.test(imported))
    return `${from} runs in a browser and does not import ${imported}`;
  const to = layerOf(imported);
  if (to && to !== from && leftOf[from] && !leftOf[from].includes(to))
    return `${from} does not import ${to} (${imported})`;
  return null;
}

function badLines({ file, text }: SourceFile): Finding[] {
  const layer = layerOf(file);
  if (!layer || isTest(file)) return [];
  return text.split("\n").flatMap((written, index) => {
    const code = written.replace(/^\s*(\/?\*|\/\/).*$/, "").replace(/\s\/\/ .*$/, "");
    const line = index + 1;
    if (layer !== "services" && /\bprocess\.env\b/.test(code))
      return [{ file, line, rule: "only services read process.env" }];
    if (layer === "core" && impureCalls.test(code))
      return [{ file, line, rule: "core is pure: no clock, chance or network" }];
    return [];
  });
}

/** The file of this project that a specifier names, or null for a package. */
function projectFile(file: string, specifier: string): string | null {
  if (specifier.startsWith("#")) return specifier.slice(1);
  if (specifier.startsWith(".")) return path.posix.join(path.posix.dirname(file), specifier);
  return null;
}

/** The folder of app/ that a file lies in; "app" for those that lie in none; null outside. */
function layerOf(file: string): string | null {
  const [top, layer, ...rest] = file.split("/");
  if (top !== "app") return null;
  return rest.length ? (layer ?? null) : "app";
}

function isTest(file: string): boolean {
  return file.startsWith("tests/") || /\.test\.tsx?$/.test(file);
}

function lineAt(text: string, position: number): number {
  return text.slice(0, position).split("\n").length;
}
