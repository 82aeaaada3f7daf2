import { z } from "zod";
import { crayons } from "#app/components/crayon.tsx";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import { isSpeciesCode } from "#app/core/species/species.ts";
import { dayField } from "#app/domain/shop/day-field.ts";
import { lengthField } from "#app/domain/shop/length-field.ts";
import { projectStates } from "./project.ts";

/** A project as typed. An empty due date is none. */
export const projectForm = z.object({
  name: z.string({ error: "Name the project." }).trim().min(1, "Name the project.").max(120, "At most 120 characters."),
  client: z.string().trim().max(120, "At most 120 characters.").default(""),
  dueOn: dayField("When is it due?")
    .optional()
    .transform((value) => value ?? null),
  crayon: z.enum(crayons, { error: "Choose a crayon." }),
  state: z.enum(projectStates).default("planned"),
  notes: z.string().trim().max(4000, "At most 4,000 characters.").default(""),
});

export type ProjectForm = z.infer<typeof projectForm>;

const degrees = z.coerce.number({ error: "0 to 90." }).min(0, "0 to 90.").max(90, "0 to 90.");

/** A part as typed, sizes in the shop's units. */
export function partForm(unit: LengthUnit) {
  return z
    .object({
      name: z.string({ error: "Name the part." }).trim().min(1, "Name the part.").max(80, "At most 80 characters."),
      quantity: z.coerce
        .number({ error: "How many?" })
        .int("A whole number.")
        .min(1, "At least one.")
        .max(2000, "At most 2,000."),
      thicknessMm: lengthField(unit, { name: "thickness", leastMm: 1, mostMm: 400 }),
      widthMm: lengthField(unit, { name: "width", leastMm: 3, mostMm: 2_000 }),
      lengthMm: lengthField(unit, { name: "length", leastMm: 10, mostMm: 6_000 }),
      species: z.string({ error: "Choose a species." }).refine(isSpeciesCode, "Choose a species."),
      ringMinDeg: degrees.default(0),
      ringMaxDeg: degrees.default(90),
    })
    .refine((part) => part.ringMinDeg <= part.ringMaxDeg, {
      path: ["ringMaxDeg"],
      error: "The greatest angle is below the least.",
    });
}

export type PartForm = z.infer<ReturnType<typeof partForm>>;
