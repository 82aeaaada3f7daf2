import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { LengthUnit } from "#app/core/lengths/length-unit.ts";
import { readRow, type TallyRow } from "./tally.ts";
import { spellOut } from "./tally-size.ts";

const row = (typed: Partial<TallyRow>): TallyRow => ({
  count: "",
  width: "",
  length: "",
  quarters: "4",
  species: "white-oak",
  ...typed,
});

function line(typed: Partial<TallyRow>, unit: LengthUnit = "in") {
  const read = readRow(row(typed), unit);
  if (read.state !== "line") throw new Error(JSON.stringify(read));
  const { widthMm, lengthMm, widthFarMm, ...rest } = read.line;
  const size = { widthMm: Number(widthMm.toFixed(2)), lengthMm: Number(lengthMm.toFixed(2)) };
  return widthFarMm === undefined
    ? { ...rest, ...size }
    : { ...rest, ...size, widthFarMm: Number(widthFarMm.toFixed(2)) };
}

function wrong(typed: Partial<TallyRow>, unit: LengthUnit = "in") {
  const read = readRow(row(typed), unit);
  return read.state === "wrong" ? read.wrong : read.state;
}

describe("a row in its boxes", () => {
  it("is a line of one board unless a count is given", () => {
    expect(line({ width: "8 1/4", length: `10'6"` })).toEqual({
      count: 1,
      widthMm: 209.55,
      lengthMm: 3200.4,
      quarters: 4,
      species: "white-oak",
    });
    expect(line({ count: "3", width: "8", length: "10'", quarters: "5/4" })).toMatchObject({ count: 3, quarters: 5 });
  });

  it("with nothing but what was carried down is blank", () => {
    expect(wrong({})).toBe("blank");
    expect(wrong({ width: "  " })).toBe("blank");
  });

  it("of a board that tapers gives both ends", () => {
    expect(line({ width: "9 to 7", length: "8'" })).toMatchObject({ widthMm: 228.6, widthFarMm: 177.8 });
    expect(line({ width: "9 to 9", length: "8'" })).not.toHaveProperty("widthFarMm");
  });
});

describe("a whole size in the width's box", () => {
  it.each([
    [`8 1/4 x 10'6"`, { count: 1, widthMm: 209.55, lengthMm: 3200.4 }],
    ["8¼ × 10′ 6″", { count: 1, widthMm: 209.55, lengthMm: 3200.4 }],
    ["8x10", { count: 1, widthMm: 203.2, lengthMm: 3048 }],
    ["210 x 3050", { count: 1, widthMm: 210, lengthMm: 3050 }],
    ["210 mm by 3.05 m", { count: 1, widthMm: 210, lengthMm: 3050 }],
    ["3 @ 8 x 10'", { count: 3, widthMm: 203.2, lengthMm: 3048 }],
    ["3@8x10'", { count: 3, widthMm: 203.2, lengthMm: 3048 }],
    ["3 pcs 8 x 10'", { count: 3, widthMm: 203.2, lengthMm: 3048 }],
    ["8 x 10' *3", { count: 3, widthMm: 203.2, lengthMm: 3048 }],
    ["5/4 x 8 x 10'", { quarters: 5, widthMm: 203.2, lengthMm: 3048 }],
    ["2 @ 9 to 7 x 8'", { count: 2, widthMm: 228.6, widthFarMm: 177.8, lengthMm: 2438.4 }],
  ])("%s", (width, expected) => expect(line({ width })).toMatchObject(expected));

  it("counts instead of what the other boxes hold", () => {
    expect(line({ width: "8 x 10'", length: "12'", count: "2" })).toMatchObject({ count: 2, lengthMm: 3048 });
  });
});

describe("bare figures", () => {
  it.each<[string, string, LengthUnit, number, number]>([
    // In a shop of inches a short length is feet, a long one inches.
    ["8", "10", "in", 203.2, 3048],
    ["8", "10.5", "in", 203.2, 3200.4],
    ["8", "10 1/2", "in", 203.2, 3200.4],
    ["8", "96", "in", 203.2, 2438.4],
    ["8", `18"`, "in", 203.2, 457.2],
    // No board is 210 in wide.
    ["210", "3050", "in", 210, 3050],
    ["210", "10'", "in", 210, 3048],
    // In a shop of millimetres.
    ["210", "3050", "mm", 210, 3050],
    ["210", "3.05", "mm", 210, 3050],
    ["8", "10'", "mm", 203.2, 3048],
    ["8 1/4", "10", "mm", 209.55, 3048],
    ["210", "10'", "mm", 210, 3048],
  ])("%s by %s in a shop of %s", (width, length, unit, widthMm, lengthMm) =>
    expect(line({ width, length }, unit)).toMatchObject({ widthMm, lengthMm }),
  );

  it("are spelt out where the shop's unit would not say it", () => {
    expect(spellOut("8 1/4", "10", "in")).toEqual({ width: "8 1/4", length: "10'" });
    expect(spellOut("8", "96", "in")).toEqual({ width: "8", length: `96"` });
    expect(spellOut("210", "3050", "in")).toEqual({ width: "210 mm", length: "3050 mm" });
    expect(spellOut("210", "3050", "mm")).toEqual({ width: "210", length: "3050" });
    expect(spellOut("9 to 7", "8", "mm")).toEqual({ width: "9 to 7", length: "8 m" });
    expect(spellOut("9 to 7", "8'", "mm")).toEqual({ width: `9" to 7"`, length: "8'" });
    expect(spellOut("8", "", "in")).toEqual({ width: "8", length: "" });
  });

  it("read the same once spelt out", () => {
    const figure = fc.oneof(
      fc.integer({ min: 1, max: 4000 }).map(String),
      fc.tuple(fc.integer({ min: 1, max: 40 }), fc.integer({ min: 1, max: 7 })).map(([a, b]) => `${a} ${b}/8`),
      fc.integer({ min: 1, max: 300 }).map((tenths) => String(tenths / 10)),
    );
    const marked = fc.oneof(
      figure,
      fc.tuple(figure, fc.constantFrom("'", '"', " mm", " cm")).map(([n, sign]) => n + sign),
    );
    fc.assert(
      fc.property(marked, marked, fc.constantFrom<LengthUnit>("in", "mm"), (width, length, unit) => {
        expect(readRow(row(spellOut(width, length, unit)), unit)).toEqual(readRow(row({ width, length }), unit));
      }),
    );
  });
});

describe("a row that cannot be read says beside each box what would be right", () => {
  it.each<[Partial<TallyRow>, object]>([
    [{ width: "wide", length: "10'" }, { width: expect.stringMatching(/8 1\/4/) }],
    [{ width: "8", length: "" }, { length: "Give the length." }],
    [{ width: "", length: "10'" }, { width: "Give the width." }],
    [{ width: "8", length: "ten" }, { length: expect.stringMatching(/7' 2"/) }],
    [{ width: "8 x ten" }, { length: expect.stringMatching(/7' 2"/) }],
    [{ width: "10'", length: "8" }, { width: expect.stringMatching(/^Too wide for a board: the width comes first/) }],
    [{ width: "1/4", length: "8'" }, { width: "Too narrow for a board: check the width." }],
    [{ width: "8", length: `1"` }, { length: "Too short for a board: check the length." }],
    [{ width: "8", length: "48'" }, { length: "Over 39 ft (12 m) long: check the length." }],
    [{ width: "9 to 8 to 7", length: "8'" }, { width: "Two ends at most: 9 to 7." }],
    [{ width: "9 to y", length: "8'" }, { width: expect.stringMatching(/8 1\/4/) }],
    [{ width: "8 x 10 x 3", length: "8'" }, { width: expect.stringMatching(/8 1\/4/) }],
    [{ width: "5'", length: "8'" }, { width: expect.stringMatching(/^Too wide/) }],
    [{ count: "0", width: "8", length: "8'" }, { count: "How many alike: 1 to 500." }],
    [{ count: "2.5", width: "8", length: "8'" }, { count: "How many alike: 1 to 500." }],
    [{ count: "501", width: "8", length: "8'" }, { count: "How many alike: 1 to 500." }],
    [{ count: "3" }, { width: "Give the width.", length: "Give the length." }],
    [{ width: "8", length: "8'", quarters: "thick" }, { quarters: "Choose the quarters." }],
    [{ width: "8", length: "8'", species: "" }, { species: "Choose the species." }],
    [{ width: "8", length: "8'", species: "wallnut" }, { species: "No species is called “wallnut” here: choose it." }],
  ])("%o", (typed, expected) => expect(wrong(typed)).toEqual(expected));

  it("whatever is typed, a row reads as one of three, and a line has sizes a board can have", () => {
    const text = fc.oneof(fc.string({ maxLength: 20 }), fc.stringMatching(/^[0-9 /.,'"x@mto-]{0,14}$/));
    fc.assert(
      fc.property(
        text,
        text,
        text,
        text,
        fc.constantFrom<LengthUnit>("in", "mm"),
        (count, width, length, quarters, unit) => {
          const read = readRow(row({ count, width, length, quarters }), unit);
          if (read.state === "wrong") expect(Object.keys(read.wrong).length).toBeGreaterThan(0);
          if (read.state !== "line") return;
          for (const widthMm of [read.line.widthMm, read.line.widthFarMm ?? read.line.widthMm])
            expect(widthMm >= 10 && widthMm <= 1500).toBe(true);
          expect(read.line.lengthMm >= 50 && read.line.lengthMm <= 12_000).toBe(true);
          expect(Number.isInteger(read.line.count) && read.line.count >= 1).toBe(true);
        },
      ),
      { numRuns: 500 },
    );
  });
});
