import type { LengthUnit } from "#app/core/lengths/parse-length.ts";

/** Exact by definition since 1959. */
const kgPerPound = 0.45359237;

/** Shops that measure in inches weigh in pounds. Masses are kept in kg. */
export function massUnit(units: LengthUnit): "lb" | "kg" {
  return units === "in" ? "lb" : "kg";
}

/** A figure in the shop's unit of mass as kg. */
export function kgFrom(mass: number, units: LengthUnit): number {
  return units === "in" ? mass * kgPerPound : mass;
}

/** kg as a figure in the shop's unit of mass. */
export function shopMass(massKg: number, units: LengthUnit): number {
  return units === "in" ? massKg / kgPerPound : massKg;
}

/** "28.2 lb", "12.8 kg"; from 100 up without tenths. */
export function printMass(massKg: number, units: LengthUnit): string {
  const mass = shopMass(massKg, units);
  return `${mass < 99.95 ? mass.toFixed(1) : Math.round(mass)} ${massUnit(units)}`;
}
