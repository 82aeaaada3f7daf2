/**
 * What the end of each kind of wood looks like, in millimetres and parts of a ring. Sizes are within the classes that the
 * IAWA list of microscopic features for hardwood identification (IAWA Bulletin 10(3), 1989) uses and R. B. Hoadley's
 * "Identifying Wood" (1990) and the USDA Wood Handbook (FPL-GTR-282, chapter 3) describe; all figures here are FROM MEMORY of
 * those, not copied from a table, and the colours are chosen by eye.
 */
export type WoodKind = {
  /** Colours of earlywood and latewood ground, red green blue 0..255. */
  early: [number, number, number];
  late: [number, number, number];
  /** Part of the ring that is latewood, and how abruptly it begins (0 gradual .. 1 abrupt). */
  latewood: number;
  abruptness: number;
  /** A thin dark (−) or light (+) line closing the ring: strength in parts of the early/late contrast, width in mm. */
  closingLine: { strength: number; widthMm: number };
  /** Pores: width where the ring begins and where it ends; parts of the ring over which the big ones stand; how full each zone is (0..1). */
  pores: { earlyMm: number; lateMm: number; band: number; earlyFill: number; lateFill: number } | null;
  /** Rays seen at arm's length: width, distance between them along the ring, brightness against the ground (−1..1). */
  rays: { widthMm: number; spacingMm: number; contrast: number };
  /** Spread of ring widths about their mean (lognormal sigma). */
  ringSpread: number;
};

export const WOOD_KINDS = {
  // Douglas fir, pine: no pores, abrupt latewood a third of the ring, rays one cell wide and unseen (Hoadley, from memory).
  softwood: {
    early: [222, 190, 145],
    late: [160, 98, 56],
    latewood: 0.32,
    abruptness: 0.75,
    closingLine: { strength: 0, widthMm: 0.05 },
    pores: null,
    rays: { widthMm: 0.03, spacingMm: 0.2, contrast: 0.03 },
    ringSpread: 0.28,
  },
  // Oak: ring-porous, earlywood pores 0.2–0.35 mm in one to three rows, small ones in flames; rays to 0.4 mm wide, some mm apart (IAWA: vessels ≥ 200 µm, rays > 10 cells; from memory).
  oak: {
    early: [196, 160, 116],
    late: [168, 128, 86],
    latewood: 0.62,
    abruptness: 0.4,
    closingLine: { strength: 0, widthMm: 0.05 },
    pores: { earlyMm: 0.3, lateMm: 0.06, band: 0.26, earlyFill: 0.75, lateFill: 0.25 },
    rays: { widthMm: 0.28, spacingMm: 3, contrast: 0.5 },
    ringSpread: 0.3,
  },
  // Ash: ring-porous, earlywood pores 0.2–0.3 mm in two to four rows, few solitary small ones; rays one to three cells, barely seen (Hoadley, from memory).
  ash: {
    early: [214, 190, 152],
    late: [186, 154, 112],
    latewood: 0.6,
    abruptness: 0.5,
    closingLine: { strength: 0, widthMm: 0.05 },
    pores: { earlyMm: 0.25, lateMm: 0.07, band: 0.28, earlyFill: 0.8, lateFill: 0.08 },
    rays: { widthMm: 0.05, spacingMm: 0.25, contrast: 0.12 },
    ringSpread: 0.3,
  },
  // Hard maple: diffuse-porous, pores 0.05–0.1 mm even; rings closed by a thin darker line; rays to 0.1 mm, 0.3–0.5 mm apart, brighter than the ground (IAWA: 50–100 µm; Hoadley; from memory).
  maple: {
    early: [224, 200, 164],
    late: [214, 187, 148],
    latewood: 0.3,
    abruptness: 0.1,
    closingLine: { strength: -1.4, widthMm: 0.12 },
    pores: { earlyMm: 0.08, lateMm: 0.07, band: 0.9, earlyFill: 0.14, lateFill: 0.12 },
    rays: { widthMm: 0.08, spacingMm: 0.45, contrast: 0.22 },
    ringSpread: 0.25,
  },
  // Black cherry: diffuse to semi-ring-porous, pores 0.05–0.1 mm, one row a little bigger where the ring begins; bright rays 0.06–0.1 mm (Hoadley, from memory).
  cherry: {
    early: [200, 152, 112],
    late: [184, 132, 92],
    latewood: 0.35,
    abruptness: 0.15,
    closingLine: { strength: -0.8, widthMm: 0.1 },
    pores: { earlyMm: 0.1, lateMm: 0.06, band: 0.15, earlyFill: 0.4, lateFill: 0.12 },
    rays: { widthMm: 0.08, spacingMm: 0.4, contrast: 0.3 },
    ringSpread: 0.25,
  },
  // Black walnut: semi-ring-porous, pores 0.2 mm shrinking gradually to 0.06; rays fine, hardly seen; dark ring end (Hoadley, from memory).
  walnut: {
    early: [124, 90, 64],
    late: [96, 66, 46],
    latewood: 0.5,
    abruptness: 0.2,
    closingLine: { strength: -0.8, widthMm: 0.15 },
    pores: { earlyMm: 0.2, lateMm: 0.07, band: 0.6, earlyFill: 0.35, lateFill: 0.2 },
    rays: { widthMm: 0.04, spacingMm: 0.2, contrast: 0.08 },
    ringSpread: 0.28,
  },
} as const satisfies Record<string, WoodKind>;

export type WoodKindName = keyof typeof WOOD_KINDS;
