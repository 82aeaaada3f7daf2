import { z } from "zod";
import { labelSheets } from "#app/core/labels/label-sheets.ts";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import { lengthField } from "./length-field.ts";

const number = (name: string, low: number, high: number) =>
  z.coerce
    .number({ error: `Give the ${name}.` })
    .min(low, `${low} to ${high}.`)
    .max(high, `${low} to ${high}.`);

/** A shop's settings as typed, sizes in the units it has now. */
export function shopForm(unit: LengthUnit) {
  const size = (name: string, leastMm: number, mostMm: number) => lengthField(unit, { name, leastMm, mostMm });
  return z
    .object({
      name: z.string({ error: "Name the shop." }).trim().min(1, "Name the shop.").max(120, "At most 120 characters."),
      units: z.enum(["in", "mm"]),
      currency: z
        .string()
        .trim()
        .toUpperCase()
        .refine((code) => Intl.supportedValuesOf("currency").includes(code), "Three letters, such as USD or EUR."),
      targetTemperatureC: number("temperature", -5, 45),
      targetHumidityPct: number("humidity", 5, 95),
      kerfMm: size("kerf", 0, 15),
      endTrimMm: size("end trim", 0, 500),
      allowanceLengthMm: size("length allowance", 0, 500),
      allowanceWidthMm: size("width allowance", 0, 100),
      allowanceThicknessMm: size("thickness allowance", 0, 50),
      jointPerFaceMm: size("jointing", 0, 20),
      offcutMinLengthMm: size("least length of an offcut", 0, 5_000),
      offcutMinWidthMm: size("least width of an offcut", 0, 1_000),
      holdDays: number("number of days", 1, 365).int("Whole days."),
      sawMaxHeightMm: size("saw's height", 10, 600),
      jointerMaxWidthMm: size("jointer's width", 50, 1_000),
      jointerMinLengthMm: size("shortest piece on the jointer", 50, 1_500),
      planerMaxWidthMm: size("planer's width", 50, 1_500),
      planerMinLengthMm: size("shortest piece through the planer", 50, 1_500),
      clamps: number("number of clamps", 0, 1_000).int("A whole number."),
      flatBelowDeg: number("limit of flat", 1, 89),
      quarteredAboveDeg: number("limit of quartered", 1, 89),
      labelSheet: z.enum(labelSheets.map((sheet) => sheet.code) as [string, ...string[]]),
    })
    .refine((form) => form.flatBelowDeg <= form.quarteredAboveDeg, {
      path: ["quarteredAboveDeg"],
      error: "Quartered begins where flat has ended, or above.",
    });
}

export type ShopForm = z.infer<ReturnType<typeof shopForm>>;
