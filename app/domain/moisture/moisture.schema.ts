import { z } from "zod";

/** A meter reading as typed. Wood temperature matters for pin meters. */
export const moistureForm = z.object({
  meterPct: z.coerce
    .number({ error: "Give the meter's reading in percent." })
    .min(0, "Moisture is 0 or more.")
    .max(200, "Above 200 % is not wood: check the figure."),
  meter: z.enum(["pin", "pinless", "oven"], { error: "Choose the meter." }),
  woodTemperatureC: z.coerce.number().min(-30, "-30 to 80 °C.").max(80, "-30 to 80 °C.").nullable().default(null),
  place: z.string().trim().max(80, "At most 80 characters.").default(""),
});

export type MoistureForm = z.infer<typeof moistureForm>;
