import type { PointMm, RingField } from "./ring-types.ts";

export interface EndDrawingSize {
  widthPx: number;
  heightPx: number;
  /** Rings closer than this are thinned out, so that they never run together. */
  minSpacingPx?: number;
}

const mmPerInch = 25.4;

/** Where rings of unknown centre are taken to be centred: so far off that they are straight across a board. */
const farMm = 100_000;

/**
 * The rings of a board's end as one SVG path, arcs round the pith at the recorded spacing.
 *
 * @returns a `d` attribute in pixels of the drawing; clip it to the rectangle.
 */
export function ringPath(field: RingField, { widthPx, heightPx, minSpacingPx = 3 }: EndDrawingSize): string {
  const scaleX = widthPx / field.widthMm;
  const scaleY = heightPx / field.thicknessMm;
  const pith = field.pith ?? farPith(field);
  const corners = [
    [0, 0],
    [field.widthMm, 0],
    [field.widthMm, field.thicknessMm],
    [0, field.thicknessMm],
  ] as const;
  const radii = corners.map(([x, y]) => Math.hypot(x - pith.xMm, y - pith.yMm));
  const inside = pith.xMm >= 0 && pith.xMm <= field.widthMm && pith.yMm >= 0 && pith.yMm <= field.thicknessMm;
  const nearest = inside
    ? 0
    : Math.hypot(
        Math.max(-pith.xMm, 0, pith.xMm - field.widthMm),
        Math.max(-pith.yMm, 0, pith.yMm - field.thicknessMm),
      );
  const farthest = Math.max(...radii);
  const ringMm = mmPerInch / (field.ringsPerInch ?? 10);
  const spacing = Math.max(ringMm, minSpacingPx / Math.min(scaleX, scaleY));
  const middle = Math.atan2(field.thicknessMm / 2 - pith.yMm, field.widthMm / 2 - pith.xMm);
  const spread = inside
    ? Math.PI
    : Math.max(...corners.map(([x, y]) => Math.abs(turn(Math.atan2(y - pith.yMm, x - pith.xMm) - middle))));
  let d = "";
  for (let r = Math.ceil(nearest / spacing) * spacing; r < farthest; r += spacing) {
    if (r === 0) continue;
    const point = (angle: number) =>
      `${((pith.xMm + r * Math.cos(angle)) * scaleX).toFixed(1)} ${((pith.yMm + r * Math.sin(angle)) * scaleY).toFixed(1)}`;
    const radius = `${(r * scaleX).toFixed(1)} ${(r * scaleY).toFixed(1)}`;
    const from = middle - Math.min(spread, Math.PI * 0.999);
    const to = middle + Math.min(spread, Math.PI * 0.999);
    d += `M${point(from)}A${radius} 0 ${to - from > Math.PI ? 1 : 0} 1 ${point(to)}`;
  }
  return d;
}

function farPith(field: RingField): PointMm {
  const mean = field.stations.reduce((sum, station) => sum + station.signedDeg, 0) / Math.max(1, field.stations.length);
  const along = (mean * Math.PI) / 180;
  return { xMm: field.widthMm / 2 - farMm * Math.sin(along), yMm: field.thicknessMm / 2 + farMm * Math.cos(along) };
}

function turn(angle: number): number {
  return Math.atan2(Math.sin(angle), Math.cos(angle));
}
