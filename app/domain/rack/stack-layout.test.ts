import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { stackOnArm, stickerMm } from "./stack-layout.ts";

const board = (id: string, widthMm: number, thicknessMm = 27) => ({ id, widthMm, thicknessMm });

describe("stackOnArm", () => {
  test("boards that fit lie side by side on the arm", () => {
    const { boards, stickers, heightMm } = stackOnArm([board("a", 200), board("b", 250)], 600);
    expect(boards.map((b) => b.upMm)).toEqual([0, 0]);
    expect(stickers).toEqual([]);
    expect(heightMm).toBe(27);
  });

  test("one that would reach past the arm begins a layer on stickers", () => {
    const { boards, heightMm } = stackOnArm([board("a", 400, 52), board("b", 300)], 600);
    expect(boards[1]?.upMm).toBe(52 + stickerMm);
    expect(heightMm).toBe(52 + stickerMm + 27);
  });

  test("an empty arm has no height, a board wider than the arm still has a place", () => {
    expect(stackOnArm([], 600).heightMm).toBe(0);
    expect(stackOnArm([board("wide", 900)], 600).boards).toHaveLength(1);
  });

  test("no two boards overlap, and none is lost", () => {
    const some = fc.array(
      fc.record({ widthMm: fc.integer({ min: 20, max: 700 }), thicknessMm: fc.integer({ min: 10, max: 110 }) }),
      { maxLength: 40 },
    );
    fc.assert(
      fc.property(some, (sizes) => {
        const stack = sizes.map((size, i) => ({ id: String(i), ...size }));
        const { boards } = stackOnArm(stack, 610);
        expect(boards).toHaveLength(stack.length);
        const at = boards.map((place) => ({ ...place, ...stack[Number(place.id)]! }));
        for (const a of at)
          for (const b of at)
            if (a.id < b.id)
              expect(
                a.xMm + a.widthMm <= b.xMm ||
                  b.xMm + b.widthMm <= a.xMm ||
                  a.upMm + a.thicknessMm <= b.upMm ||
                  b.upMm + b.thicknessMm <= a.upMm,
              ).toBe(true);
      }),
    );
  });
});
