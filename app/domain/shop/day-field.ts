import { z } from "zod";

/** A day there is: 31 February is none, though a Date would turn it into one in March. */
function isDay(day: string): boolean {
  const at = new Date(`${day}T00:00:00Z`);
  return !Number.isNaN(at.getTime()) && at.toISOString().startsWith(day) && day >= "1900";
}

/** A day in a form, as YYYY-MM-DD. */
export function dayField(missing: string) {
  return z
    .string({ error: missing })
    .regex(/^\d{4}-\d{2}-\d{2}$/, "Write the date as year-month-day.")
    .refine(isDay, "There is no such day.");
}
