import { existsSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { clampsFor, lbfFromNewtons, newtonsFromLbf } from "./clamps.ts";
import { millingSheet } from "./milling.ts";
import { pliesNeeded } from "./plies.ts";
import { bendingLeftPct, d245BendingPct, hankinson, slopeDeg } from "./slope-of-grain.ts";

const reference = "../shared/reference/worked-examples.json";
interface Row {
  topic: string;
  input: string;
  expected: number | Record<string, number>;
  tolerance: number;
  source: string;
  confidence: string;
}
const topics = ["gluing", "milling", "strength"];
const rows: Row[] = existsSync(reference)
  ? JSON.parse(readFileSync(reference, "utf8")).filter(({ topic }: Row) => topics.includes(topic))
  : [];

const inch = 25.4;
const clamps = (widthIn: number, lengthIn: number, psi: number, padIn = 100) =>
  clampsFor({ widthMm: widthIn * inch, lengthMm: lengthIn * inch }, psi, newtonsFromLbf(1000), padIn * inch);

/** Sizes of a leg as its rough piece must hold them, its allowances in inches. */
function roughLeg(finishedIn: { t: number; w: number; l: number }, addIn: { t: number; w: number; l: number }) {
  const sheet = millingSheet(
    { thicknessMm: finishedIn.t * inch, widthMm: finishedIn.w * inch, lengthMm: finishedIn.l * inch },
    (finishedIn.t + addIn.t) * inch,
    { thicknessMm: addIn.t * inch, widthMm: addIn.w * inch, lengthMm: addIn.l * inch, jointPerFaceMm: 0 },
  );
  const size = sheet?.steps.find(({ step }) => step === "rough length")?.size;
  return size && { t: size.thicknessMm / inch, w: size.widthMm / inch, l: size.lengthMm / inch };
}

const computed: [pattern: RegExp, compute: () => unknown][] = [
  [/^face lamination 2 in x 18 in at 175 psi: total clamp force$/, () => lbfFromNewtons(clamps(2, 18, 175).forceN)],
  [/^clamps of 1000 lbf each for that joint$/, () => clamps(2, 18, 175).clamps],
  [/^edge joint, 3\/4 in thick, 36 in long at 150 psi/, () => lbfFromNewtons(clamps(0.75, 36, 150).forceN)],
  // A pressure so light that reach alone decides.
  [/^45-degree load spread through a 3 in caul/, () => clamps(0.5, 36, 1, 3).spacingMm / inch],
  [/^Hankinson n=2: P 7440 psi, Q 1070 psi .* theta 15 deg$/, () => hankinson(7440, 1070, 15)],
  [/^slope of grain 1 in 15 in degrees$/, () => slopeDeg(15)],
  [/^bending strength at slope 1 in 10 as a share/, () => bendingLeftPct(10)],
  [/^bending strength at slope 1 in 15 as a share/, () => bendingLeftPct(15)],
  [/^ASTM D245 strength ratio in bending at slope 1 in 10$/, () => d245BendingPct[10]],
  [
    /^leg blank finished 1-3\/4 x 1-3\/4 x 28 in/,
    () => roughLeg({ t: 1.75, w: 1.75, l: 28 }, { t: 0.25, w: 0.25, l: 1 }),
  ],
  [
    /^three plies of 4\/4 surfaced to 13\/16 in/,
    () =>
      (pliesNeeded({ finishedMm: 2.4 * inch, stockMm: 0.8125 * inch, jointPerFaceMm: 0, allowanceMm: 0 })?.gluedMm ??
        0) / inch,
  ],
];

/** Force goes through newtons and psi in pascals to seven digits, so a tolerance of none is one part in a million. */
const near = (expected: number, tolerance: number) => Math.max(tolerance, Math.abs(expected) * 1e-6);

/** Every row of the three topics; 11 are skipped where the reference is not at hand. */
describe.skipIf(rows.length === 0)("worked examples: gluing, milling, strength (11 rows)", () => {
  test("are all here", () => {
    expect(rows).toHaveLength(11);
  });

  test.each(rows)("$topic: $input [$source, $confidence]", ({ input, expected, tolerance }) => {
    const compute = computed.find(([pattern]) => pattern.test(input))?.[1];
    const found = compute?.();
    if (typeof expected === "number")
      return expect(Math.abs((found as number) - expected)).toBeLessThanOrEqual(near(expected, tolerance));
    for (const [name, value] of Object.entries(expected))
      expect(Math.abs((found as Record<string, number>)[name]! - value)).toBeLessThanOrEqual(near(value, tolerance));
  });
});
