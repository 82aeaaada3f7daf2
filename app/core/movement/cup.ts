import { requireSize } from "#app/core/moisture/accepted-range.ts";
import type { RingField } from "#app/core/rings/ring-types.ts";
import type { RingGrowth } from "./ring-angle.ts";
import { isPithInside, type RingCourse, ringCourse } from "./ring-course.ts";

/** How a flat board is expected to cup: an upper bound, the board being free to move and holding no stress back. */
export interface Cup {
  /** Greatest gap under a straightedge laid across the hollow face. */
  heightMm: number;
  /** The face that turns hollow, as the end is drawn; null where the board stays flat within a hundredth of a mm. */
  hollowFace: "top" | "bottom" | null;
  /** The same in the tree's terms; null too where the rings do not tell which side the heart is. */
  hollowSide: "bark" | "heart" | null;
  /** Drop of the mid-thickness line below its chord (downwards positive) at even steps across the width. */
  profile: Array<{ position: number; dropMm: number }>;
}

/** Why no cup is given. */
export interface NoCup {
  why: string;
}

const steps = 200;

/**
 * Cup of a flat board, from the ring angles across its width. Where growth along the rings exceeds growth across them
 * by d, rings that turn by an angle a across the board turn the board's own surface by d (a + sin 2a / 2): own
 * derivation from the compatibility of strains for rings that run parallel, exact for rings round one pith and free of
 * stress there. No published one-line estimate was found to check against (trade reference, section 8); that flatsawn
 * boards dry hollow on the bark face is [secondary]. See `ringCourse` for errors.
 */
export function expectedCup(field: RingField, growth: RingGrowth): Cup | NoCup {
  if (isPithInside(field)) return { why: "The pith is in the board: expect it to check there rather than to cup." };
  const course = ringCourse(field);
  const slope = surfaceSlope(course, growth);
  const stepMm = field.widthMm / steps;
  const heights = [0];
  for (let i = 0; i < steps; i += 1) heights.push(heights[i]! + slope((i + 0.5) / steps) * stepMm);
  const end = heights[steps]!;
  const profile = heights.map((height, i) => ({ position: i / steps, dropMm: height - (end * i) / steps }));
  const deepest = profile.reduce((most, { dropMm }) => (Math.abs(dropMm) > Math.abs(most) ? dropMm : most), 0);
  const hollowFace = Math.abs(deepest) < 0.01 ? null : deepest > 0 ? "top" : "bottom";
  return {
    heightMm: Math.abs(deepest),
    hollowFace,
    hollowSide: hollowSide(hollowFace, heartFace(field, course)),
    profile,
  };
}

/** True where a cup could be told. */
export function isCup(result: Cup | NoCup): result is Cup {
  return "heightMm" in result;
}

/**
 * The same for a board centred over the pith, from its distance to mid-width: d R a tan a with tan a = width / 2R (trade
 * reference section 8, own geometry, an upper bound). In mm, always positive.
 */
export function cupFromPithDistanceMm(widthMm: number, pithDistanceMm: number, growth: RingGrowth): number {
  const half = requireSize("Width", widthMm) / 2;
  const angle = Math.atan(half / requireSize("Distance to the pith", pithDistanceMm));
  return Math.abs(growth.tangential - growth.radial) * half * angle;
}

/** Slope of the mid-thickness line at a position, downwards to the right positive, up to a turn of the whole board. */
export function surfaceSlope(course: RingCourse, { tangential, radial }: RingGrowth): (position: number) => number {
  return (position) => {
    const angle = (course(position) * Math.PI) / 180;
    return (tangential - radial) * (angle + Math.sin(2 * angle) / 2);
  };
}

/** The face towards the heart: rings that fall ever more steeply to the right are centred below. */
function heartFace(field: RingField, course: RingCourse): "top" | "bottom" | null {
  if (field.pith && field.pith.yMm <= 0) return "top";
  if (field.pith && field.pith.yMm >= field.thicknessMm) return "bottom";
  if (field.pith) return null;
  const turn = course(1) - course(0);
  if (Math.abs(turn) < 1) return null;
  return turn > 0 ? "bottom" : "top";
}

function hollowSide(hollow: Cup["hollowFace"], heart: "top" | "bottom" | null): Cup["hollowSide"] {
  if (hollow === null || heart === null) return null;
  return hollow === heart ? "heart" : "bark";
}
