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
