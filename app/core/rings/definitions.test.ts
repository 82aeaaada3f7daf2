import { describe, expect, test } from "vitest";
import { ringDefinitions } from "./definitions.ts";
import { fieldFromAngle } from "./field-from-angle.ts";
import { classLimitsProblem, classOf, classShares, defaultClassLimits } from "./summary.ts";

function limitsOf(source: RegExp) {
  const found = ringDefinitions.find((definition) => source.test(definition.source));
  if (!found?.limits) throw new Error(`no limits from ${source}`);
  return found.limits;
}

/** What each source says of one angle; the sources and how sure they are stand in the definitions themselves. */
describe("published definitions", () => {
  test.each([
    // AWS 2009 appendix B: flat typically 30 or less, rift 30 to 60, quartered 60 to 90 [confirmed].
    [/Architectural Woodwork Standards/, 25, "flat"],
    [/Architectural Woodwork Standards/, 45, "rift"],
    [/Architectural Woodwork Standards/, 70, "quartered"],
    // NHLA usage: rift 30 to 60, 45 best; quartered 60 to 90 [confirmed].
    [/industry usage/, 45, "rift"],
    [/industry usage/, 90, "quartered"],
    // NHLA 2023 paragraph 35: radial grain 45 or less to the face, so rings 45 or more [confirmed].
    [/paragraph 35/, 44, "flat"],
    [/paragraph 35/, 50, "quartered"],
    // Wood Handbook chapter 3: a two-way split at 45 [secondary].
    [/Wood Handbook, USDA/, 40, "flat"],
    [/Wood Handbook, USDA/, 60, "quartered"],
    // A distributor's guide: rift 45 to 75 [secondary].
    [/distributor/, 40, "flat"],
    [/distributor/, 60, "rift"],
    [/distributor/, 80, "quartered"],
    // Softwood: vertical grain 45 or more [memory].
    [/Softwood/, 45, "quartered"],
  ] as const)("%s calls %d degrees %s", (source, angle, expected) => {
    expect(classOf(angle, limitsOf(source))).toBe(expected);
  });

  test("the same board at 50 degrees is rift to one source and quartered to another", () => {
    const board = fieldFromAngle({ widthMm: 200, thicknessMm: 26 }, 50, "right");
    expect(classShares(board, limitsOf(/Architectural Woodwork Standards/)).rift).toBe(1);
    expect(classShares(board, limitsOf(/paragraph 35/)).quartered).toBe(1);
  });

  test("those with limits can be chosen as they stand, and the first is what a new shop starts with", () => {
    for (const { limits } of ringDefinitions) if (limits) expect(classLimitsProblem(limits)).toBeNull();
    expect(ringDefinitions[0]?.limits).toEqual(defaultClassLimits);
    expect(ringDefinitions.filter(({ limits }) => limits === null)).toHaveLength(3);
  });
});
