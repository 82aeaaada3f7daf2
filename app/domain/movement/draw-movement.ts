import { deformedSection, fittingExaggeration } from "#app/core/movement/deformed-section.ts";
import type { RingGrowth } from "#app/core/movement/ring-angle.ts";
import { ringCurves } from "#app/core/rings/ring-curves.ts";
import type { PointMm, RingField } from "#app/core/rings/ring-types.ts";

/** A section before and after, as SVG paths in millimetres from its top left corner before it moved. */
export interface DrawnMovement {
  before: string;
  after: string;
  /** The rings, moved with the wood. */
  rings: string;
  /** How many times too large the movement is drawn. */
  exaggeration: number;
  /** What must be in view: both outlines. */
  view: { xMm: number; yMm: number; widthMm: number; heightMm: number };
}

/** Rings drawn across a thickness at the most; more run together. */
const mostRings = 14;
const pointsOnRing = 12;

/** Draws a section's movement large enough to be seen. */
export function drawMovement(field: RingField, growth: RingGrowth): DrawnMovement {
  const section = deformedSection(field, growth, fittingExaggeration(growth));
  const spacingMm = Math.max(25.4 / (field.ringsPerInch ?? 10), field.thicknessMm / mostRings, field.widthMm / 90);
  const rings = ringCurves(field, { spacingMm, bleedMm: 0 }).flat();
  const inView = [...section.before, ...section.after];
  const xs = inView.map(({ xMm }) => xMm);
  const ys = inView.map(({ yMm }) => yMm);
  return {
    before: `${line(section.before)}Z`,
    after: `${line(section.after)}Z`,
    rings: rings
      .map(({ at }) => line(Array.from({ length: pointsOnRing + 1 }, (_, i) => section.deform(at(i / pointsOnRing)))))
      .join(""),
    exaggeration: section.exaggeration,
    view: {
      xMm: Math.min(...xs),
      yMm: Math.min(...ys),
      widthMm: Math.max(...xs) - Math.min(...xs),
      heightMm: Math.max(...ys) - Math.min(...ys),
    },
  };
}

function line(points: readonly PointMm[]): string {
  return points.map(({ xMm, yMm }, i) => `${i === 0 ? "M" : "L"}${xMm.toFixed(2)} ${yMm.toFixed(2)}`).join("");
}
