import { afterAll, describe, expect, test } from "vitest";
import { endPicture } from "#tests/e2e/setup/end-picture.ts";
import { createRingReader } from "./ring-reader.server.ts";

const size = { widthMm: 200, thicknessMm: 26 };
const limits = { flatBelowDeg: 30, quarteredAboveDeg: 60 };

describe("the ring reader in its thread", () => {
  const reader = createRingReader();
  afterAll(() => reader.close());

  test("finds a generated end on its bench and reads its rings, while this thread goes on", async () => {
    const picture = await endPicture(size, { xMm: -90, yMm: 215 });
    let ticks = 0;
    const clock = setInterval(() => ticks++, 5);
    const answer = await reader.ask({ bytes: picture.jpeg, ...size, limits });
    clearInterval(clock);
    if (!answer.ok) throw new Error(answer.message);
    // Ring angle at mid-width of circles round that pith: atan(190 / 202) = 43 degrees.
    expect(Math.abs((answer.field.stations[4]?.angleDeg ?? 0) - 43.2)).toBeLessThan(4);
    for (const [i, corner] of answer.corners.entries()) {
      expect(Math.abs(corner.x - (picture.corners[i]?.x ?? 0))).toBeLessThan(25);
      expect(Math.abs(corner.y - (picture.corners[i]?.y ?? 0))).toBeLessThan(25);
    }
    expect(ticks).toBeGreaterThan(5);
  });

  test("what is no picture gets words, and the next question an answer", async () => {
    expect(await reader.ask({ bytes: Buffer.from("no picture"), ...size, limits })).toMatchObject({ ok: false });
    const picture = await endPicture(size, { xMm: 100, yMm: 140 });
    expect(await reader.ask({ bytes: picture.jpeg, ...size, limits })).toMatchObject({ ok: true });
  });
});
