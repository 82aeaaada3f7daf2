import { expect, test } from "vitest";
import { correctedReading } from "./corrected-reading.ts";
import { moistureForm } from "./moisture.schema.ts";

test("an inch shop's pin reading of 12 % in wood at 40 °F is kept as 13.5 % (Wood Handbook 2010 ch. 13)", () => {
  const typed = moistureForm("in").parse({ meterPct: "12", meter: "pin", woodTemperatureC: "40" });
  expect(typed.woodTemperatureC).toBeCloseTo(4.44, 2);
  const kept = correctedReading(typed);
  expect(kept.moisturePct).toBe(13.5);
  expect(kept.explanation).toMatch(/0\.5 points per 10 °F/);
});

test("without a temperature the reading is kept as read", () => {
  const typed = moistureForm("mm").parse({ meterPct: "12", meter: "pin" });
  expect(correctedReading(typed)).toMatchObject({ moisturePct: 12, correctionPct: 0 });
});

test("no correction carries a reading past what a record holds", () => {
  expect(correctedReading({ meterPct: 200, meter: "pin", woodTemperatureC: -30 }).moisturePct).toBe(200);
  expect(correctedReading({ meterPct: 0.5, meter: "pin", woodTemperatureC: 80 }).moisturePct).toBe(0);
});

test("a temperature that no wood in a shop has is refused in the shop's degrees", () => {
  const refused = moistureForm("in").safeParse({ meterPct: "12", meter: "pin", woodTemperatureC: "500" });
  expect(refused.error?.issues[0]?.message).toMatch(/-22 to 176 °F/);
});
