import { requireMoisture, requireWithin } from "./accepted-range.ts";

/** How far apart the plies of one blank are. Indexes are those of the list given. */
export interface PlySpread {
  spreadPct: number;
  limitPct: number;
  isWithin: boolean;
  wettest: number;
  driest: number;
}

/**
 * Whether plies are near enough in moisture to be glued: within 2 points of each other is common practice (structural
 * glulam allows 5, ANSI A190.1 [memory]). `moisturesPct` in percent, at least one. RangeError otherwise.
 */
export function plySpread(moisturesPct: readonly number[], limitPct = 2): PlySpread {
  requireWithin("Number of plies", moisturesPct.length, 1, 100);
  requireWithin("Limit", limitPct, 0, 10, "points");
  for (const moisturePct of moisturesPct) requireMoisture("Ply moisture", moisturePct);
  const high = Math.max(...moisturesPct);
  const low = Math.min(...moisturesPct);
  // Meters show tenths: 8.1 and 10.1 are 2 apart though their difference in binary is a hair more.
  const spreadPct = Math.round((high - low) * 1e6) / 1e6;
  return {
    spreadPct,
    limitPct,
    isWithin: spreadPct <= limitPct,
    wettest: moisturesPct.indexOf(high),
    driest: moisturesPct.indexOf(low),
  };
}
