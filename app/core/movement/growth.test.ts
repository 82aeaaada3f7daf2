import { describe, expect, it } from "vitest";
import { allSpecies, speciesByCode } from "#app/core/species/species.ts";
import { growthByBoth, growthOf } from "./growth.ts";

const wood = (code: string) => speciesByCode(code)!;

describe("growth of a species", () => {
  it("comes from Table 13-5 between 6 and 14 %, and says so", () => {
    const growth = growthOf({ species: wood("sugar-maple"), fromPct: 8, toPct: 12 })!;
    expect(growth).toMatchObject({ basis: "coefficient-table", formula: "Eq. 13-2", note: null, outsideRange: null });
    expect(growth.source).toMatch(/Table 13-5/);
    expect(growth.tangential).toBeCloseTo(4 * 0.00353, 10);
    expect(growth.radial).toBeCloseTo(4 * 0.00165, 10);
  });

  it("comes from shrinkage outside that, and says so", () => {
    const growth = growthOf({ species: wood("northern-red-oak"), fromPct: 30, toPct: 7 })!;
    expect(growth).toMatchObject({
      basis: "shrinkage-table",
      formula: "Eq. 13-3",
      note: expect.stringMatching(/6-14 %/),
    });
    expect(8 * growth.tangential).toBeCloseTo(-0.5275, 4); // worked-examples.json, derived
  });

  it("says that a coefficient is a group's, that wood is still for green, and what a table lacks", () => {
    expect(growthOf({ species: wood("white-oak"), fromPct: 6, toPct: 9 })?.note).toMatch(/whole group/);
    expect(growthOf({ species: wood("white-oak"), fromPct: 60, toPct: 20 })?.outsideRange).toMatch(/above 30 %/);
    expect(growthOf({ species: wood("sapele"), fromPct: 8, toPct: 10 })).toMatchObject({
      basis: "shrinkage-table",
      note: "No coefficients are published for this species.",
    });
    const swampWhiteOak = { species: wood("swamp-white-oak"), fromPct: 20, toPct: 10 };
    expect(growthOf(swampWhiteOak, "shrinkage-table")).toMatchObject({
      basis: "coefficient-table",
      outsideRange: "The coefficients are published for 6 to 14 % moisture.",
    });
    expect(growthOf({ species: wood("wenge"), fromPct: 8, toPct: 10 })).toBeNull();
  });

  it("shows both tables where they disagree: imports and grouped species (trade reference, traps 5 and 6)", () => {
    const step = (code: string) => growthByBoth({ species: wood(code), fromPct: 8, toPct: 10 });
    const mahogany = step("genuine-mahogany");
    expect(mahogany.disagree).toBe(true);
    expect(mahogany.coefficientTable!.tangential / mahogany.shrinkageTable!.tangential).toBeGreaterThan(1.6);
    expect(step("northern-red-oak").disagree).toBe(true);
    expect(step("sugar-maple").disagree).toBe(false);
    expect(step("sapele")).toMatchObject({ coefficientTable: null, disagree: false });
  });

  it("has the sign of the change and more of it along the rings than across, for every species", () => {
    for (const species of allSpecies()) {
      for (const basis of ["coefficient-table", "shrinkage-table"] as const) {
        const wetter = growthOf({ species, fromPct: 7, toPct: 12 }, basis);
        const drier = growthOf({ species, fromPct: 12, toPct: 7 }, basis);
        if (!wetter || !drier) continue;
        expect(wetter.tangential, species.code).toBeGreaterThan(wetter.radial);
        expect(wetter.radial, species.code).toBeGreaterThan(0);
        expect(drier.tangential, species.code).toBeLessThan(drier.radial);
      }
    }
  });

  it("refuses a moisture that is no number", () => {
    expect(() => growthOf({ species: wood("white-oak"), fromPct: Number.NaN, toPct: 8 })).toThrow(/Moisture before/);
  });
});
