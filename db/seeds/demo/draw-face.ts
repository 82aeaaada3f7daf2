import { randomStream, smoothNoise } from "#scripts/endgrain/random.ts";
import type { RgbPicture } from "#scripts/endgrain/render-end.ts";
import { evenRadius, growTree, type RingTree, ringAt } from "#scripts/endgrain/ring-tree.ts";
import { WOOD_KINDS, type WoodKind, type WoodKindName } from "#scripts/endgrain/wood-kinds.ts";

export interface FaceSpec {
  lengthMm: number;
  widthMm: number;
  /** From the top left corner of the near end, as in the end's own drawing. */
  pith: { xMm: number; yMm: number };
  ringsPerInch: number;
  kind: WoodKindName;
  seed: number;
  pxPerMm: number;
}

/**
 * A board's upper face as the same tree would show it: rings cut lengthwise, the trunk tapering and leaning a little. Drawn by a program for the
 * demonstration; pretty enough to tell flat from quartered, and no photograph.
 */
export function drawFace(spec: FaceSpec): RgbPicture {
  const width = Math.round(spec.lengthMm * spec.pxPerMm);
  const height = Math.round(spec.widthMm * spec.pxPerMm);
  const data = new Uint8Array(width * height * 3);
  const kind: WoodKind = WOOD_KINDS[spec.kind];
  const reachMm = Math.hypot(Math.abs(spec.pith.xMm) + spec.widthMm, Math.abs(spec.pith.yMm) + 60) * 1.3;
  const tree = growTree({
    ringsPerInch: spec.ringsPerInch,
    reachMm,
    spread: kind.ringSpread,
    roundness: 1,
    seed: spec.seed,
  });
  const random = randomStream(spec.seed ^ 0x1f3d5b79);
  for (let y = 0; y < height; y++)
    for (let x = 0; x < width; x++) {
      const alongMm = x / spec.pxPerMm;
      const acrossMm = y / spec.pxPerMm;
      const { late, ray } = faceShade(kind, tree, spec, alongMm, acrossMm);
      const fuzz = (random() - 0.5) * 14 + 18 * (smoothNoise(alongMm / 30, acrossMm / 3, spec.seed) - 0.5);
      for (let c = 0; c < 3; c++) {
        const early = kind.early[c] as number;
        const value = (early + ((kind.late[c] as number) - early) * late) * (1 + 0.2 * ray) + fuzz;
        data[(y * width + x) * 3 + c] = Math.max(0, Math.min(255, Math.round(value)));
      }
    }
  return { width, height, data };
}

const taperPerMm = 0.006;

function faceShade(
  kind: WoodKind,
  tree: RingTree,
  spec: FaceSpec,
  alongMm: number,
  acrossMm: number,
): { late: number; ray: number } {
  const wander = 9 * (smoothNoise(alongMm / 420, 3.5, spec.seed + 5) - 0.5);
  const dx = acrossMm - spec.pith.xMm + wander;
  const dy = -spec.pith.yMm + wander * 0.6;
  const radius = evenRadius(tree, dx, dy) + alongMm * taperPerMm;
  const { through } = ringAt(tree, radius);
  const begins = 1 - kind.latewood;
  const late = Math.max(0, Math.min(1, (through - begins + 0.25) / 0.25));
  // Where the face runs along a ray, wide rays lie in it as flecks.
  const radial = Math.abs(dx) / Math.hypot(dx, dy);
  const fleck =
    kind.rays.widthMm > 0.2 && radial > 0.94 && smoothNoise(alongMm / 9, acrossMm / 2.4, spec.seed + 9) > 0.68 ? 1 : 0;
  return { late, ray: fleck };
}
