import { existsSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { ringDirection } from "./direction.ts";
import { fieldFromAngle } from "./field-from-angle.ts";

const source = "Plane strain transformation; problem treated in MacLean, FPL Report R1473 (1945) [derived]";

/** Width coefficient of sugar maple (CR 0.00165, CT 0.00353 per 1 % moisture) at a ring angle: shows that 0 is flat and 90 quartered. */
const maple = [
  [0, 0.00353],
  [20, 0.00331],
  [30, 0.00306],
  [45, 0.00259],
  [60, 0.00212],
  [75, 0.001776],
  [90, 0.00165],
] as const;

/** CT cos² + CR sin², averaged over the end's area from the rings' direction at each point. */
function widthCoefficient(angleDeg: number, radial: number, tangential: number): number {
  const size = { widthMm: 152.4, thicknessMm: 25.4 };
  const direction = ringDirection(fieldFromAngle(size, angleDeg, "right"));
  let sum = 0;
  for (let i = 0; i < 10; i++) {
    const across = Math.sin((direction({ xMm: (i + 0.5) * 15.24, yMm: i * 2.54 }) * Math.PI) / 180) ** 2;
    sum += tangential * (1 - across) + radial * across;
  }
  return sum / 10;
}

describe(`the ring angle as movement takes it: ${source}`, () => {
  test.each(maple)("sugar maple at %d degrees: %d", (angle, expected) => {
    // 20 and 30 degrees are rounded to five places in the source.
    expect(Math.abs(widthCoefficient(angle, 0.00165, 0.00353) - expected)).toBeLessThanOrEqual(5e-6);
  });
});

const reference = "../shared/reference/worked-examples.json";
interface Row {
  topic: string;
  input: string;
  expected: number;
  tolerance: number;
}
const rows: Row[] = existsSync(reference)
  ? JSON.parse(readFileSync(reference, "utf8")).filter(({ topic }: Row) => topic === "ring-angle")
  : [];

/** All nine rows of the topic; 9 are skipped where the reference is not at hand. */
describe.skipIf(rows.length === 0)("worked examples: ring-angle (9 rows)", () => {
  test("are all here", () => {
    expect(rows).toHaveLength(9);
  });

  test.each(rows)("$input", ({ input, expected, tolerance }) => {
    const number = (pattern: RegExp) => Number(input.match(pattern)?.[1]);
    const [radial, tangential] = [number(/CR (0\.\d+)/), number(/CT (0\.\d+)/)];
    if (input.startsWith("sugar maple width coefficient"))
      return expect(
        Math.abs(widthCoefficient(number(/ring angle (\d+)/), radial, tangential) - expected),
      ).toBeLessThanOrEqual(Math.max(tolerance, 5e-6));
    if (input.startsWith("white oak 6 in wide"))
      return expect(Math.abs(6 * 3 * widthCoefficient(60, radial, tangential) - expected)).toBeLessThanOrEqual(
        tolerance,
      );
    // The square leg's corner: (CT - CR) × 4 points, the shear at 45 degrees; coefficients of the sugar maple rows.
    const cornerDeg =
      ((widthCoefficient(0, 0.00165, 0.00353) - widthCoefficient(90, 0.00165, 0.00353)) * 4 * 180) / Math.PI;
    return expect(Math.abs(cornerDeg - expected)).toBeLessThanOrEqual(tolerance);
  });
});
