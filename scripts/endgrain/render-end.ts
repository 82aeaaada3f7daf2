import { normal, placeHash, randomStream, smoothNoise } from "#scripts/endgrain/random.ts";
import { evenRadius, growTree, type RingTree, ringAt } from "#scripts/endgrain/ring-tree.ts";
import { WOOD_KINDS, type WoodKind, type WoodKindName } from "#scripts/endgrain/wood-kinds.ts";

/** A board's end to draw. The pith is in millimetres from the end's top left corner and may lie outside. */
export type EndSpec = {
  widthMm: number;
  thicknessMm: number;
  pith: { xMm: number; yMm: number };
  ringsPerInch: number;
  kind: WoodKindName;
  seed: number;
  pxPerMm: number;
  /** 0 perfect circles .. 1 an ordinary stem. */
  roundness?: number;
  /** Rough-sawn fuzz and torn fibres, 0..1. */
  roughness?: number;
};

/** Red, green, blue bytes, rows from the top. */
export type RgbPicture = { width: number; height: number; data: Uint8Array };

/** The tree of a spec: rings reach past the end's furthest corner. */
export function treeOf(spec: EndSpec): RingTree {
  const reachMm =
    1.2 *
    Math.hypot(
      Math.max(Math.abs(spec.pith.xMm), Math.abs(spec.widthMm - spec.pith.xMm)),
      Math.max(Math.abs(spec.pith.yMm), Math.abs(spec.thicknessMm - spec.pith.yMm)),
    );
  return growTree({
    ringsPerInch: spec.ringsPerInch,
    reachMm,
    spread: WOOD_KINDS[spec.kind].ringSpread,
    roundness: spec.roundness ?? 1,
    seed: spec.seed,
  });
}

/** Draws the end straight on, filling the picture, in even light: wood only. @returns raw RGB, widthMm·pxPerMm wide. */
export function renderEnd(spec: EndSpec): RgbPicture {
  const width = Math.max(1, Math.round(spec.widthMm * spec.pxPerMm));
  const height = Math.max(1, Math.round(spec.thicknessMm * spec.pxPerMm));
  const data = new Uint8Array(width * height * 3);
  const tree = treeOf(spec);
  const kind: WoodKind = WOOD_KINDS[spec.kind];
  const random = randomStream(spec.seed ^ 0x5bd1e995);
  const roughness = spec.roughness ?? 0.4;
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const xMm = (x + 0.5) / spec.pxPerMm;
      const yMm = (y + 0.5) / spec.pxPerMm;
      const shade = woodShade(kind, tree, spec, xMm - spec.pith.xMm, yMm - spec.pith.yMm);
      const fuzz = roughness * (14 * normal(random) + 26 * (smoothNoise(xMm * 1.6, yMm * 1.6, spec.seed + 7) - 0.5));
      const stain = 16 * (smoothNoise(xMm / 25, yMm / 25, spec.seed + 11) - 0.5);
      for (let c = 0; c < 3; c++) {
        const ground = kind.early[c]! + (kind.late[c]! - kind.early[c]!) * shade.late;
        const value = ground * (1 - shade.pore) * (1 + 0.35 * shade.ray) + fuzz + stain;
        data[(y * width + x) * 3 + c] = Math.max(0, Math.min(255, Math.round(value)));
      }
    }
  }
  return { width, height, data };
}

/** Ground (0 earlywood .. 1 latewood, may pass either), pore darkness 0..1 and ray brightness −1..1 at a place relative to the pith. */
function woodShade(
  kind: WoodKind,
  tree: RingTree,
  spec: EndSpec,
  xMm: number,
  yMm: number,
): { late: number; pore: number; ray: number } {
  const radius = evenRadius(tree, xMm, yMm);
  const bearing = Math.atan2(yMm, xMm);
  const { ring, through, widthMm } = ringAt(tree, radius);
  const begins = 1 - kind.latewood;
  const ramp = Math.max(0.04, (1 - kind.abruptness) * begins);
  let late = Math.max(0, Math.min(1, (through - begins + ramp) / ramp));
  late *= 0.75 + 0.5 * placeHash(ring, 3, spec.seed);
  const pixelMm = 1 / spec.pxPerMm;
  const toEnd = (1 - through) * widthMm;
  // The camera cannot show a line thinner than a pixel; it only makes the pixel a little darker.
  const lineMm = Math.max(kind.closingLine.widthMm, pixelMm);
  // Where the ring closes the pixel covers both sides of the edge.
  late *= Math.min(1, toEnd / pixelMm + 0.5);
  if (toEnd < lineMm) late -= kind.closingLine.strength * (kind.closingLine.widthMm / lineMm) * (1 - toEnd / lineMm);
  const pore = kind.pores ? poreShade(kind.pores, radius, bearing, through, pixelMm, spec.seed) : 0;
  return { late, pore, ray: rayShade(kind.rays, radius, bearing, pixelMm, spec.seed) };
}

function poreShade(
  pores: NonNullable<WoodKind["pores"]>,
  radius: number,
  bearing: number,
  through: number,
  pixelMm: number,
  seed: number,
): number {
  const early = through < pores.band;
  const poreMm = early ? pores.earlyMm : pores.lateMm;
  const fill = early ? pores.earlyFill : pores.lateFill;
  const gridMm = poreMm * 1.35;
  const row = Math.floor(radius / gridMm);
  let dark = 0;
  for (let r = row - 1; r <= row + 1; r++) {
    const along = (bearing * (r + 0.5) * gridMm) / gridMm;
    const place = Math.floor(along);
    for (let p = place - 1; p <= place + 1; p++) {
      if (placeHash(r, p, seed + (early ? 1 : 2)) > fill) continue;
      const da = (along - p - 0.3 - 0.4 * placeHash(r, p, seed + 4)) * gridMm;
      const dr = radius - (r + 0.3 + 0.4 * placeHash(r, p, seed + 5)) * gridMm;
      const inside = poreMm / 2 - Math.hypot(da, dr * 0.85);
      const cover = Math.max(0, Math.min(1, inside / pixelMm + 0.5)) * Math.min(1, (poreMm / pixelMm) ** 2);
      dark = Math.max(dark, cover);
    }
  }
  return 0.5 * dark;
}

function rayShade(rays: WoodKind["rays"], radius: number, bearing: number, pixelMm: number, seed: number): number {
  // New rays begin as the stem grows, so that their distance along the ring stays about the same: a set for each doubling.
  const octave = Math.max(0, Math.floor(Math.log2(Math.max(1, (2 * Math.PI * radius) / rays.spacingMm / 8))));
  const count = 8 * 2 ** octave;
  const place = ((bearing / (2 * Math.PI) + 0.5) * count) % count;
  const index = Math.floor(place);
  const seenMm = Math.max(rays.widthMm, pixelMm);
  let bright = 0;
  for (let i = index - 1; i <= index + 1; i++) {
    const own = ((i % count) + count) % count;
    const centre = i + 0.2 + 0.6 * placeHash(own, octave, seed + 21);
    const away = (Math.abs(place - centre) / count) * 2 * Math.PI * radius;
    const share = (0.6 + 0.8 * placeHash(own, octave, seed + 22)) * (rays.widthMm / seenMm);
    bright = Math.max(bright, share * Math.max(0, Math.min(1, (seenMm / 2 - away) / pixelMm + 0.5)));
  }
  return rays.contrast * bright;
}
