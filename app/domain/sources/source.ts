import type { Confidence } from "#app/core/species/species.ts";

/** How well a formula or figure is known; beyond a species' values also what follows by arithmetic, and custom. */
export type SourceConfidence = Confidence | "derived" | "practice";

/** Where a formula or figure comes from. */
export interface Source {
  /** What it is the source of: "Equilibrium moisture". */
  of: string;
  /** The publication, or "common practice". */
  text: string;
  confidence: SourceConfidence;
}

const words: Record<SourceConfidence, string> = {
  confirmed: "seen in the source",
  "confirmed-secondary": "seen as another publication quotes it",
  recomputed: "recalled, and it follows from a figure that was seen",
  "memory-consistent": "from memory, and it agrees with another figure from memory",
  memory: "from memory: check it",
  derived: "our own arithmetic from the rule named",
  practice: "common practice, no source",
};

/** How well it is known, in words. */
export function confidenceWords(confidence: SourceConfidence): string {
  return words[confidence];
}
