import { describe, expect, it } from "vitest";
import { parseSize, parseTallyLength } from "./parse-size.ts";

const inches = { width: "in", length: "in" } as const;
const metric = { width: "mm", length: "mm" } as const;

// The spellings and the speaking of lengths in feet are common practice.
describe("a tally line", () => {
  it.each([
    ["8 1/4 x 10'6\"", 209.55, 3200.4, 1, "ft"],
    ["8.25 × 126", 209.55, 3200.4, 1, "in"],
    ["8¼x10", 209.55, 3048, 1, "ft"],
    ["8 by 10 1/2", 203.2, 3200.4, 1, "ft"],
    ["8 x 20", 203.2, 6096, 1, "ft"],
    ["8 x 20 1/64", 203.2, 508.396875, 1, "in"],
    ["8 x 10 in", 203.2, 254, 1, "in"],
    ["3 @ 8 x 10'", 203.2, 3048, 3, "ft"],
    ["3@8x10", 203.2, 3048, 3, "ft"],
    ["3 pcs 8 x 10", 203.2, 3048, 3, "ft"],
    ["8 x 10' *3", 203.2, 3048, 3, "ft"],
    ["8 x 10*12", 203.2, 3048, 12, "ft"],
    ["210 mm x 3.05 m", 210, 3050, 1, "m"],
  ])("%s in an inch shop", (typed, widthMm, lengthMm, count, understood) => {
    expect(parseSize(typed, inches)).toEqual({ ok: true, widthMm, lengthMm, count, understood });
  });

  it.each([
    ["210 x 3050", 210, 3050, 1, "mm"],
    ["210 X 3,05", 210, 3050, 1, "m"],
    ["2 @ 210 x 305 cm", 210, 3050, 2, "cm"],
    ["8\" x 10'", 203.2, 3048, 1, "ft"],
    ["210 x 21", 210, 21, 1, "mm"],
  ])("%s in a millimetre shop", (typed, widthMm, lengthMm, count, understood) => {
    expect(parseSize(typed, metric)).toEqual({ ok: true, widthMm, lengthMm, count, understood });
  });

  it("takes width and length each in its own unit", () => {
    expect(parseSize("210 x 10", { width: "mm", length: "in" })).toMatchObject({ widthMm: 210, lengthMm: 3048 });
  });

  it.each([
    ["8 1/4", "line"],
    ["", "line"],
    ["8 x 10 x 3", "line"],
    ["8 * 10", "line"],
    ["3 @ 8 x 10 *2", "count"],
    ["0 @ 8 x 10", "count"],
    ["501 @ 8 x 10", "count"],
    ["x 10", "width"],
    ["10' x 8", "width"],
    ["0 x 8", "width"],
    ["-8 x 10", "width"],
    ["8 x ", "length"],
    ["8 x 10 1/0", "length"],
    ["8 x 0", "length"],
    ["8 x 3050", "length"],
  ])("refuses %s and says it is the %s", (typed, part) => {
    expect(parseSize(typed, inches)).toEqual({ ok: false, part, why: expect.stringMatching(/\w/) });
  });

  it("asks for millimetres to be named in an inch shop", () => {
    expect(parseSize("8 x 3050", inches)).toMatchObject({
      why: "At most 65 ft: check the figure. For millimetres write 3050 mm.",
    });
  });
});

describe("the length cell of a tally", () => {
  it("says the unit a bare number was understood in", () => {
    expect(parseTallyLength("10", "in")).toEqual({ ok: true, mm: 3048, understood: "ft" });
    expect(parseTallyLength("126", "in")).toEqual({ ok: true, mm: 3200.4, understood: "in" });
    expect(parseTallyLength("2,5", "mm")).toEqual({ ok: true, mm: 2500, understood: "m" });
    expect(parseTallyLength("2500", "mm")).toEqual({ ok: true, mm: 2500, understood: "mm" });
  });
});
