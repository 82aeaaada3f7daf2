import { z } from "zod";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";

/** Shops that measure in inches read thermometers in °F. Temperatures are kept in °C. */
export function temperatureUnit(units: LengthUnit): "°F" | "°C" {
  return units === "in" ? "°F" : "°C";
}

/** °C in the shop's degrees. */
export function shopDegrees(celsius: number, units: LengthUnit): number {
  return units === "in" ? (celsius * 9) / 5 + 32 : celsius;
}

/** The shop's degrees in °C. */
function celsiusFrom(degrees: number, units: LengthUnit): number {
  return units === "in" ? ((degrees - 32) * 5) / 9 : degrees;
}

/** "68 °F" or "20 °C", to the degree or its tenth. */
export function printTemperature(celsius: number, units: LengthUnit): string {
  return `${typedTemperature(celsius, units)} ${temperatureUnit(units)}`;
}

/** The figure alone, as a box holds it. */
export function typedTemperature(celsius: number, units: LengthUnit): string {
  return String(Math.round(shopDegrees(celsius, units) * 10) / 10);
}

interface TemperatureOptions {
  name: string;
  leastC: number;
  mostC: number;
}

/** A temperature in a form: typed in the shop's degrees, °C out. */
export function temperatureField(units: LengthUnit, options: TemperatureOptions) {
  return z.string().transform((typed, context) => readTemperature(typed, units, options, context) ?? z.NEVER);
}

/** The same, null when left empty. */
export function optionalTemperatureField(units: LengthUnit, options: TemperatureOptions) {
  return z
    .string()
    .default("")
    .transform((typed, context) =>
      typed.trim() === "" ? null : (readTemperature(typed, units, options, context) ?? z.NEVER),
    );
}

function readTemperature(
  typed: string,
  units: LengthUnit,
  { name, leastC, mostC }: TemperatureOptions,
  context: z.RefinementCtx,
): number | undefined {
  const text = typed.trim().replace("−", "-").replace(",", ".");
  const degrees = /^[+-]?(\d+\.?\d*|\.\d+)$/.test(text) ? Number(text) : Number.NaN;
  const celsius = celsiusFrom(degrees, units);
  const noise = 0.001;
  if (celsius >= leastC - noise && celsius <= mostC + noise) return Math.min(mostC, Math.max(leastC, celsius));
  const [least, most] = [leastC, mostC].map((limit) => Math.round(shopDegrees(limit, units)));
  context.addIssue({
    code: "custom",
    message: `Give the ${name} as a number from ${least} to ${most} ${temperatureUnit(units)}.`,
  });
  return undefined;
}
