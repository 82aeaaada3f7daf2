import { describe, expect, it } from "vitest";
import { findBadImports, routeModules } from "./import-rules.ts";

const routes = new Set(["app/routes/boards/board.tsx"]);

/** What is found in one file. */
function check(file: string, text: string) {
  return findBadImports([{ file, text }], routes).map(({ line, rule }) => `${line} ${rule}`);
}

describe("imports run to the left only", () => {
  it.each([
    ["app/core/rings/angle.ts", "#app/core/lengths/parse-length.ts"],
    ["app/components/field.tsx", "#app/core/lengths/parse-length.ts"],
    ["app/components/field.tsx", "./button.tsx"],
    ["app/domain/boards/boards.server.ts", "#app/services/db.server.ts"],
    ["app/domain/boards/board-row.tsx", "#app/components/card.tsx"],
    ["app/server/guards.server.ts", "#app/domain/shop/actor.ts"],
    ["app/routes/boards/list.tsx", "../../server/guards.server.ts"],
    ["app/root.tsx", "./server/middleware.server.ts"],
    ["app/domain/boards/boards.db.test.ts", "#tests/setup/test-db.ts"],
    ["scripts/start.ts", "#app/services/env.server.ts"],
    ["app/routes/boards/board.tsx", "./+types/board.ts"],
  ])("%s may import %s", (file, imported) => expect(check(file, `import "${imported}";`)).toEqual([]));

  it.each([
    [
      "app/core/rings/angle.ts",
      "#app/components/card.tsx",
      "core does not import components (app/components/card.tsx)",
    ],
    [
      "app/core/rings/angle.ts",
      "../../domain/boards/board.ts",
      "core does not import domain (app/domain/boards/board.ts)",
    ],
    [
      "app/components/field.tsx",
      "#app/domain/boards/board.ts",
      "components does not import domain (app/domain/boards/board.ts)",
    ],
    [
      "app/components/field.tsx",
      "#app/services/db.server.ts",
      "components runs in a browser and does not import app/services/db.server.ts",
    ],
    [
      "app/services/mail.server.ts",
      "#app/domain/shop/shop.ts",
      "services does not import domain (app/domain/shop/shop.ts)",
    ],
    [
      "app/domain/shop/shop.ts",
      "#app/server/guards.server.ts",
      "domain does not import server (app/server/guards.server.ts)",
    ],
    ["app/server/guards.server.ts", "#app/routes/parts.tsx", "server does not import routes (app/routes/parts.tsx)"],
    ["app/routes/boards/list.tsx", "./board.tsx", "nothing imports a route (app/routes/boards/board.tsx)"],
    ["app/root.tsx", "./routes/boards/board.tsx", "nothing imports a route (app/routes/boards/board.tsx)"],
    ["app/services/db.server.ts", "#scripts/migrate.ts", "the app does not import scripts/ (scripts/migrate.ts)"],
    ["app/core/rings/angle.ts", "node:fs", "core is pure and does not import node:fs"],
    ["app/core/rings/angle.ts", "react", "core is pure and does not import react"],
  ])("%s may not import %s", (file, imported, rule) =>
    expect(check(file, `\nimport { a } from "${imported}";`)).toEqual([`2 ${rule}`]),
  );

  it("also as a type, and when it is loaded later", () => {
    const text =
      'import type { A } from "#app/domain/shop/shop.ts";\n\nexport const later = () => import("#app/domain/shop/shop.ts");';
    expect(check("app/core/a.ts", text)).toEqual([
      "1 core does not import domain (app/domain/shop/shop.ts)",
      "3 core does not import domain (app/domain/shop/shop.ts)",
    ]);
  });
});

describe("what only some may do", () => {
  it("imports a route in tests only", () => {
    const text = 'import { loader } from "./boards/board.tsx";';
    expect(check("app/routes/roles.db.test.ts", text)).toEqual([]);
    expect(check("tests/factories/shop.ts", 'import "#app/routes/boards/board.tsx";')).toEqual([]);
    expect(check("app/routes/home.ts", text)).toHaveLength(1);
    expect(check("scripts/demo.ts", 'import "#app/routes/boards/board.tsx";')).toHaveLength(1);
  });
  it("reads process.env in services only", () => {
    expect(check("app/server/a.server.ts", "\nconst port = process.env.PORT;")).toEqual([
      "2 only services read process.env",
    ]);
    expect(check("app/services/env.server.ts", "const port = process.env.PORT;")).toEqual([]);
  });
  it("keeps clock, chance and network out of core", () => {
    expect(check("app/core/a.ts", "const a = Math.random();\nconst b = new Date();\nawait fetch(c);")).toHaveLength(3);
    expect(
      check("app/core/a.ts", "const later = new Date(then + 1);\n// not Math.random()\n/** nor\n * Date.now() */"),
    ).toEqual([]);
    expect(check("app/core/a.test.ts", "const began = performance.now();")).toEqual([]);
  });
});

it("knows the routes from routes.ts", () => {
  expect(routeModules('index("routes/home.tsx"), route(":id", "routes/boards/board.tsx")')).toEqual(
    new Set(["app/routes/home.tsx", "app/routes/boards/board.tsx"]),
  );
});
