import { z } from "zod";
import { type CorrectedReading, correctMeterReading, type Meter } from "#app/core/moisture/meter.ts";
import { optionalTemperatureField, temperatureField } from "#app/domain/moisture/temperature.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { type Asked, ask, inUnits, type ShopForCalculators } from "./ask.ts";
import { numberField } from "./number-field.ts";

export type MeterBox = "meter" | "reading" | "wood" | "calibration";

export interface MeterAnswer {
  meter: Meter;
  readingPct: number;
  woodC: number | null;
  calibrationC: number;
  corrected: CorrectedReading;
  /** The corrected figure at other wood temperatures, [°C, percent]; only where temperature counts. */
  curve: [number, number][];
}

/** Corrects a reading from the page's address. The bare page is the worked example of a cold board. */
export function askMeter(params: URLSearchParams, { units }: ShopForCalculators): Asked<MeterBox, MeterAnswer> {
  const schema = z.object({
    meter: z.enum(["pin", "pinless", "oven"], "Choose the meter."),
    reading: numberField({ name: "meter's reading", least: 0, most: 200, unit: "%" }),
    wood: optionalTemperatureField(units, { name: "wood's temperature", leastC: -40, mostC: 80 }),
    calibration: temperatureField(units, { name: "meter's calibration temperature", leastC: 0, mostC: 40 }),
  });
  const start = {
    meter: "pin",
    reading: "12",
    wood: inUnits(units, "40", "5"),
    calibration: inUnits(units, "70", "21"),
  };
  return ask(params, start, schema, ({ meter, reading, wood, calibration }) => {
    const correct = (woodTemperatureC: number | null) =>
      correctMeterReading({ meter, meterPct: reading, woodTemperatureC, calibrationTemperatureC: calibration });
    const temperatures = Array.from({ length: 31 }, (_, i) => -20 + 2 * i);
    return {
      meter,
      readingPct: reading,
      woodC: wood,
      calibrationC: calibration,
      corrected: correct(wood),
      curve: meter === "pin" ? temperatures.map((at) => [at, correct(at).moisturePct]) : [],
    };
  });
}

export const meterFormula = [
  "pins: corrected = reading + 0.5 points × (calibration − wood) ÷ 10 °F (5.6 °C)",
  "colder wood reads low, warmer wood reads high; pinless meters and ovendry tests are left as read",
];

export const meterSources: Source[] = [
  { of: "0.5 points per 10 °F", text: "Wood Handbook FPL-GTR-190 (2010), chapter 13", confidence: "confirmed" },
  { of: "Pinless meters 4 to 30 %", text: "Wood Handbook (2010), chapter 13", confidence: "confirmed" },
  { of: "Pins unreliable below 6 to 7 %", text: "meter manuals", confidence: "confirmed-secondary" },
  {
    of: "Species",
    text: "James, FPL-GTR-6 (1988); Hartley and Marchant (1995): tables not seen, so none is built in; use the meter's own setting",
    confidence: "confirmed",
  },
];
