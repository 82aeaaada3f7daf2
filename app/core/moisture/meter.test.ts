import { describe, expect, it } from "vitest";
import { correctMeterReading } from "./meter.ts";
import { ovenDryMoisturePct } from "./oven-dry.ts";

const fromF = (fahrenheit: number) => ((fahrenheit - 32) * 5) / 9;
const pin = { meter: "pin", calibrationTemperatureC: fromF(70) } as const;

describe("a meter reading", () => {
  it("gains half a point per 10 °F of colder wood (Wood Handbook 2010 ch. 13; rows derived)", () => {
    const cold = correctMeterReading({ ...pin, meterPct: 12, woodTemperatureC: fromF(40) });
    expect(cold.moisturePct).toBeCloseTo(13.5, 6);
    expect(cold.correctionPct).toBeCloseTo(1.5, 6);
    expect(correctMeterReading({ ...pin, meterPct: 9, woodTemperatureC: fromF(90) }).moisturePct).toBeCloseTo(8, 6);
  });

  it("is left as read without a temperature, on a pinless meter and in an ovendry test", () => {
    expect(correctMeterReading({ ...pin, meterPct: 9, woodTemperatureC: null })).toMatchObject({
      moisturePct: 9,
      explanation: expect.stringContaining("temperature was not taken"),
    });
    const pinless = correctMeterReading({ meter: "pinless", meterPct: 9, woodTemperatureC: 5 });
    expect(pinless).toMatchObject({ moisturePct: 9, explanation: expect.stringContaining("specific gravity") });
    expect(correctMeterReading({ meter: "oven", meterPct: 45, woodTemperatureC: null }).outsideRange).toBeNull();
  });

  it("says that species is not corrected, since no published table could be seen", () => {
    expect(correctMeterReading({ ...pin, meterPct: 9, woodTemperatureC: 20 }).explanation).toMatch(/maker's table/);
  });

  it("says where the meter's range ends: 4-30 % pinless (confirmed), 6-7 to 30 % pin (secondary)", () => {
    const at = (meter: "pin" | "pinless", meterPct: number, woodTemperatureC = 20) =>
      correctMeterReading({ meter, meterPct, woodTemperatureC }).outsideRange;
    expect(at("pin", 31)).toMatch(/below about 30 %/);
    expect(at("pin", 6)).toMatch(/unreliable/);
    expect(at("pinless", 6)).toBeNull();
    expect(at("pinless", 3.5)).toMatch(/from about 4 %/);
    expect(at("pin", 12, -5)).toMatch(/Frozen/);
  });

  it("never falls below zero and refuses nonsense", () => {
    expect(correctMeterReading({ ...pin, meterPct: 0.5, woodTemperatureC: 60 }).moisturePct).toBe(0);
    expect(() => correctMeterReading({ ...pin, meterPct: -1, woodTemperatureC: 20 })).toThrow(
      /from 0 to 600 %; got -1/,
    );
    expect(() => correctMeterReading({ ...pin, meterPct: 9, woodTemperatureC: 300 })).toThrow(RangeError);
  });
});

describe("an ovendry test", () => {
  it("gives 8.81 % for 78.40 g wet and 72.05 g dry (worked-examples.json, derived)", () => {
    expect(ovenDryMoisturePct(78.4, 72.05)).toBeCloseTo(8.81, 2);
  });

  it("refuses a sample that gained mass in the oven", () => {
    expect(() => ovenDryMoisturePct(70, 72)).toThrow(/no less than the ovendry mass/);
    expect(() => ovenDryMoisturePct(70, 0)).toThrow(RangeError);
  });
});
