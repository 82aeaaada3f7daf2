import { mmPerInch } from "./parse-length.ts";

/** 4 is written 4/4: an inch, rough. */
export function printQuarters(quarters: number): string {
  return `${quarters}/4`;
}

/** Rough nominal thickness of stock sold in quarters of an inch. */
export function nominalThicknessMm(quarters: number): number {
  return (quarters / 4) * mmPerInch;
}
