import { z } from "zod";
import { identifier } from "#app/core/identifiers/identifier.ts";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import { dayField } from "#app/domain/shop/day-field.ts";
import { optionalLengthField } from "#app/domain/shop/length-field.ts";
import type { Stretch } from "./hold.ts";

const longestDays = 365;

/** A reservation as typed: the whole board, or a length from one of its ends. */
export function holdForm(unit: LengthUnit) {
  return z
    .object({
      projectId: z.string({ error: "Choose a project." }).regex(identifier, "Choose a project."),
      part: z.enum(["whole", "near", "far"], { error: "Choose how much." }),
      lengthMm: optionalLengthField(unit, { name: "length", leastMm: 10, mostMm: 12_000 }),
      until: dayField("Say until when."),
      note: z.string().trim().max(300, "At most 300 characters.").default(""),
    })
    .refine((form) => form.part === "whole" || form.lengthMm !== null, {
      path: ["lengthMm"],
      error: "Give the length you need.",
    });
}

export type HoldForm = z.infer<ReturnType<typeof holdForm>>;

/** Where along the board the form's choice lies, from the near end. */
export function stretchOf(form: Pick<HoldForm, "part" | "lengthMm">, boardLengthMm: number): Stretch {
  if (form.part === "whole" || form.lengthMm === null) return { fromMm: 0, toMm: boardLengthMm };
  if (form.part === "near") return { fromMm: 0, toMm: form.lengthMm };
  return { fromMm: boardLengthMm - form.lengthMm, toMm: boardLengthMm };
}

/** The end of the chosen day, or why that day will not do. */
export function endOfHold(day: string, now: Date): { ok: true; at: Date } | { ok: false; why: string } {
  const at = new Date(`${day}T23:59:59.999Z`);
  if (at <= now) return { ok: false, why: "That day has passed." };
  if (at.getTime() - now.getTime() > longestDays * 86_400_000)
    return { ok: false, why: "A hold lasts a year at most; extend it later." };
  return { ok: true, at };
}
