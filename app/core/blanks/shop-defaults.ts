const inches = (count: number) => count * 25.4;

/**
 * What a shop works by until it has entered its own figures. Each is a starting point that the shop changes, with where it comes from (trade reference,
 * sections 10 and 11); a machine's own manual always wins. The database gives a new shop the same, which a check beside this file holds it to.
 */
export const shopDefaults = {
  /** Table saw, 1/8 in. Common practice. */
  kerfMm: inches(1 / 8),
  /** +1 in in length. General how-to texts [secondary]; Griffith 1912 asks 1/2 in [confirmed]. */
  allowanceLengthMm: inches(1),
  /** +1/4 in in width. Griffith 1912 [confirmed]. */
  allowanceWidthMm: inches(1 / 4),
  /** +1/4 in in thickness: 4/4 cleans up to 3/4 in. Common practice; Griffith 1912 asks at least 1/8 in [confirmed]. */
  allowanceThicknessMm: inches(1 / 4),
  /** 1/16 in off each glue face: the most a jointer takes off a face in one pass, by school and shop rules [secondary]. */
  jointPerFaceMm: inches(1 / 16),
  /** 3 1/8 in, a common 10 in table saw's blade at full height. Common practice. */
  sawMaxHeightMm: inches(3 + 1 / 8),
  /** An 8 in jointer. Common practice. */
  jointerMaxWidthMm: inches(8),
  /** At least 12 in long. School and shop rules [secondary]; one maker's manual says 10 in. */
  jointerMinLengthMm: inches(12),
  /** A 13 in planer. Common practice. */
  planerMaxWidthMm: inches(13),
  /** Longer than the gap between the feed rollers, often 12 to 14 in [secondary]: the longer of them. */
  planerMinLengthMm: inches(14),
  clamps: 12,
  /** A pipe clamp, about 1,000 lbf [secondary]. */
  clampForceN: 4448.2,
} as const;

/** A light planer pass, 1/40 in: so deep that half an inch takes twenty. Common practice. */
export const planerPassMm = inches(1 / 40);

/** Glue-up pressures that makers of PVA glue ask for, psi. Trade reference, section 11 [secondary: adhesive makers]. */
export const pressuresPsi = { softwood: { low: 100, high: 150 }, hardwood: { low: 175, high: 250 } } as const;

/** Clamping force by kind, lbf: what a hand gets out of it. Trade reference, section 11 [secondary]. */
export const clampForcesLbf = { "pipe clamp": 1000, "parallel-jaw clamp": 370, "heavy I-bar clamp": 1350 } as const;

/** What a PVA glue is taken to ask for until the shop enters its own label's figures; the label always wins. Trade reference, section 11. */
export const glueDefaults = {
  /** The low end for hardwood [secondary: adhesive makers]. */
  pressurePsi: pressuresPsi.hardwood.low,
  /** On one glue line, g/m²: makers' range, from memory. */
  spreadGramsPerM2: { low: 170, high: 250 },
  /** From spreading to closing the joint: 5 to 10 minutes, the shorter of them. Common practice. */
  openMinutes: 5,
  /** In clamps, unstressed: 30 to 60 minutes, the longer of them; more when cold or dense. Common practice. */
  clampMinutes: 60,
  /** Until the joint bears its full load. Common practice. */
  cureMinutes: 24 * 60,
  /** About 50 °F. Common practice. */
  leastTemperatureC: 10,
  /** Plies of a blank within so many points of moisture. Common practice; structural glulam allows 5 (ANSI A190.1, from memory). */
  pliesWithinPoints: 2,
} as const;
