import { speciesByCode } from "#app/core/species/species.ts";

export interface Tints {
  base: string;
  latewood: string;
  ray: string;
}

/** Wood of no particular kind, for a species the product does not know. */
const plain: Tints = { base: "#d9c29a", latewood: "#a88a55", ray: "#efe2c4" };

/** The colours a species is drawn in. */
export function speciesTints(code: string): Tints {
  return speciesByCode(code)?.tints ?? plain;
}

/** The species' name, or its code when it is not known. */
export function speciesName(code: string): string {
  return speciesByCode(code)?.commonName ?? code;
}
