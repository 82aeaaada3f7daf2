import data from "./species.json";

/**
 * How well a value is known. "confirmed": seen in the source itself. "confirmed-secondary": seen in another publication
 * that quotes it. "recomputed": recalled, and follows from a confirmed value. "memory-consistent": recalled, and agrees
 * with another recalled value. "memory": recalled, not seen.
 */
export type Confidence = "confirmed" | "confirmed-secondary" | "recomputed" | "memory-consistent" | "memory";

/** Where a value came from (a key of the source list, see `sourceName`) and how well it is known. */
export interface Provenance {
  source: string;
  confidence: Confidence;
}

/** One species as the product ships it. A value that was not printed or is not known is null, never a guess. */
export interface Species {
  /** Stable slug kept in the database, e.g. "white-oak". */
  code: string;
  /** "White oak". */
  commonName: string;
  /** As an index lists it: "Oak, white". Lists sort by this. */
  indexName: string;
  otherNames: string[];
  botanicalName: string;
  /** Suggested two-letter beginning of a board's tag; no two species share one. */
  tagPrefix: string;
  group: "hardwood" | "softwood" | "import";
  /** "none" for a conifer, which has no pores. */
  porosity: "ring-porous" | "semi-ring-porous" | "diffuse-porous" | "none";
  /** True where a quartered face shows bold decorative fleck. */
  rayFleck: boolean;
  /** Colours of the end drawing, "#RRGGBB": our own choice, not a published value. */
  tints: { base: string; latewood: string; ray: string };
  /** Ovendry mass over green volume (basic), and over volume at 12 % moisture. Trap: they are different columns. */
  specificGravity: ({ basic: number | null; at12: number | null } & Provenance) | null;
  /** Green to ovendry, percent of the green size; `startsAtPct` is the moisture at which shrinkage begins. */
  shrinkage: ({ radialPct: number; tangentialPct: number; startsAtPct: number } & Provenance) | null;
  /** Green to ovendry, percent of the green volume. */
  volumetricShrinkage: ({ pct: number } & Provenance) | null;
  /** Change of size per 1 % of moisture, 6-14 %. "group": the table prints one pair for several species. */
  coefficients: ({ radial: number | null; tangential: number | null; covers: "species" | "group" } & Provenance) | null;
  /** Side hardness in pounds-force. */
  hardness: ({ jankaLbf: number; atMoisturePct: number } & Provenance) | null;
  dust: ({ words: string; strongSensitiser: boolean } & Provenance) | null;
  /** Trade control (CITES): the appendix it is listed in, or "check" where listing depends on species or date. */
  trade: ({ appendix: "I" | "II" | "check"; words: string } & Provenance) | null;
  confidence: { botanicalName: Confidence; porosity: Confidence; rayFleck: Confidence };
  notes: string | null;
}

const shipped = (data.species as Species[]).toSorted((a, b) => a.indexName.localeCompare(b.indexName, "en"));
const byCode = new Map(shipped.map((species) => [species.code, species]));

/** The species with this code, or null. */
export function speciesByCode(code: string): Species | null {
  return byCode.get(code) ?? null;
}

/** Every shipped species, sorted by index name ("Oak, white"). */
export function allSpecies(): readonly Species[] {
  return shipped;
}

/** True where `code` names a shipped species. */
export function isSpeciesCode(code: string): boolean {
  return byCode.has(code);
}

/** The publication behind a value's `source` key, to be named on the page; the key itself where it is unknown. */
export function sourceName(source: string): string {
  return (data.sources as Record<string, string>)[source] ?? source;
}
