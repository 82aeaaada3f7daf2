import { expect, test } from "vitest";
import { boardWeight } from "./board-weight.ts";
import { kgFrom, printMass } from "./mass-text.ts";

const maple = { species: "sugar-maple", thicknessMm: 50.8, widthMm: 152.4, widthFarMm: null, lengthMm: 2438.4 };

test("8/4 sugar maple of 8 bf weighs 28.2 lb at 8 % (Wood Handbook Eq. 4-9, 4-11, 4-14)", () => {
  const weight = boardWeight({ ...maple, moisturePct: 8 });
  expect(printMass(weight?.massKg ?? 0, "in")).toBe("28.2 lb");
  expect(weight?.isMoistureAssumed).toBe(false);
});

test("unmetered, 8 % is assumed and that is said", () => {
  expect(boardWeight({ ...maple, moisturePct: null })).toMatchObject({ moisturePct: 8, isMoistureAssumed: true });
});

test("an unknown species or an impossible moisture has no weight, and the page no failure", () => {
  expect(boardWeight({ ...maple, species: "shop-own", moisturePct: 8 })).toBeNull();
  expect(boardWeight({ ...maple, moisturePct: 200 })).toBeNull();
});

test("there and back between pounds and kilograms", () => {
  expect(kgFrom(100, "in")).toBeCloseTo(45.359237, 9);
  expect(printMass(kgFrom(100, "in"), "in")).toBe("100 lb");
  expect(printMass(12.78, "mm")).toBe("12.8 kg");
});
