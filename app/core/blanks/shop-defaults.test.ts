import { readFileSync } from "node:fs";
import { expect, test } from "vitest";
import { planerPasses } from "./passes.ts";
import { planerPassMm, shopDefaults } from "./shop-defaults.ts";

const migration = readFileSync("db/migrations/20261201_01_people_and_shops.ts", "utf8");

test.each(Object.entries(shopDefaults))("a new shop's %s is what the database gives it", (name, value) => {
  const column = name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);
  const given = migration.match(new RegExp(`\\b${column} .*DEFAULT ([0-9.]+)`))?.[1];
  expect(Number(given)).toBeCloseTo(value, 6);
});

test("common practice, no source: half an inch takes about twenty planer passes", () => {
  expect(planerPasses(12.7, planerPassMm)).toBe(20);
});
