import { requireWithin } from "#app/core/moisture/accepted-range.ts";

/**
 * Strength left at a slope of grain of 1 in n, percent of straight-grained wood. Wood Handbook ch. 5 Table 5-12, from memory (trade reference, section
 * 12). Compression is that along the grain.
 */
export const slopeTable = [
  { oneIn: 5, bendingPct: 55, impactPct: 36, compressionPct: 93 },
  { oneIn: 10, bendingPct: 81, impactPct: 62, compressionPct: 99 },
  { oneIn: 15, bendingPct: 89, impactPct: 81, compressionPct: 100 },
  { oneIn: 20, bendingPct: 93, impactPct: 90, compressionPct: 100 },
  { oneIn: 25, bendingPct: 96, impactPct: 95, compressionPct: 100 },
] as const;

/** ASTM D245 Table 1 design strength ratio in bending, by slope 1 in n [secondary: quoted in a public engineering note]. Lower than averages, on purpose. */
export const d245BendingPct: Readonly<Record<number, number>> = {
  6: 40,
  8: 53,
  10: 61,
  12: 69,
  14: 74,
  15: 76,
  20: 100,
};

/** A slope of 1 in n as an angle in degrees, by its tangent. */
export function slopeDeg(oneIn: number): number {
  requireWithin("Slope, one in", oneIn, 0.01, 1e6);
  return (Math.atan(1 / oneIn) * 180) / Math.PI;
}

/**
 * Bending strength left at a slope of 1 in n, percent: the table, straight between its rows; null steeper than 1 in 5, where it ends. The table has no slope
 * for "straight"; that it is reached at 1 in 60, under one degree, is our own choice.
 */
export function bendingLeftPct(oneIn: number): number | null {
  requireWithin("Slope, one in", oneIn, 0.01, 1e6);
  const rows = [...slopeTable, { oneIn: 60, bendingPct: 100 }];
  if (oneIn < 5) return null;
  for (let i = 1; i < rows.length; i++) {
    const [low, high] = [rows[i - 1], rows[i]];
    if (low && high && oneIn <= high.oneIn)
      return low.bendingPct + ((high.bendingPct - low.bendingPct) * (oneIn - low.oneIn)) / (high.oneIn - low.oneIn);
  }
  return 100;
}

/** Two slopes at once, on two faces that meet: 1 in n of the grain's own slope. Pythagoras. */
export function combinedSlope(oneInA: number, oneInB: number): number {
  requireWithin("Slope, one in", oneInA, 0.01, 1e6);
  requireWithin("Slope, one in", oneInB, 0.01, 1e6);
  return 1 / Math.hypot(1 / oneInA, 1 / oneInB);
}

/**
 * Hankinson's formula: a property at an angle to the grain from its values along and across. Wood Handbook ch. 5; the formula's use confirmed (FPL
 * Report 1263), exponents from memory: 2 to 2.5 in compression, 1.5 to 2 in tension and bending.
 */
export function hankinson(along: number, across: number, angleDeg: number, exponent = 2): number {
  requireWithin("Angle", angleDeg, 0, 90, "degrees");
  requireWithin("Exponent", exponent, 1, 3);
  const [sine, cosine] = [Math.sin((angleDeg * Math.PI) / 180), Math.cos((angleDeg * Math.PI) / 180)];
  return (along * across) / (along * sine ** exponent + across * cosine ** exponent);
}
