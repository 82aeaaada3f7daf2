import type { Confidence } from "#app/core/species/species.ts";
import { requireMoisture, requireWithin } from "./accepted-range.ts";
import { equilibriumMoistureC } from "./emc.ts";

export type Region = "most-of-us" | "dry-southwest" | "damp-coast";

/** What wood should hold when installed, percent; averages and the spread of single pieces. */
export interface RegionTarget {
  region: Region;
  name: string;
  interior: { averagePct: number; lowPct: number; highPct: number };
  exterior: { averagePct: number; lowPct: number; highPct: number };
  /** Averages were seen in a second publication; the spread of pieces is from memory except for the Southwest. */
  confidence: { averages: Confidence; pieces: Confidence };
  source: string;
}

const source = "Wood Handbook, chapter 13, Fig. 13-1 and Table 13-2";
const range = (averagePct: number, lowPct: number, highPct: number) => ({ averagePct, lowPct, highPct });

/** Moisture for wood going indoors or out, by United States region. */
export const regionTargets: readonly RegionTarget[] = [
  {
    region: "most-of-us",
    name: "Most of the United States",
    interior: range(8, 6, 10),
    exterior: range(12, 9, 14),
    confidence: { averages: "confirmed-secondary", pieces: "memory" },
    source,
  },
  {
    region: "dry-southwest",
    name: "Dry Southwest",
    interior: range(6, 4, 9),
    exterior: range(9, 7, 12),
    confidence: { averages: "confirmed-secondary", pieces: "confirmed-secondary" },
    source,
  },
  {
    region: "damp-coast",
    name: "Damp warm coast",
    interior: range(11, 8, 13),
    exterior: range(12, 9, 14),
    confidence: { averages: "confirmed-secondary", pieces: "memory" },
    source,
  },
];

/** A moisture to aim at and how far from it still counts as ready. */
export interface MoistureTarget {
  targetPct: number;
  tolerancePct: number;
  words: string;
  outsideRange: string | null;
}

/** The target of a shop that keeps `humidityPct` at `temperatureC`; `tolerancePct` of 1 point is common practice. */
export function shopTarget(humidityPct: number, temperatureC: number, tolerancePct = 1): MoistureTarget {
  requireWithin("Tolerance", tolerancePct, 0.1, 5, "points");
  const { moisturePct, outsideRange } = equilibriumMoistureC(humidityPct, temperatureC);
  return { targetPct: moisturePct, tolerancePct, words: `this shop at ${humidityPct} % humidity`, outsideRange };
}

/** The target of the place where a piece will live: the middle and half width of the range for single pieces. */
export function regionTarget(region: Region): MoistureTarget {
  const { name, interior } = regionTargets.find((row) => row.region === region)!;
  const tolerancePct = (interior.highPct - interior.lowPct) / 2;
  const targetPct = (interior.highPct + interior.lowPct) / 2;
  return { targetPct, tolerancePct, words: `indoors, ${name}`, outsideRange: null };
}

export type Readiness = "ready" | "too-wet" | "too-dry";

/** Whether wood at `moisturePct` may be worked for this target. Too dry is a fault too: it swells in use. */
export function readiness(moisturePct: number, target: Pick<MoistureTarget, "targetPct" | "tolerancePct">): Readiness {
  requireMoisture("Moisture", moisturePct);
  if (moisturePct > target.targetPct + target.tolerancePct) return "too-wet";
  if (moisturePct < target.targetPct - target.tolerancePct) return "too-dry";
  return "ready";
}
