import { describe, expect, it } from "vitest";
import { parseLength } from "./parse-length.ts";

const mm = (typed: string, unit: "in" | "mm" = "in") => {
  const parsed = parseLength(typed, unit);
  return parsed.ok ? parsed.mm : parsed.why;
};
const why = (typed: string, unit: "in" | "mm" = "in", limits = {}) => {
  const parsed = parseLength(typed, unit, limits);
  return parsed.ok ? `taken as ${parsed.mm} mm` : parsed.why;
};

// An inch is 25.4 mm and a foot 304.8 mm, exactly: definition of 1959. The spellings are common practice.
describe("a length as people write it", () => {
  it.each([
    ["8 1/4", 209.55],
    ["8-1/4", 209.55],
    ["8 - 1/4", 209.55],
    ["8.25", 209.55],
    ["8,25", 209.55],
    ['8 1/4"', 209.55],
    ["8 1/4”", 209.55],
    ["8¼", 209.55],
    ["8 ¼", 209.55],
    ["8 1⁄4 in.", 209.55],
    ["8.25 inches", 209.55],
    ["⅞", 22.225],
    ["7/8", 22.225],
    [".875", 22.225],
    ["5/4", 31.75],
    ["1/64", 0.396875],
    ["7' 2\"", 2184.4],
    ["7'2", 2184.4],
    ["7’ 2″", 2184.4],
    ["7'-2\"", 2184.4],
    ["7' 2 1/2\"", 2197.1],
    ["7'2½\"", 2197.1],
    ["7'", 2133.6],
    ["7 ft", 2133.6],
    ["7ft 2in", 2184.4],
    ["7 feet 2 inches", 2184.4],
    ["7 1/2 ft", 2286],
    ["86", 2184.4],
    [" 86  ", 2184.4],
    ["210 mm", 210],
    ["210mm", 210],
    ["21 cm", 210],
    ["3.05 m", 3050],
    ["3,050 m", 3050],
    ["1.005 m", 1005],
    ["2.03 cm", 20.3],
  ])("reads %s in an inch shop as %f mm", (typed, expected) => {
    expect(mm(typed)).toBe(expected);
  });

  it.each([
    ["210", 210],
    ["210.5", 210.5],
    ["210,5", 210.5],
    ["0,125", 0.125],
    ['8 1/4"', 209.55],
    ["10'6\"", 3200.4],
    ["21 cm", 210],
  ])("reads %s in a millimetre shop as %f mm", (typed, expected) => {
    expect(mm(typed, "mm")).toBe(expected);
  });
});

describe("what is no length is refused with what would be right", () => {
  it.each([
    ["", "Give a length. Write it as 8 1/4, 8.25, 7' 2\" or 210 mm."],
    ["abc", "That is not a length. Write it as 8 1/4, 8.25, 7' 2\" or 210 mm."],
    ["NaN", "That is not a length. Write it as 8 1/4, 8.25, 7' 2\" or 210 mm."],
    ["Infinity", "That is not a length. Write it as 8 1/4, 8.25, 7' 2\" or 210 mm."],
    ["1e3", "That is not a length. Write it as 8 1/4, 8.25, 7' 2\" or 210 mm."],
    ["8 25", "That is not a length. Write it as 8 1/4, 8.25, 7' 2\" or 210 mm."],
    ["8.25.1", "That is not a length. Write it as 8 1/4, 8.25, 7' 2\" or 210 mm."],
    ["8 1.5/4", "That is not a length. Write it as 8 1/4, 8.25, 7' 2\" or 210 mm."],
    ["8 x 10", "That is not a length. Write it as 8 1/4, 8.25, 7' 2\" or 210 mm."],
    ["mm", "That is not a length. Write it as 8 1/4, 8.25, 7' 2\" or 210 mm."],
    ["1".repeat(60), "That is not a length. Write it as 8 1/4, 8.25, 7' 2\" or 210 mm."],
    ["-8", "A length cannot be negative: leave the minus sign out."],
    ["−8 1/4", "A length cannot be negative: leave the minus sign out."],
    ["0", "A length of zero will not do: give one above zero."],
    ["0/4", "A length of zero will not do: give one above zero."],
    ["8 1/0", "A fraction cannot have a zero below the line: write 1/2, not 1/0."],
    ["8 5/4", "Beside a whole number the fraction must be less than one; 5/4 is not."],
    ["7' 14\"", "Beside feet the inches must be less than 12."],
    ["7 1/2' 3\"", "Beside inches the feet must be whole: 7' 6\", not 7 1/2' 0\"."],
    ["3050", "At most 65 ft: check the figure. For millimetres write 3050 mm."],
    ["3050 in", "At most 65 ft: check the figure."],
    ["90000", "At most 65 ft: check the figure."],
  ])("%s", (typed, expected) => {
    expect(why(typed)).toBe(expected);
  });

  it("asks which was meant where a comma could part thousands", () => {
    expect(why("3,050", "mm")).toBe("Is that 3050 or 3.050 mm? Write it without the comma.");
    expect(why("3,050 mm")).toBe("Is that 3050 or 3.050 mm? Write it without the comma.");
    expect(mm("8,125")).toBe(206.375);
  });

  it("takes zero only where a place along a board may be zero", () => {
    expect(parseLength("0", "in", { zero: true })).toEqual({ ok: true, mm: 0 });
  });

  it("keeps to the limit of the field and says it in the shop's unit", () => {
    expect(parseLength("12", "in", { mostMm: 304.8 })).toEqual({ ok: true, mm: 304.8 });
    expect(why("12 1/64", "in", { mostMm: 304.8 })).toBe(
      "At most 12 in: check the figure. For millimetres write 12 mm.",
    );
    expect(why("301", "mm", { mostMm: 300 })).toBe("At most 300 mm: check the figure.");
    expect(why("20001", "mm")).toBe("At most 20 m: check the figure.");
  });
});
