import type { PointMm } from "#app/core/rings/ring-types.ts";

/** Follows `map` by the shift and turn that bring its images of `points` back nearest to the points (least squares). */
export function withoutRigidMotion(
  points: readonly PointMm[],
  map: (point: PointMm) => PointMm,
): (point: PointMm) => PointMm {
  const images = points.map(map);
  const [home, away] = [mean(points), mean(images)];
  let [dot, cross] = [0, 0];
  points.forEach((point, i) => {
    const [px, py] = [point.xMm - home.xMm, point.yMm - home.yMm];
    const [qx, qy] = [images[i]!.xMm - away.xMm, images[i]!.yMm - away.yMm];
    dot += qx * px + qy * py;
    cross += qx * py - qy * px;
  });
  const turn = Math.atan2(cross, dot);
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)];
  return (point) => {
    const image = map(point);
    const [x, y] = [image.xMm - away.xMm, image.yMm - away.yMm];
    return { xMm: home.xMm + x * cos - y * sin, yMm: home.yMm + x * sin + y * cos };
  };
}

function mean(points: readonly PointMm[]): PointMm {
  const sum = points.reduce((total, { xMm, yMm }) => ({ xMm: total.xMm + xMm, yMm: total.yMm + yMm }), {
    xMm: 0,
    yMm: 0,
  });
  return { xMm: sum.xMm / points.length, yMm: sum.yMm / points.length };
}
