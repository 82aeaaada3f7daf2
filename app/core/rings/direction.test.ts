import { describe, expect, test } from "vitest";
import { ringDirection } from "./direction.ts";
import type { RingField } from "./ring-types.ts";
import { fieldFromPith } from "./stations.ts";

const size = { widthMm: 180, thicknessMm: 30 };
const turnedBy = (field: RingField, deg: number): RingField => ({
  ...field,
  stations: field.stations.map((station) => ({ ...station, signedDeg: station.signedDeg + deg })),
});

describe("direction of the rings at a point", () => {
  test("round a pith is that of circles, where the stations say nothing else", () => {
    const direction = ringDirection(fieldFromPith(size, { xMm: 90, yMm: 130 }));
    expect(direction({ xMm: 90, yMm: 10 })).toBeCloseTo(0, 9);
    expect(direction({ xMm: 120, yMm: 10 })).toBeCloseTo((Math.atan(30 / 120) * 180) / Math.PI, 9);
  });

  test("follows stations that stray from the circles", () => {
    const round = fieldFromPith(size, { xMm: 90, yMm: 130 });
    const direction = ringDirection(turnedBy(round, 5));
    // A slice whose own rings turn by ten degrees is followed a little less than wholly.
    expect(Math.abs(direction({ xMm: 90, yMm: 10 }) - 5)).toBeLessThan(0.1);
  });

  test("without a pith runs straight from station to station, through upright without a jump", () => {
    const station = (position: number, signedDeg: number) => ({
      position,
      signedDeg,
      angleDeg: Math.abs(signedDeg),
      confidence: 1,
    });
    const direction = ringDirection({
      ...size,
      pith: null,
      ringsPerInch: null,
      stations: [station(0.25, 80), station(0.75, -80)],
    });
    expect(direction({ xMm: 45, yMm: 3 })).toBeCloseTo(80, 9);
    expect(Math.abs(direction({ xMm: 90, yMm: 3 }))).toBeCloseTo(90, 9);
    expect(direction({ xMm: 112.5, yMm: 3 })).toBeCloseTo(-85, 9);
    expect(direction({ xMm: 180, yMm: 3 })).toBeCloseTo(-80, 9);
  });

  test("stations without confidence are passed over", () => {
    const round = turnedBy(fieldFromPith(size, { xMm: 90, yMm: 130 }), 20);
    const unsure = { ...round, stations: round.stations.map((station) => ({ ...station, confidence: 0 })) };
    expect(ringDirection(unsure)({ xMm: 90, yMm: 10 })).toBeCloseTo(0, 9);
  });

  test("an end that nobody has read has none", () => {
    expect(() => ringDirection({ ...size, stations: [], pith: null, ringsPerInch: null })).toThrow(/not been read/);
  });
});
