import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { ringPath, ringPaths } from "./end-drawing.ts";
import { fieldFromAngle } from "./field-from-angle.ts";
import type { RingField } from "./ring-types.ts";
import { fieldFromPith } from "./stations.ts";

const size = { widthMm: 210, thicknessMm: 27 };
const arched = fieldFromAngle(size, 0, "right", 9);
const boards: Record<string, RingField> = {
  flat: fieldFromPith(size, { xMm: 95, yMm: 150 }, 9),
  rift: fieldFromPith(size, { xMm: -90, yMm: 170 }, 11),
  quartered: fieldFromPith(size, { xMm: -220, yMm: 20 }, 12),
  "pith-inside": fieldFromPith({ widthMm: 200, thicknessMm: 52 }, { xMm: 92, yMm: 22 }, 8),
  "no-pith": {
    ...arched,
    stations: arched.stations.map((station, i) => ({
      ...station,
      signedDeg: (i - 3) * 8,
      angleDeg: Math.abs(i - 3) * 8,
    })),
  },
};

/** The drawing at three sizes: as the head of a page, on a tag, and 20 pixels high in a list. */
function sheet(field: RingField): string {
  let y = 8;
  const drawings = [110, 44, 20].map((height) => {
    const scale = height / field.thicknessMm;
    const width = Math.round(field.widthMm * scale);
    const line = Math.max(1.1, Math.min(2.4, height / 26));
    const d = ringPath(field, { widthPx: width, heightPx: height, minSpacingPx: line * 2.9, seed: 7 });
    const drawing = [
      `<svg x="8" y="${y}" width="${width}" height="${height}" overflow="hidden">`,
      `<rect width="${width}" height="${height}" fill="#d8b583"/>`,
      `<path d="${d}" fill="none" stroke="#a8733d" stroke-width="${line.toFixed(2)}"/></svg>`,
    ].join("\n");
    y += height + 8;
    return drawing;
  });
  return `<svg xmlns="http://www.w3.org/2000/svg" width="880" height="${y}">\n${drawings.join("\n")}\n</svg>\n`;
}

test.each(Object.entries(boards))("a %s board is drawn as its picture shows", async (name, field) => {
  await expect(sheet(field)).toMatchFileSnapshot(`__snapshots__/${name}.snap.svg`);
});

interface Point {
  x: number;
  y: number;
}

/** Ends of all pieces of a path, and the radii of its arcs; a small reader of the commands that are written. */
function read(d: string): { points: Point[]; radii: number[] } {
  const points: Point[] = [];
  const radii: number[] = [];
  const at = { x: 0, y: 0 };
  for (const [, command, rest] of d.matchAll(/([a-zA-Z])([^a-zA-Z]*)/g)) {
    const n = (rest!.match(/-?(\d+\.?\d*|\.\d+)/g) ?? []).map(Number);
    const [dx, dy] = command === "h" ? [n[0]!, 0] : command === "v" ? [0, n[0]!] : [n.at(-2)!, n.at(-1)!];
    if (command === "a") radii.push(n[0]!);
    at.x = command === "M" ? dx : at.x + dx;
    at.y = command === "M" ? dy : at.y + dy;
    points.push({ ...at });
  }
  return { points, radii };
}

const drawn = { widthPx: 420, heightPx: 54, minSpacingPx: 3 };

describe("rings round a pith", () => {
  test("lie on circles round it at whole multiples of the recorded spacing", () => {
    const field = boards.flat!;
    const ringPx = (25.4 / 9) * 2;
    for (const { x, y } of read(ringPath(field, drawn)).points) {
      const rings = Math.hypot(x - 190, y - 300) / ringPx;
      expect(Math.abs(rings - Math.round(rings))).toBeLessThan(0.04);
    }
  });

  test("that stand too close for the size are thinned by whole rings", () => {
    const small = { widthPx: (210 * 20) / 27, heightPx: 20, minSpacingPx: 4 };
    const ringPx = (25.4 / 12) * (20 / 27);
    const radii = read(ringPath(boards.quartered!, small)).points.map(({ x, y }) =>
      Math.hypot(x + 220 * (20 / 27), y - 20 * (20 / 27)),
    );
    for (const radius of radii) {
      const threes = radius / (3 * ringPx);
      expect(Math.abs(threes - Math.round(threes))).toBeLessThan(0.04);
    }
  });

  test("inside the board close as full circles", () => {
    const { radii } = read(ringPath(boards["pith-inside"]!, { widthPx: 400, heightPx: 104, minSpacingPx: 3 }));
    expect(radii.length).toBeGreaterThan(10);
    expect(Math.abs(radii[0]! - (25.4 / 8) * 2)).toBeLessThan(0.06);
  });

  test("a flat-sawn board 20 pixels high still has arches, and more than four of them", () => {
    const paths = ringPaths(boards.flat!, { widthPx: 156, heightPx: 20, minSpacingPx: 3.2 });
    expect(paths.filter((d) => /[qa]/.test(d)).length).toBeGreaterThan(4);
  });
});

describe("rings without a pith", () => {
  test("at one angle are straight lines at that angle, at the recorded spacing", () => {
    const d = ringPath(fieldFromAngle(size, 30, "right", 10), drawn);
    expect(d).not.toMatch(/[qa]/);
    const offsets = new Set<number>();
    for (const { x, y } of read(d).points) {
      const offset = ((y - 27) * Math.cos(Math.PI / 6) - (x - 210) * Math.sin(Math.PI / 6)) / 5.08;
      expect(Math.abs(offset - Math.round(offset))).toBeLessThan(0.05);
      offsets.add(Math.round(offset));
    }
    expect(offsets.size).toBeGreaterThan(40);
  });

  test.each([0, 90])("lie along the edges at %d degrees", (angle) => {
    expect(ringPath(fieldFromAngle(size, angle, "left", 10), drawn)).toMatch(
      angle === 0 ? /^[Mm][^qlav]*$/ : /^[Mm][^qlah]*$/,
    );
  });

  test("that turn are drawn curved", () => {
    expect(ringPath(boards["no-pith"]!, drawn)).toMatch(/q/);
  });
});

describe("any drawing", () => {
  const fields = fc
    .record({
      xMm: fc.double({ min: -2000, max: 2000, noNaN: true }),
      yMm: fc.double({ min: -2000, max: 2000, noNaN: true }),
      rings: fc.option(fc.double({ min: 1, max: 60, noNaN: true })),
      known: fc.boolean(),
    })
    .map(({ xMm, yMm, rings, known }) => {
      const field = fieldFromPith(size, { xMm, yMm }, rings);
      return known ? field : { ...field, pith: null };
    });

  test("keeps to the rectangle and a spacing's half beyond, in numbers a browser reads", () => {
    fc.assert(
      fc.property(fields, (field) => {
        const d = ringPath(field, { ...drawn, seed: 3 });
        expect(d).toMatch(/^([Mmlhvqa][-0-9. ]+)*$/);
        for (const { x, y } of read(d).points) {
          expect(x).toBeGreaterThanOrEqual(-1.6);
          expect(x).toBeLessThanOrEqual(421.6);
          expect(y).toBeGreaterThanOrEqual(-1.6);
          expect(y).toBeLessThanOrEqual(55.6);
        }
      }),
    );
  });

  test("in a list takes about a kilobyte at most at 20 pixels high", () => {
    fc.assert(
      fc.property(fields, (field) => {
        expect(ringPath(field, { widthPx: 156, heightPx: 20, minSpacingPx: 3.2 }).length).toBeLessThan(1200);
      }),
    );
  });

  test("is the same each time; a seed makes it uneven, always alike", () => {
    const field = boards.rift!;
    expect(ringPath(field, drawn)).toBe(ringPath(field, drawn));
    expect(ringPath(field, { ...drawn, seed: 1 })).toBe(ringPath(field, { ...drawn, seed: 1 }));
    expect(ringPath(field, { ...drawn, seed: 1 })).not.toBe(ringPath(field, drawn));
    expect(ringPath(field, { ...drawn, seed: 1 })).not.toBe(ringPath(field, { ...drawn, seed: 2 }));
  });

  test("drawn in millimetres keeps more places than one drawn in pixels", () => {
    expect(ringPath(boards.rift!, { widthPx: 70, heightPx: 9, minSpacingPx: 0.55 })).toMatch(/\.\d\d/);
    expect(ringPath(boards.rift!, drawn)).not.toMatch(/\.\d\d/);
  });

  test("ring by ring has one path each", () => {
    const paths = ringPaths(fieldFromAngle(size, 0, "right", 10), drawn);
    expect(paths.length).toBe(read(paths.join("")).points.length / 2);
  });

  test("of an end nobody has read is refused: grain is never invented", () => {
    expect(() => ringPath({ ...size, stations: [], pith: null, ringsPerInch: 10 }, drawn)).toThrow(/not been read/);
  });
});
