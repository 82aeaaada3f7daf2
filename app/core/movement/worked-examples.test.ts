import { existsSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { speciesByCode } from "#app/core/species/species.ts";
import { cupFromPithDistanceMm } from "./cup.ts";
import { growthAtAngle, outOfSquareDeg } from "./ring-angle.ts";
import { changeByCoefficient, changeByShrinkage, shrinkageToPct } from "./size-change.ts";

const table = (code: string) => speciesByCode(code)!.coefficients!;
const along = (code: string) => table(code).tangential!;
const shrinkage = (code: string) => speciesByCode(code)!.shrinkage!;
const maple = { radial: table("sugar-maple").radial!, tangential: along("sugar-maple") };
const redOakDrying = {
  radial: (shrinkage("northern-red-oak").radialPct / 100) * (22 / 30),
  tangential: (shrinkage("northern-red-oak").tangentialPct / 100) * (22 / 30),
};
const whiteOak = { radial: table("white-oak").radial!, tangential: along("white-oak") };

/** Sizes are in the row's own unit: the formulas do not care which. */
const computed: Array<[begins: RegExp, value: (match: RegExpMatchArray) => number]> = [
  [/^white fir, flatsawn, 232 mm/, () => changeByCoefficient(232, along("white-fir"), 8, 11)],
  [/^same board: width at 11/, () => 232 + changeByCoefficient(232, along("white-fir"), 8, 11)],
  [/^same in inches: 9.15 in; change/, () => changeByCoefficient(9.15, along("white-fir"), 8, 11)],
  [/^same in inches: width/, () => 9.15 + changeByCoefficient(9.15, along("white-fir"), 8, 11)],
  [/^red oak \(commercial\)/, () => changeByCoefficient(12, along("northern-red-oak"), 6, 10)],
  [/^sugar maple quartersawn 4 in/, () => changeByCoefficient(4, maple.radial, 8, 12)],
  [/^black walnut flatsawn 18 in/, () => changeByCoefficient(18, along("black-walnut"), 9, 6)],
  [/^black cherry flatsawn 300 mm/, () => changeByCoefficient(300, along("black-cherry"), 7, 11)],
  [/^northern red oak flatsawn/, () => changeByShrinkage(8, shrinkage("northern-red-oak").tangentialPct, 30, 7)],
  [/^white oak quartersawn/, () => changeByShrinkage(200, shrinkage("white-oak").radialPct, 18, 8)],
  [/^black walnut, shrinkage/, () => shrinkageToPct(shrinkage("black-walnut").tangentialPct, 12)],
  [/^sugar maple width coefficient at ring angle (\d+)/, (m) => growthAtAngle(maple, Number(m[1])).width],
  [/^white oak 6 in wide at 60/, () => changeByCoefficient(6, growthAtAngle(whiteOak, 60).width, 6, 9)],
  [
    /^sugar maple square leg/,
    () => outOfSquareDeg({ radial: -4 * maple.radial, tangential: -4 * maple.tangential }, 45),
  ],
  [/^red oak flatsawn 8 in wide, mid-width 4/, () => cupFromPithDistanceMm(8, 4, redOakDrying)],
  [/^same board but mid-width 8 in/, () => cupFromPithDistanceMm(8, 8, redOakDrying)],
];

const reference = "../shared/reference/worked-examples.json";

describe.skipIf(!existsSync(reference))("worked examples: movement, ring-angle, cup", () => {
  const all: Array<{ topic: string; input: string; expected: number; tolerance: number; confidence: string }> =
    existsSync(reference) ? JSON.parse(readFileSync(reference, "utf8")) : [];
  const rows = all.filter(({ topic }) => ["movement", "ring-angle", "cup"].includes(topic));

  it.each(rows)("$topic: $input ($confidence)", ({ input, expected, tolerance }) => {
    const found = computed.map(([begins, value]) => ({ match: input.match(begins), value })).find(({ match }) => match);
    expect(found, "no check is written for this row").toBeDefined();
    expect(Math.abs(found!.value(found!.match!) - expected)).toBeLessThanOrEqual(tolerance);
  });
});
