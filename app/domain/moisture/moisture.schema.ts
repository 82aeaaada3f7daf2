import { z } from "zod";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import { optionalTemperatureField } from "./temperature.ts";

/** A meter reading as typed, the wood's temperature in the shop's degrees. It matters for pin meters. */
export function moistureForm(units: LengthUnit) {
  return z.object({
    meterPct: z.coerce
      .number({ error: "Give the meter's reading in percent." })
      .min(0, "Moisture is 0 or more.")
      .max(200, "Above 200 % is not wood: check the figure."),
    meter: z.enum(["pin", "pinless", "oven"], { error: "Choose the meter." }),
    woodTemperatureC: optionalTemperatureField(units, { name: "wood's temperature", leastC: -30, mostC: 80 }),
    place: z.string().trim().max(80, "At most 80 characters.").default(""),
  });
}

export type MoistureForm = z.infer<ReturnType<typeof moistureForm>>;
