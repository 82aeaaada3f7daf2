import { ringDirection } from "./direction.ts";
import type { RingField } from "./ring-types.ts";

/** Ring angles that are wanted, both ends counted in: 0 flat to 90 quartered, degrees. */
export interface RingWindow {
  leastDeg: number;
  greatestDeg: number;
}

/** A strip to be ripped from a board, its rings within a window over at least a share of its end's area. */
export interface StripDemand {
  widthMm: number;
  window: RingWindow;
  /** 0 to 1. */
  leastShare: number;
  /** Of the rip saw; it is taken from the offcut's side. */
  kerfMm: number;
}

export interface Strip {
  /** Its edges, from the board's left edge as the end is drawn. */
  fromMm: number;
  toMm: number;
  /** Of its area within the window. */
  share: number;
  suits: boolean;
  leastDeg: number;
  greatestDeg: number;
  meanDeg: number;
  /** Where to rip: the edge of the strip, and the side that falls away. None where the strip is the whole board. */
  rips: Array<{ atMm: number; away: "left" | "right" }>;
  /** Width left over on either side, the kerf taken off. */
  leftMm: number;
  rightMm: number;
}

export type StripResult = { ok: true; strip: Strip } | { ok: false; why: string };

/** Columns a profile is taken in, and samples down each. */
const columnMm = 0.5;
const mostColumns = 1000;
const down = 24;
/** Shares closer than this count as alike: then fewer rips win, and then the angle nearest to the window's middle. */
const alike = 0.005;

/** Share of the end's area between two places across the width whose rings lie within a window. RangeError for an empty or outlying stretch. */
export function windowShare(field: RingField, fromMm: number, toMm: number, window: RingWindow): number {
  if (!(fromMm >= 0 && toMm <= field.widthMm && fromMm < toMm))
    throw new RangeError(`A stretch of the width runs from 0 to ${field.widthMm} mm; got ${fromMm} to ${toMm}.`);
  return profileOf(field, window).over(fromMm, toMm).share;
}

/**
 * The strip of a given width that suits a demand best: the one with the largest share of its area within the window; among such as are alike the one
 * that needs fewer rips, then the one whose mean angle is nearest to the middle of the window. It says itself whether it meets the share.
 *
 * @returns why not, when the board is narrower than the strip or the demand makes no sense.
 */
export function bestStrip(field: RingField, demand: StripDemand): StripResult {
  const why = demandProblem(field, demand);
  if (why) return { ok: false, why };
  const profile = profileOf(field, demand.window);
  const middle = (demand.window.leastDeg + demand.window.greatestDeg) / 2;
  const strips = placesFor(field, demand).map((fromMm) => stripAt(field, profile, fromMm, demand));
  const best = Math.max(...strips.map(({ share }) => share));
  const offMiddle = (strip: Strip) => Math.abs(strip.meanDeg - middle);
  const strip = strips
    .filter(({ share }) => share >= best - alike)
    .reduce((one, other) => {
      const rips = other.rips.length - one.rips.length;
      return rips < 0 || (rips === 0 && offMiddle(other) < offMiddle(one) - 1e-9) ? other : one;
    });
  return { ok: true, strip };
}

/** As many strips side by side as meet the demand, a kerf between them, from the left edge on. Empty where none does, or the demand makes no sense. */
export function suitingStrips(field: RingField, demand: StripDemand): Strip[] {
  if (demandProblem(field, demand)) return [];
  const profile = profileOf(field, demand.window);
  const strips: Strip[] = [];
  // Taking each as soon as it fits gives the most, all being equally wide.
  for (const fromMm of placesFor(field, demand)) {
    const last = strips.at(-1);
    if (last && fromMm < last.toMm + demand.kerfMm) continue;
    const strip = stripAt(field, profile, fromMm, demand);
    if (strip.suits) strips.push(strip);
  }
  return strips;
}

function demandProblem(field: RingField, { widthMm, window, leastShare, kerfMm }: StripDemand): string | null {
  if (!(widthMm > 0)) return "A strip's width must be above zero.";
  if (widthMm > field.widthMm) return `The board is ${field.widthMm} mm wide: too narrow for a strip of ${widthMm} mm.`;
  if (!(window.leastDeg >= 0 && window.greatestDeg <= 90 && window.leastDeg <= window.greatestDeg))
    return "A window of ring angles runs from 0 to 90 degrees, the lesser first.";
  if (!(leastShare >= 0 && leastShare <= 1)) return "A share is 0 to 1.";
  return kerfMm >= 0 ? null : "A kerf is not below zero.";
}

/** Left edges to try: every half millimetre, and flush right. */
function placesFor(field: RingField, { widthMm }: StripDemand): number[] {
  const room = field.widthMm - widthMm;
  const steps = Math.floor(room / columnMm);
  const places = Array.from({ length: steps + 1 }, (_, i) => i * columnMm);
  return room - steps * columnMm > 1e-9 ? [...places, room] : places;
}

function stripAt(field: RingField, profile: Profile, fromMm: number, demand: StripDemand): Strip {
  const toMm = Math.min(field.widthMm, fromMm + demand.widthMm);
  const inside = profile.over(fromMm, toMm);
  const rips: Strip["rips"] = [];
  if (fromMm > 0) rips.push({ atMm: fromMm, away: "left" });
  if (toMm < field.widthMm) rips.push({ atMm: toMm, away: "right" });
  return {
    fromMm,
    toMm,
    ...inside,
    suits: inside.share >= demand.leastShare - 1e-9,
    rips,
    leftMm: Math.max(0, fromMm - demand.kerfMm),
    rightMm: Math.max(0, field.widthMm - toMm - demand.kerfMm),
  };
}

interface Profile {
  over(fromMm: number, toMm: number): Pick<Strip, "share" | "leastDeg" | "greatestDeg" | "meanDeg">;
}

/** The rings column by column across the width. */
function profileOf(field: RingField, { leastDeg, greatestDeg }: RingWindow): Profile {
  const direction = ringDirection(field);
  const count = Math.min(mostColumns, Math.max(1, Math.ceil(field.widthMm / columnMm)));
  const columns = Array.from({ length: count }, (_, i) => {
    const angles = Array.from({ length: down }, (_, j) =>
      Math.abs(direction({ xMm: ((i + 0.5) / count) * field.widthMm, yMm: ((j + 0.5) / down) * field.thicknessMm })),
    );
    // A hair's breadth of rounding must not put an angle out that lies on the window's edge.
    const within = angles.filter((deg) => deg >= leastDeg - 1e-9 && deg <= greatestDeg + 1e-9).length;
    const sum = angles.reduce((total, deg) => total + deg, 0);
    return { within: within / down, mean: sum / down, least: Math.min(...angles), greatest: Math.max(...angles) };
  });
  return {
    over(fromMm, toMm) {
      const [from, to] = [(fromMm / field.widthMm) * count, (toMm / field.widthMm) * count];
      const total = { share: 0, leastDeg: 90, greatestDeg: 0, meanDeg: 0 };
      for (let i = Math.floor(from); i < Math.min(count, Math.ceil(to)); i++) {
        const column = columns[i]!;
        const weight = (Math.min(to, i + 1) - Math.max(from, i)) / (to - from);
        if (weight <= 0) continue;
        total.share += weight * column.within;
        total.meanDeg += weight * column.mean;
        total.leastDeg = Math.min(total.leastDeg, column.least);
        total.greatestDeg = Math.max(total.greatestDeg, column.greatest);
      }
      return total;
    },
  };
}
