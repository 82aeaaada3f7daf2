import { existsSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { clearCuttings } from "./clear-cuttings.ts";
import { cuttingUnits, demandsOf, type GradeName, gradeRules } from "./nhla.ts";

const reference = "../shared/reference/worked-examples.json";
interface Row {
  topic: string;
  input: string;
  expected: number | boolean | { units: number; cuttings: number };
  source: string;
  confidence: string;
}
const rows: Row[] = existsSync(reference)
  ? JSON.parse(readFileSync(reference, "utf8")).filter(({ topic }: Row) => topic === "grade")
  : [];

const inch = 25.4;
const ruleOf = (name: GradeName) => gradeRules.find((rule) => rule.name === name)!;
const units = (widthIn: number, lengthFt: number) => cuttingUnits(widthIn * inch * lengthFt * 12 * inch);

/** The first demand is the plain one, the second that with the extra cutting. */
const asked = (name: GradeName, surfaceMeasure: number, extra: boolean) =>
  demandsOf(ruleOf(name), surfaceMeasure)[extra ? 1 : 0];

const computed: [pattern: RegExp, compute: () => unknown][] = [
  [/^FAS: 8 in x 12 ft \(SM 8\)/, () => asked("FAS", 8, false)],
  [/^FAS, extra cutting, SM 8/, () => asked("FAS", 8, true)],
  [/^No\. 1 Common: SM 6/, () => asked("No. 1 Common", 6, false)],
  [/^No\. 1 Common with extra cutting, SM 6/, () => asked("No. 1 Common", 6, true)],
  [/^No\. 2A Common: SM 5/, () => asked("No. 2A Common", 5, false)],
  [/^No\. 2A Common with extra cutting, SM 5/, () => asked("No. 2A Common", 5, true)],
  [/^cutting 4 in x 5 ft/, () => units(4, 5)],
  [/^cutting 3-1\/2 in x 4-1\/2 ft/, () => units(3.5, 4.5)],
  [
    /^is a clear piece 3 in x 6 ft a legal FAS cutting\?$/,
    () => clearCuttings({ widthMm: 3 * inch, lengthMm: 72 * inch }, [], ruleOf("FAS").leastCuttings, 1).areaMm2 > 0,
  ],
  [/^chair-leg blank 2-1\/4 in x 20 in/, () => units(2.25, 20 / 12)],
];

/** All ten rows of the topic; 10 are skipped where the reference is not at hand. */
describe.skipIf(rows.length === 0)("worked examples: grade (10 rows)", () => {
  test("are all here", () => {
    expect(rows).toHaveLength(10);
  });

  test.each(rows)("$input [$source, $confidence]", ({ input, expected }) => {
    const found = computed.find(([pattern]) => pattern.test(input))?.[1]();
    if (typeof expected === "number") expect(found).toBeCloseTo(expected, 9);
    else expect(found).toEqual(expected);
  });
});
