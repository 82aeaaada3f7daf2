import { printQuarters } from "#app/core/lengths/quarters.ts";

/** Thicknesses in quarters that yards sell: under an inch, then up to four. */
const sold = [2, 3, 4, 5, 6, 7, 8, 10, 12, 14, 16];

/** Is this one of the thicknesses that the select offers? */
export function isSoldQuarters(quarters: number): boolean {
  return sold.includes(quarters);
}

/** The choice of quarters for a select. */
export function QuartersOptions() {
  return sold.map((quarters) => (
    <option key={quarters} value={quarters}>
      {printQuarters(quarters)}
    </option>
  ));
}
