import type { z } from "zod";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import type { ShopSettings } from "#app/domain/shop/shop.ts";

/** What a calculator knows of the shop: its units, limits and equipment, which its boxes start from. */
export type ShopForCalculators = ShopSettings;

/** What was typed into a calculator, what is wrong with it, and what it comes to. All of it in the address. */
export interface Asked<Name extends string, Answer> {
  values: Record<Name, string>;
  errors: Partial<Record<Name, string[]>>;
  /** Null where something typed will not do. */
  answer: Answer | null;
  /** Why the figures together have no answer, though each alone is fine. */
  refused: string | null;
}

/** The most that any box takes; longer text is cut, and then refused for what it says. */
const mostCharacters = 4000;

/**
 * Reads a calculator's boxes from its address and works out the answer. A box that the address does not name starts from
 * `start`, so that the bare page shows a worked answer; a box left empty stays empty. What the formulas refuse
 * (a RangeError) becomes `refused`; any other failure is a bug and goes on.
 */
export function ask<Name extends string, Inputs, Answer>(
  params: URLSearchParams,
  start: Record<Name, string>,
  schema: z.ZodType<Inputs>,
  workOut: (inputs: Inputs) => Answer,
): Asked<Name, Answer> {
  const names = Object.keys(start) as Name[];
  const values = Object.fromEntries(
    names.map((name) => [name, (params.get(name) ?? start[name]).slice(0, mostCharacters)]),
  ) as Record<Name, string>;
  const read = schema.safeParse(values);
  if (!read.success) return { values, errors: errorsByName(read.error, names), answer: null, refused: null };
  try {
    return { values, errors: {}, answer: workOut(read.data), refused: null };
  } catch (failure) {
    if (failure instanceof RangeError) return { values, errors: {}, answer: null, refused: failure.message };
    throw failure;
  }
}

function errorsByName<Name extends string>(error: z.ZodError, names: readonly Name[]): Partial<Record<Name, string[]>> {
  const errors: Partial<Record<Name, string[]>> = {};
  for (const { path, message } of error.issues) {
    const name = names.find((known) => known === path[0]);
    if (name) errors[name] = [...(errors[name] ?? []), message];
  }
  return errors;
}

/** The boxes' first figures, written in the shop's units. */
export function inUnits<T>(units: LengthUnit, inches: T, millimetres: T): T {
  return units === "in" ? inches : millimetres;
}
