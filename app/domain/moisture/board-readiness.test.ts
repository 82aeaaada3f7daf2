import { expect, test } from "vitest";
import { boardReadiness } from "./board-readiness.ts";
import type { MoistureReading } from "./moisture.sql.server.ts";
import { placeFor, placeNames, readPlace } from "./places.ts";
import { readyWords } from "./ready-words.ts";

const shop = { targetHumidityPct: 40, targetTemperatureC: 20 };
const day = (n: number) => new Date(Date.UTC(2026, 5, 1 + n, 9));

function readings(pcts: number[], everyDays = 14): MoistureReading[] {
  return pcts.map((moisturePct, i) => ({
    id: String(i),
    moisturePct,
    meterPct: moisturePct,
    meter: "pin",
    woodTemperatureC: null,
    place: "",
    readBy: "Ada",
    readAt: day(i * everyDays),
  }));
}

test("a board never metered has no readiness to show", () => {
  expect(boardReadiness([], shop, placeFor("this-shop", shop), day(0))).toBeNull();
});

test("one reading tells where it stands and no more", () => {
  const found = boardReadiness(readings([13]), shop, placeFor("this-shop", shop), day(3))!;
  expect(found.view.ahead).toEqual([]);
  expect(readyWords(found.view).headline).toBe("Too wet now; the day is not yet known");
  expect(found.today).toBeCloseTo(3, 6);
});

test("readings that come down on 7.7 % are ready for the shop, and too wet or ready elsewhere by that place's own target", () => {
  const dry = readings([9.4, 8.6, 8.1, 7.9, 7.8, 7.7]);
  const here = boardReadiness(dry, shop, placeFor("this-shop", shop), day(80))!;
  expect(readyWords(here.view)).toMatchObject({ headline: "Ready", detail: "It stays within the target in this air." });
  const coast = boardReadiness(dry, shop, placeFor("damp-coast", shop), day(80))!;
  expect(readyWords(coast.view).headline).not.toBe("Ready");
});

test("a newest reading below what pins can tell says so", () => {
  expect(boardReadiness(readings([5]), shop, placeFor("this-shop", shop), day(1))?.newestOutside).toMatch(/6 to 7 %/);
});

test("soaking wet boards have a page too", () => {
  const found = boardReadiness(readings([80, 65]), shop, placeFor("this-shop", shop), day(20))!;
  expect(found.view.readings).toEqual([]);
  expect(found.today).toBeNull();
  expect(readyWords(found.view).headline).toMatch(/Too wet/);
});

test("each place's seasons lie either side of its target, and the shop's extremes of air are places too", () => {
  for (const name of placeNames)
    for (const humidity of [5, 40, 95]) {
      const place = placeFor(name, { targetHumidityPct: humidity, targetTemperatureC: 20 });
      expect(place.driestPct).toBeLessThanOrEqual(place.target.targetPct);
      expect(place.dampestPct).toBeGreaterThanOrEqual(place.target.targetPct);
    }
});

test("interior averages 8 % with pieces from 6 to 10 in most of the United States (Wood Handbook Table 13-2, from memory)", () => {
  const place = placeFor("most-of-us", shop);
  expect([place.driestPct, place.target.targetPct, place.dampestPct]).toEqual([6, 8, 10]);
});

test("an address that names no place means the shop", () => {
  expect(readPlace("atlantis")).toBe("this-shop");
  expect(readPlace(null)).toBe("this-shop");
  expect(readPlace("damp-coast")).toBe("damp-coast");
});
