import { axialMean, foldDeg } from "./angle.ts";
import { type RingDirection, ringDirection } from "./direction.ts";
import type { PointMm, RingField } from "./ring-types.ts";

/** A leg's section where it is cut from a board's end: its middle, its own width and thickness, and how far it is turned, clockwise as drawn. */
export interface LegSection {
  middle: PointMm;
  widthMm: number;
  thicknessMm: number;
  turnDeg: number;
}

export type LegSide = "top" | "right" | "bottom" | "left";

/** What one side of a leg shows. */
export interface SideGrain {
  side: LegSide;
  /** Between the rings and this side: 0 where they lie in it and show as arches, 90 where they stand square to it. */
  leastDeg: number;
  meanDeg: number;
  greatestDeg: number;
  /** Degrees by which the side falls short of straight grain at its worst place; 0 where it is straight throughout. */
  departsDeg: number;
  /** Of the side's width that shows straight grain. */
  straightShare: number;
}

export interface LegGrain {
  sides: SideGrain[];
  /** All four sides straight throughout. */
  isStraight: boolean;
  /** Mean direction of the rings in the section, to the leg's own top: -90 to 90, ±45 on the diagonal. */
  signedDeg: number;
}

/**
 * The least angle between rings and a side for its grain to count as straight. Common practice has no figure; this is where flat ends by default. On a
 * side at angle a to the rings, whatever they wander along the board shows magnified by 1 / sin a: 1.4 times at 45 degrees, twice at 30, six times at
 * 10, which is how arches come about [derived].
 */
export const straightFromDeg = 30;

const alongSide = 25;
const acrossSection = 13;

/**
 * How far each of a leg's four sides departs from straight grain. Opposite sides see the rings at nearly one angle a, the other two at 90 - a: with
 * straight rings all four sides are straight just where a lies between the limit and 90 less the limit, that is 30 to 60 degrees, the rift class: so
 * "rift stock shows straight grain on all four sides" (common practice, no source) holds, and fails near the pith, where the rings turn within the leg.
 * The rings are continued beyond the board's edges where the section sticks out. RangeError for an end without a reading.
 */
export function legGrain(field: RingField, leg: LegSection, straightFrom = straightFromDeg): LegGrain {
  return grainIn(ringDirection(field), leg, straightFrom);
}

function grainIn(direction: RingDirection, leg: LegSection, straightFrom: number): LegGrain {
  const inLeg = (u: number, v: number) => foldDeg(direction(placed(leg, u, v)) - leg.turnDeg);
  const steps = Array.from({ length: alongSide }, (_, i) => (2 * (i + 0.5)) / alongSide - 1);
  const toTop = (deg: number) => Math.abs(deg);
  const toEdge = (deg: number) => 90 - Math.abs(deg);
  const sides: SideGrain[] = [
    sideGrain(
      "top",
      steps.map((s) => toTop(inLeg(s, -1))),
      straightFrom,
    ),
    sideGrain(
      "right",
      steps.map((s) => toEdge(inLeg(1, s))),
      straightFrom,
    ),
    sideGrain(
      "bottom",
      steps.map((s) => toTop(inLeg(s, 1))),
      straightFrom,
    ),
    sideGrain(
      "left",
      steps.map((s) => toEdge(inLeg(-1, s))),
      straightFrom,
    ),
  ];
  const grid = Array.from({ length: acrossSection }, (_, i) => (2 * (i + 0.5)) / acrossSection - 1);
  return {
    sides,
    isStraight: sides.every(({ departsDeg }) => departsDeg === 0),
    signedDeg: axialMean(grid.flatMap((u) => grid.map((v) => inLeg(u, v)))).signedDeg,
  };
}

/** A leg turned within its stock. */
export interface LegTurn {
  /** From the leg as it lay, clockwise as drawn, -45 to 45. */
  turnDeg: number;
  /** Stock that the turned section needs at the least, square to and along the wide face. */
  stockThicknessMm: number;
  stockWidthMm: number;
  /** Whether the turned section lies within this board's end where it is. */
  fitsBoard: boolean;
  grain: LegGrain;
}

/** The turn that puts the rings on the leg's diagonal, the stock it takes, and what its sides show then. RangeError for an end without a reading. */
export function turnToDiagonal(field: RingField, leg: LegSection, straightFrom = straightFromDeg): LegTurn {
  const direction = ringDirection(field);
  const off = grainIn(direction, leg, straightFrom).signedDeg - 45;
  return turned(field, direction, leg, off - 90 * Math.ceil((off - 45) / 90), straightFrom);
}

/** The least turn, to half a degree, that makes all four sides straight, with its thinner stock; null where none does. */
export function leastTurn(field: RingField, leg: LegSection, straightFrom = straightFromDeg): LegTurn | null {
  const direction = ringDirection(field);
  for (let step = 0; step <= 90; step++)
    for (const turnDeg of step === 0 ? [0] : [step / 2, -step / 2]) {
      const turn = turned(field, direction, leg, turnDeg, straightFrom);
      if (turn.grain.isStraight) return turn;
    }
  return null;
}

function turned(
  field: RingField,
  direction: RingDirection,
  leg: LegSection,
  turnDeg: number,
  straightFrom: number,
): LegTurn {
  const section = { ...leg, turnDeg: leg.turnDeg + turnDeg };
  const angle = (section.turnDeg * Math.PI) / 180;
  const [cos, sin] = [Math.abs(Math.cos(angle)), Math.abs(Math.sin(angle))];
  const stockWidthMm = leg.widthMm * cos + leg.thicknessMm * sin;
  const stockThicknessMm = leg.widthMm * sin + leg.thicknessMm * cos;
  const { xMm, yMm } = leg.middle;
  const within = (at: number, span: number, room: number) => at - span / 2 >= -1e-6 && at + span / 2 <= room + 1e-6;
  return {
    turnDeg,
    stockThicknessMm,
    stockWidthMm,
    fitsBoard: within(xMm, stockWidthMm, field.widthMm) && within(yMm, stockThicknessMm, field.thicknessMm),
    grain: grainIn(direction, section, straightFrom),
  };
}

/** A place of the section, u and v from -1 to 1 across its own width and thickness, on the board's end. */
function placed({ middle, widthMm, thicknessMm, turnDeg }: LegSection, u: number, v: number): PointMm {
  const angle = (turnDeg * Math.PI) / 180;
  const [x, y] = [(u * widthMm) / 2, (v * thicknessMm) / 2];
  return {
    xMm: middle.xMm + x * Math.cos(angle) - y * Math.sin(angle),
    yMm: middle.yMm + x * Math.sin(angle) + y * Math.cos(angle),
  };
}

function sideGrain(side: LegSide, angles: number[], straightFrom: number): SideGrain {
  const leastDeg = Math.min(...angles);
  const straight = angles.filter((deg) => deg >= straightFrom - 1e-9).length;
  return {
    side,
    leastDeg,
    meanDeg: angles.reduce((sum, deg) => sum + deg, 0) / angles.length,
    greatestDeg: Math.max(...angles),
    departsDeg: straight === angles.length ? 0 : straightFrom - leastDeg,
    straightShare: straight / angles.length,
  };
}
