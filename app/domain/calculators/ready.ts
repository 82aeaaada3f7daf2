import { z } from "zod";
import type { DryingReading } from "#app/core/moisture/drying-readings.ts";
import { equilibriumMoistureC } from "#app/core/moisture/emc.ts";
import { placeFor, placeNames } from "#app/domain/moisture/places.ts";
import { type ReadyView, readyView } from "#app/domain/moisture/ready.ts";
import { temperatureField, typedTemperature } from "#app/domain/moisture/temperature.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { type Asked, ask, type ShopForCalculators } from "./ask.ts";
import { numberField } from "./number-field.ts";

export type ReadyBox = "readings" | "temperature" | "humidity" | "place";

export interface ReadyAnswer {
  view: ReadyView;
  targetWords: string;
  targetSource: string;
  targetPct: number;
  tolerancePct: number;
  outsideRange: string | null;
}

const mostReadings = 200;

/** Readings as lines: a date or a day's number, then percent. The first line that cannot be read is named. */
const readingsField = z.string().transform((typed, context) => {
  const lines = typed.split(/\r\n|\r|\n/).map((text, index) => ({ text: text.trim(), number: index + 1 }));
  const written = lines.filter(({ text }) => text !== "");
  const refuse = (message: string) => {
    context.addIssue({ code: "custom", message });
    return z.NEVER;
  };
  if (written.length === 0) return refuse("Give at least one reading: a date and what the meter said.");
  if (written.length > mostReadings) return refuse(`At most ${mostReadings} readings.`);
  const readings: DryingReading[] = [];
  for (const { text, number } of written) {
    const reading = readLine(text);
    if (!reading)
      return refuse(`Line ${number}: write a date and percent, as 2026-11-03 12.5, or a day's number, as 14 12.5.`);
    if (reading.moisturePct > 200) return refuse(`Line ${number}: above 200 % is not wood.`);
    readings.push(reading);
  }
  if (new Set(readings.map(({ at }) => at instanceof Date)).size > 1)
    return refuse("Write either dates or day numbers on every line, not both.");
  return readings;
});

function readLine(text: string): DryingReading | null {
  const match = /^(\d{4}-\d{2}-\d{2}|\d{1,5}(?:\.\d+)?)[\s,;]+(\d{1,3}(?:[.,]\d+)?) ?%?$/.exec(text);
  const [, when = "", percent = ""] = match ?? [];
  if (!match) return null;
  const moisturePct = Number(percent.replace(",", "."));
  if (!when.includes("-")) return { at: Number(when), moisturePct };
  const at = new Date(`${when}T12:00:00Z`);
  return Number.isNaN(at.getTime()) || at.toISOString().slice(0, 10) !== when ? null : { at, moisturePct };
}

/** Forecasts from typed readings, all of it from the page's address. */
export function askReady(params: URLSearchParams, shop: ShopForCalculators): Asked<ReadyBox, ReadyAnswer> {
  const schema = z.object({
    readings: readingsField,
    temperature: temperatureField(shop.units, { name: "temperature", leastC: -30, mostC: 60 }),
    humidity: numberField({ name: "relative humidity", least: 5, most: 95, unit: "%" }),
    place: z.enum(placeNames, "Choose where the piece will live."),
  });
  const start = {
    readings: "0 14.2\n7 12.8\n14 11.6\n21 10.7\n28 10.1",
    temperature: typedTemperature(shop.targetTemperatureC, shop.units),
    humidity: String(shop.targetHumidityPct),
    place: "this-shop",
  };
  return ask(params, start, schema, ({ readings, temperature, humidity, place }) => {
    const air = equilibriumMoistureC(humidity, temperature);
    const { target, targetSource } = placeFor(place, { targetHumidityPct: humidity, targetTemperatureC: temperature });
    const { targetPct, tolerancePct } = target;
    return {
      view: readyView({ readings, emcPct: air.moisturePct, targetPct, tolerancePct }),
      targetWords: place === "this-shop" ? "this air" : target.words,
      targetSource,
      targetPct,
      tolerancePct,
      outsideRange: air.outsideRange ?? target.outsideRange,
    };
  });
}

export const readyFormula = [
  "M(t) = E + (M₀ − E) × exp(−k t): E what the air holds wood at, k fitted to the readings",
  "with five readings or more a stray one loses its weight; the range holds 9 of 10 curves that the readings leave possible, E uncertain by half a point",
  "ready = more likely than not within target ± tolerance",
];

export const readySources: Source[] = [
  {
    of: "Approach to equilibrium",
    text: "our own model, a first-order approach as is common in drying work",
    confidence: "derived",
  },
  { of: "E from the air", text: "Wood Handbook FPL-GTR-282 (2021), Eq. 4-5", confidence: "confirmed" },
  {
    of: "Interior targets by region",
    text: "Wood Handbook, chapter 13, Fig. 13-1 and Table 13-2",
    confidence: "confirmed-secondary",
  },
  { of: "A shop's tolerance of 1 point", text: "makers", confidence: "practice" },
  { of: "Meters good to 1 to 2 points", text: "Wengert and Bois 1997, as quoted", confidence: "confirmed-secondary" },
];
