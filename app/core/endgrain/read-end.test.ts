import { describe, expect, it } from "vitest";
import type { EndCorners } from "#app/core/endgrain/corner-check.ts";
import type { EndPixels } from "#app/core/endgrain/pixels.ts";
import { readEnd } from "#app/core/endgrain/read-end.ts";
import { generatedTruth } from "#scripts/endgrain/generated-set.ts";
import { type EndSpec, renderEnd } from "#scripts/endgrain/render-end.ts";

const board: EndSpec = {
  widthMm: 140,
  thicknessMm: 30,
  pith: { xMm: 40, yMm: 75 },
  ringsPerInch: 8,
  kind: "softwood",
  seed: 3,
  pxPerMm: 5,
};

function flat(width: number, height: number, value: number): EndPixels {
  return { width, height, data: new Uint8Array(width * height * 3).fill(value) };
}

function read(pixels: EndPixels, options?: Parameters<typeof readEnd>[1]) {
  const reading = readEnd(pixels, options);
  if (!reading.ok) throw new Error(reading.message);
  return reading;
}

function worstMiss(stations: { angleDeg: number }[], truth: number[]): number {
  return Math.max(...stations.map((station, i) => Math.abs(station.angleDeg - truth[i]!)));
}

/** Truth of the generated ends: the geometry they were drawn from (scripts/endgrain/ring-tree.ts). */
describe("a generated softwood end", () => {
  const pixels = renderEnd(board);
  const truth = generatedTruth(board);
  const reading = read(pixels, { widthMm: board.widthMm, thicknessMm: board.thicknessMm });

  it("is read within a degree at every station", () => {
    expect(reading.stations).toHaveLength(9);
    expect(worstMiss(reading.stations, truth.stations)).toBeLessThan(1);
  });

  it("has its pith, ring density and shares found", () => {
    expect(Math.abs(reading.pith!.xMm - 40)).toBeLessThan(3);
    expect(Math.abs(reading.pith!.yMm - 75)).toBeLessThan(5);
    expect(Math.abs(reading.ringsPerInch! - 8)).toBeLessThan(1);
    expect(reading.shares.flat + reading.shares.rift + reading.shares.quartered).toBeCloseTo(1, 9);
    expect(Math.abs(reading.shares.flat - truth.shares.flat)).toBeLessThan(0.03);
  });

  it("reads the same again, and in grey", () => {
    expect(read(pixels, { widthMm: board.widthMm, thicknessMm: board.thicknessMm })).toEqual(reading);
    const grey = { ...pixels, data: pixels.data.filter((_, i) => i % 3 === 1) };
    expect(worstMiss(read(grey).stations, truth.stations)).toBeLessThan(1.5);
  });

  it("mirrored left to right has the stations in turn and the signs changed", () => {
    const mirrored = new Uint8Array(pixels.data.length);
    for (let y = 0; y < pixels.height; y++) {
      for (let x = 0; x < pixels.width; x++) {
        for (let c = 0; c < 3; c++)
          mirrored[(y * pixels.width + x) * 3 + c] = pixels.data[(y * pixels.width + pixels.width - 1 - x) * 3 + c]!;
      }
    }
    const other = read({ ...pixels, data: mirrored });
    other.stations.forEach((station, i) => {
      expect(Math.abs(station.angleDeg - reading.stations[8 - i]!.angleDeg)).toBeLessThan(0.5);
      expect(Math.abs(station.signedDeg + reading.stations[8 - i]!.signedDeg)).toBeLessThan(1);
    });
  });
});

describe("bad input is refused in words", () => {
  const crossed: EndCorners = [
    { x: 0, y: 0 },
    { x: 100, y: 100 },
    { x: 100, y: 0 },
    { x: 0, y: 100 },
  ];
  const outside: EndCorners = [
    { x: -50, y: 0 },
    { x: 100, y: 0 },
    { x: 100, y: 80 },
    { x: 0, y: 80 },
  ];
  const tiny: EndCorners = [
    { x: 0, y: 0 },
    { x: 100, y: 0 },
    { x: 100, y: 5 },
    { x: 0, y: 5 },
  ];
  const mirror: EndCorners = [
    { x: 100, y: 0 },
    { x: 0, y: 0 },
    { x: 0, y: 80 },
    { x: 100, y: 80 },
  ];
  it.each([
    ["one pixel", flat(1, 1, 90), {}, "too-small"],
    ["a black frame", flat(400, 100, 0), {}, "nothing-to-see"],
    ["a white frame", flat(400, 100, 255), {}, "nothing-to-see"],
    ["crossed corners", flat(200, 120, 90), { corners: crossed }, "corners-crossed"],
    ["corners seen in a mirror", flat(200, 120, 90), { corners: mirror }, "corners-crossed"],
    ["corners outside", flat(200, 120, 90), { corners: outside }, "corners-outside"],
    ["corners on a line", flat(200, 120, 90), { corners: tiny }, "corners-too-close"],
    ["a width without a thickness", flat(200, 120, 90), { widthMm: 100 }, "size-not-possible"],
    ["a negative width", flat(200, 120, 90), { widthMm: -1, thicknessMm: 20 }, "size-not-possible"],
  ])("%s", (_name, pixels, options, problem) => {
    const answer = readEnd(pixels, options);
    expect(answer.ok).toBe(false);
    if (!answer.ok) {
      expect(answer.problem).toBe(problem);
      expect(answer.message.length).toBeGreaterThan(20);
    }
  });

  it("data that do not fit the size are a programmer's error", () => {
    expect(() => readEnd({ width: 50, height: 50, data: new Uint8Array(10) })).toThrow(RangeError);
  });
});
