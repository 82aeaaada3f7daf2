import { type CorrectedReading, correctMeterReading } from "#app/core/moisture/meter.ts";
import type { MoistureForm } from "./moisture.schema.ts";

/** The most that a record holds, percent. */
const mostPct = 200;

/**
 * A reading as it is kept: corrected for the wood's temperature, to a tenth of a point, beside what the meter showed. The meter
 * is taken to be calibrated for 70 °F (21.1 °C), as most are.
 */
export function correctedReading(
  reading: Pick<MoistureForm, "meterPct" | "meter" | "woodTemperatureC">,
): CorrectedReading {
  const corrected = correctMeterReading(reading);
  const moisturePct = Math.min(mostPct, Math.round(corrected.moisturePct * 10) / 10);
  return { ...corrected, moisturePct, correctionPct: moisturePct - reading.meterPct };
}
