import { expect, test } from "vitest";
import { describeEnd, describeField } from "./describe.ts";
import { fieldFromAngle } from "./field-from-angle.ts";
import { fieldFromPith } from "./stations.ts";
import { defaultClassLimits } from "./summary.ts";

const size = { widthMm: 210, thicknessMm: 27 };

test.each([
  [{ ringClass: "rift", leastDeg: 33.2, greatestDeg: 60.4 }, "end grain: rift, 33° to 60°"],
  [{ ringClass: "quartered", leastDeg: 88.1, greatestDeg: 88.3 }, "end grain: quartered, 88°"],
  [null, "end grain: not read yet"],
] as const)("%j reads %s", (end, words) => {
  expect(describeEnd(end)).toBe(words);
});

test("a reading is described under the shop's own limits", () => {
  expect(describeField(fieldFromAngle(size, 50, "right"), defaultClassLimits)).toBe("end grain: rift, 50°");
  expect(describeField(fieldFromAngle(size, 50, "right"), { flatBelowDeg: 45, quarteredAboveDeg: 45 })).toBe(
    "end grain: quartered, 50°",
  );
  expect(describeField(fieldFromPith(size, { xMm: 105, yMm: 200 }), defaultClassLimits)).toMatch(
    /^end grain: flat, \d° to \d\d°$/,
  );
});
