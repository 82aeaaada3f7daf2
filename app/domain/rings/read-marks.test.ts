import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { marksForm, readMarks, startingMarks } from "./read-marks.ts";
import { ringColumns } from "./rings.server.ts";

const board = { widthMm: 203.2, thicknessMm: 25.4 };
const limits = { flatBelowDeg: 30, quarteredAboveDeg: 60 };

/** An end photographed a little askew. */
const corners = [
  { x: 10, y: 10 },
  { x: 310, y: 12 },
  { x: 308, y: 60 },
  { x: 11, y: 58 },
];

describe("marks on a photo", () => {
  test("are none as they start, so that the reader's word stands", () => {
    expect(readMarks(startingMarks(4000, 3000), board)).toBeNull();
  });

  test("with the pith dragged beyond the horizon are refused in words", () => {
    const marks = { corners, strokes: [], pith: { x: -9, y: 10_000_000 } };
    expect(readMarks(marks, board)).toEqual({ ok: false, why: expect.stringContaining("too far off") });
  });

  test.each(["", "null", "[]", "{}", '{"corners":[]}', "{", "☃", `{"corners":${JSON.stringify(corners)}}`])(
    "%j did not arrive whole",
    (marks) => {
      expect(marksForm.safeParse({ marks }).success).toBe(false);
    },
  );

  test("wherever they are, come out as angles of 0 to 90 degrees, or as a refusal", () => {
    const number = fc.oneof(
      fc.integer({ min: -20, max: 400 }),
      fc.double({ noNaN: true, noDefaultInfinity: true }),
      fc.constantFrom(0, 1e7, -1e7, 1e308, -1e308, 5e-324),
    );
    const point = fc.record({ x: number, y: number });
    const marks = fc.record({
      corners: fc.oneof(fc.constant(corners), fc.array(point, { minLength: 4, maxLength: 4 })),
      strokes: fc.array(fc.array(point, { minLength: 2, maxLength: 12 }), { maxLength: 3 }),
      pith: fc.option(point),
    });
    fc.assert(
      fc.property(marks, (given) => {
        const parsed = marksForm.safeParse({ marks: JSON.stringify(given) });
        const read = parsed.success ? readMarks(parsed.data.marks, board) : null;
        if (!read?.ok) return;
        const columns = ringColumns(read.field, limits);
        for (const deg of [columns.ring_min_deg, columns.ring_mean_deg, columns.ring_max_deg])
          expect(deg >= 0 && deg <= 90.000001).toBe(true);
        expect(read.confidence >= 0 && read.confidence <= 1).toBe(true);
      }),
      { numRuns: 1500 },
    );
  });
});
