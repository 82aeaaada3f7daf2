import { requireWithin } from "#app/core/moisture/accepted-range.ts";
import type { PointMm, RingField } from "#app/core/rings/ring-types.ts";
import { surfaceSlope } from "./cup.ts";
import { withoutRigidMotion } from "./rigid-motion.ts";
import { growthAtAngle, type RingGrowth } from "./ring-angle.ts";
import { isPithInside, ringCourse } from "./ring-course.ts";

/** Takes a point of the section to where it lies after the change of moisture; same origin, millimetres. */
export type Deformation = (point: PointMm) => PointMm;

/** A section before and after, as closed outlines clockwise from the top left corner. */
export interface DeformedSection {
  before: PointMm[];
  after: PointMm[];
  /** The same map for any other point, such as those of ring arcs. */
  deform: Deformation;
  exaggeration: number;
}

/** Points along each long side; the short ones get a quarter as many. */
const pointsAlong = 24;

/**
 * The outline of a board's end before and after a change of moisture, growth drawn `exaggeration` times too large. With
 * a pith outside the board the map is exact for rings round it: radii grow by R, arcs by T, so angles at the pith by
 * (1 + T)/(1 + R). Without one (or with the pith inside, where wood splits instead) it follows the stations, to first
 * order in the thickness. Shift and turn of the whole are taken out. RangeError for an exaggeration that would draw
 * growth of more than half, or not between 0 and 1000.
 */
export function deformedSection(field: RingField, growth: RingGrowth, exaggeration = 1): DeformedSection {
  requireWithin("Exaggeration", exaggeration, 0, 1000);
  const drawn = { radial: growth.radial * exaggeration, tangential: growth.tangential * exaggeration };
  const largest = Math.max(Math.abs(drawn.radial), Math.abs(drawn.tangential));
  requireWithin("Growth as drawn", largest, 0, 0.5, "(use a smaller exaggeration)");
  const before = outline(field);
  const raw = field.pith && !isPithInside(field) ? aboutPith(field, field.pith, drawn) : alongStations(field, drawn);
  const deform = withoutRigidMotion(before, raw);
  return { before, after: before.map(deform), deform, exaggeration };
}

/** A round exaggeration that draws the largest growth as about a tenth, so that the shape can be seen: 1 to 50. */
export function fittingExaggeration({ radial, tangential }: RingGrowth): number {
  const largest = Math.max(Math.abs(radial), Math.abs(tangential));
  const choices = [50, 20, 10, 5, 2];
  return choices.find((choice) => choice * largest <= 0.12) ?? 1;
}

function outline({ widthMm, thicknessMm }: RingField): PointMm[] {
  const corners = [
    { xMm: 0, yMm: 0 },
    { xMm: widthMm, yMm: 0 },
    { xMm: widthMm, yMm: thicknessMm },
    { xMm: 0, yMm: thicknessMm },
  ];
  return corners.flatMap((from, side) => {
    const to = corners[(side + 1) % 4]!;
    const count = side % 2 === 0 ? pointsAlong : pointsAlong / 4;
    return Array.from({ length: count }, (_, i) => ({
      xMm: from.xMm + ((to.xMm - from.xMm) * i) / count,
      yMm: from.yMm + ((to.yMm - from.yMm) * i) / count,
    }));
  });
}

function aboutPith(field: RingField, pith: PointMm, { radial, tangential }: RingGrowth): Deformation {
  const towards = Math.atan2(field.thicknessMm / 2 - pith.yMm, field.widthMm / 2 - pith.xMm);
  const wider = (1 + tangential) / (1 + radial);
  return ({ xMm, yMm }) => {
    const radius = Math.hypot(xMm - pith.xMm, yMm - pith.yMm) * (1 + radial);
    const away = Math.atan2(yMm - pith.yMm, xMm - pith.xMm) - towards;
    const angle = towards + Math.atan2(Math.sin(away), Math.cos(away)) * wider;
    return { xMm: pith.xMm + radius * Math.cos(angle), yMm: pith.yMm + radius * Math.sin(angle) };
  };
}

function alongStations(field: RingField, growth: RingGrowth): Deformation {
  const course = ringCourse(field);
  const slope = surfaceSlope(course, growth);
  // The turn of the middle is taken out first: at this order it would distort what is drawn large.
  const turn = slope(0.5) - growthAtAngle(growth, course(0.5)).shear / 2;
  const steps = 400;
  const right = [0];
  const down = [0];
  for (let i = 0; i < steps; i += 1) {
    const middle = (i + 0.5) / steps;
    right.push(right[i]! + (growthAtAngle(growth, course(middle)).width * field.widthMm) / steps);
    down.push(down[i]! + ((slope(middle) - turn) * field.widthMm) / steps);
  }
  return ({ xMm, yMm }) => {
    const position = Math.min(1, Math.max(0, xMm / field.widthMm));
    const { thickness, shear } = growthAtAngle(growth, course(position));
    const offMiddle = yMm - field.thicknessMm / 2;
    return {
      xMm: xMm + between(right, position) + offMiddle * (shear - (slope(position) - turn)),
      yMm: yMm + between(down, position) + offMiddle * thickness,
    };
  };
}

function between(values: number[], position: number): number {
  const at = position * (values.length - 1);
  const left = Math.min(values.length - 2, Math.floor(at));
  return values[left]! + (values[left + 1]! - values[left]!) * (at - left);
}
