import { existsSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { allSpecies, isSpeciesCode, sourceName, speciesByCode } from "./species.ts";

const reference = "../shared/reference/wood-properties.json";

describe("the shipped species", () => {
  it("are 129, each with a code, a tag prefix and an index name of its own", () => {
    const all = allSpecies();
    expect(all).toHaveLength(129);
    for (const key of ["code", "tagPrefix", "indexName", "commonName"] as const) {
      expect(new Set(all.map((species) => species[key])).size, key).toBe(all.length);
    }
    for (const species of all) {
      expect(species.code).toMatch(/^[a-z]+(-[a-z]+)*$/);
      expect(species.tagPrefix).toMatch(/^[A-Z]{2}$/);
      for (const tint of Object.values(species.tints)) expect(tint).toMatch(/^#[0-9A-F]{6}$/);
    }
  });

  it("are found by code, and an unknown code gives null", () => {
    expect(speciesByCode("white-oak")).toMatchObject({ commonName: "White oak", tagPrefix: "WO", rayFleck: true });
    expect(isSpeciesCode("sugar-maple")).toBe(true);
    expect(speciesByCode("white oak")).toBeNull();
    expect(isSpeciesCode("toString")).toBe(false);
  });

  it("name a source and a confidence for every value", () => {
    for (const species of allSpecies()) {
      const { specificGravity, shrinkage, volumetricShrinkage, coefficients, hardness, dust, trade } = species;
      for (const value of [specificGravity, shrinkage, volumetricShrinkage, coefficients, hardness, dust, trade]) {
        if (!value) continue;
        expect(sourceName(value.source), species.code).not.toBe(value.source);
        expect(value.confidence, species.code).toMatch(
          /^(confirmed|confirmed-secondary|recomputed|memory-consistent|memory)$/,
        );
      }
    }
  });

  it("keep eastern black oak off the misprinted line 'Oak, black' of Table 13-5", () => {
    // Trade reference, trap 4: 0.00123/0.00230 belongs to California black oak.
    expect(speciesByCode("black-oak")?.coefficients).toMatchObject({
      radial: 0.00158,
      tangential: 0.00369,
      covers: "group",
    });
  });

  it("mark a coefficient that the table prints for a group (trap 5)", () => {
    const groups = ["northern-red-oak", "white-oak", "shagbark-hickory", "sweet-birch", "green-ash", "black-maple"];
    for (const code of groups) expect(speciesByCode(code)?.coefficients?.covers, code).toBe("group");
    for (const code of ["sugar-maple", "black-cherry", "black-walnut"]) {
      expect(speciesByCode(code)?.coefficients?.covers, code).toBe("species");
    }
  });

  it("flag woods under trade control (listing from memory, trade reference section 16)", () => {
    for (const code of ["genuine-mahogany", "afrormosia", "ramin", "spanish-cedar"]) {
      expect(speciesByCode(code)?.trade?.appendix, code).toBe("II");
    }
    expect(speciesByCode("brazilian-rosewood")?.trade?.appendix).toBe("I");
    expect(speciesByCode("white-oak")?.trade).toBeNull();
  });

  it("flag the worst sensitisers (from memory, trade reference section 10)", () => {
    for (const code of ["western-redcedar", "iroko", "teak", "obeche", "okoume", "ipe", "african-padauk"]) {
      expect(speciesByCode(code)?.dust?.strongSensitiser, code).toBe(true);
    }
  });
});

describe.skipIf(!existsSync(reference))("against the gathered reference table", () => {
  const rows: Array<Record<string, unknown> & { confidence: Record<string, string | null> }> = existsSync(reference)
    ? JSON.parse(readFileSync(reference, "utf8"))
    : [];
  const byBotany = new Map(allSpecies().map((species) => [`${species.botanicalName}|${species.indexName}`, species]));

  it("ships every row with its values and its confidence", () => {
    expect(rows).toHaveLength(allSpecies().length);
    for (const row of rows) {
      const name = `${row.botanicalName}|${String(row.commonName).replace(/ \(.*\)/, "")}`;
      const species = byBotany.get(name);
      expect(species, name).toBeDefined();
      expect({
        sgGreen: species?.specificGravity?.basic ?? null,
        sg12: species?.specificGravity?.at12 ?? null,
        shrinkRadialPct: species?.shrinkage?.radialPct ?? null,
        shrinkTangentialPct: species?.shrinkage?.tangentialPct ?? null,
        shrinkVolumetricPct: species?.volumetricShrinkage?.pct ?? null,
        cR: species?.coefficients?.radial ?? null,
        cT: species?.coefficients?.tangential ?? null,
        janka: species?.hardness?.jankaLbf ?? null,
        rayFleck: species?.rayFleck,
        dustCaution: species?.dust?.words ?? null,
      }).toEqual({
        sgGreen: row.sgGreen,
        sg12: row.sg12,
        shrinkRadialPct: row.shrinkRadialPct,
        shrinkTangentialPct: row.shrinkTangentialPct,
        shrinkVolumetricPct: row.shrinkVolumetricPct,
        cR: row.cR,
        cT: row.cT,
        janka: row.janka,
        rayFleck: row.rayFleck,
        dustCaution: row.dustCaution,
      });
      if (species?.shrinkage) expect(species.shrinkage.startsAtPct).toBe(row.shrinkStartMcPct);
      if (species?.coefficients) expect(species.coefficients.confidence).toBe(row.confidence.coefficients);
      if (species?.shrinkage) expect(species.shrinkage.confidence).toBe(row.confidence.shrinkageRT);
      if (species?.specificGravity) expect(species.specificGravity.confidence).toBe(row.confidence.specificGravity);
    }
  });
});
