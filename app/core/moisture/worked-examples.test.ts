import { existsSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { yearPerInchRule } from "./air-drying.ts";
import { equilibriumMoistureC, equilibriumMoistureF } from "./emc.ts";
import { correctMeterReading } from "./meter.ts";
import { ovenDryMoisturePct } from "./oven-dry.ts";

interface Row {
  topic: string;
  input: string;
  expected: number;
  tolerance: number;
  confidence: string;
}

const reference = "../shared/reference/worked-examples.json";
const fromF = (fahrenheit: number) => ((fahrenheit - 32) * 5) / 9;
const pin = (meterPct: number, fahrenheit: number) =>
  correctMeterReading({
    meter: "pin",
    meterPct,
    woodTemperatureC: fromF(fahrenheit),
    calibrationTemperatureC: fromF(70),
  }).moisturePct;

const computed: Array<[pattern: RegExp, compute: (match: RegExpMatchArray) => number]> = [
  [/^(\d+) F, (\d+) % RH$/, (m) => equilibriumMoistureF(Number(m[2]), Number(m[1])).moisturePct],
  [/^(\d+) C, (\d+) % RH$/, (m) => equilibriumMoistureC(Number(m[2]), Number(m[1])).moisturePct],
  [/^oven-dry test: ([\d.]+) g wet, ([\d.]+) g oven dry$/, (m) => ovenDryMoisturePct(Number(m[1]), Number(m[2]))],
  [/^pin meter reads (\d+) %, .*wood at (\d+) F/, (m) => pin(Number(m[1]), Number(m[2]))],
  [/^air dry 8\/4 at one year per inch$/, () => yearPerInchRule(50.8)],
];

describe.skipIf(!existsSync(reference))("worked examples: emc, moisture, drying", () => {
  const all: Row[] = existsSync(reference) ? JSON.parse(readFileSync(reference, "utf8")) : [];
  const rows = all.filter(({ topic }) => ["emc", "moisture", "drying"].includes(topic));

  it.each(rows)("$topic: $input ($confidence)", ({ input, expected, tolerance }) => {
    const found = computed.map(([pattern, compute]) => ({ match: input.match(pattern), compute })).find((c) => c.match);
    expect(found, "no check is written for this row").toBeDefined();
    // The last digit printed may itself be rounded by half.
    expect(Math.abs(found!.compute(found!.match!) - expected)).toBeLessThanOrEqual(tolerance + 1e-9);
  });
});
