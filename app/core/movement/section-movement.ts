import type { RingField } from "#app/core/rings/ring-types.ts";
import { growthAtAngle, type RingGrowth } from "./ring-angle.ts";
import { ringCourse } from "./ring-course.ts";

/** What a change of moisture does to a board's section; millimetres, negative for shrinking. */
export interface SectionMovement {
  widthChangeMm: number;
  /** Mean over the width. */
  thicknessChangeMm: number;
  thicknessChangeLeftMm: number;
  thicknessChangeMiddleMm: number;
  thicknessChangeRightMm: number;
  /** Degrees by which the corners leave square, on average over the width. */
  outOfSquareDeg: number;
  /** How much longer one diagonal becomes than the other, and which: "falling" runs from top left to bottom right. */
  diagonalDifferenceMm: number;
  longerDiagonal: "falling" | "rising" | null;
}

const slices = 200;

/**
 * Change of a section's width and thickness, its growth blended by ring angle slice by slice across the width between
 * the stations of `field`. WH warns that the all-flat or all-quartered formula overstates width change and understates
 * thickness change, since few boards are either. See `growthAtAngle` for the blend, `ringCourse` for errors.
 */
export function sectionMovement(field: RingField, growth: RingGrowth): SectionMovement {
  const course = ringCourse(field);
  const { widthMm, thicknessMm } = field;
  let [width, thickness, shear] = [0, 0, 0];
  for (let i = 0; i < slices; i += 1) {
    const slice = growthAtAngle(growth, course((i + 0.5) / slices));
    width += slice.width / slices;
    thickness += slice.thickness / slices;
    shear += slice.shear / slices;
  }
  const diagonalMm = (2 * widthMm * thicknessMm * Math.abs(shear)) / Math.hypot(widthMm, thicknessMm);
  const thicknessAt = (position: number) => thicknessMm * growthAtAngle(growth, course(position)).thickness;
  return {
    widthChangeMm: widthMm * width,
    thicknessChangeMm: thicknessMm * thickness,
    thicknessChangeLeftMm: thicknessAt(0),
    thicknessChangeMiddleMm: thicknessAt(0.5),
    thicknessChangeRightMm: thicknessAt(1),
    outOfSquareDeg: (Math.abs(shear) * 180) / Math.PI,
    diagonalDifferenceMm: diagonalMm,
    longerDiagonal: diagonalMm < 1e-6 ? null : shear > 0 ? "falling" : "rising",
  };
}
