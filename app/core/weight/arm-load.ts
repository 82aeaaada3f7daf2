import { requireWithin } from "#app/core/moisture/accepted-range.ts";
import type { TotalMass } from "./mass.ts";

/** A load beside the rating the shop entered. It never says that a rack is safe: that is for the rack's maker. */
export interface ArmLoad {
  massKg: number;
  ratedKg: number | null;
  /** Load over rating; null where no rating was entered. */
  shareOfRating: number | null;
  state: "no-rating" | "below-rating" | "near-rating" | "over-rating";
  words: string;
}

/** From this share of the rating up, a load is called near it: boards vary by more than a tenth. Our own choice. */
export const nearRating = 0.85;

const reminder = "Estimated weight; follow the rack maker's rating and check the wall anchors.";

/**
 * The mass on one level of the rack (in kg, from `totalMassKg`) against the rated capacity the shop entered for it.
 * RangeError for a negative mass or a rating that is not above zero.
 */
export function armLoad(load: TotalMass, ratedKg: number | null): ArmLoad {
  requireWithin("Load", load.massKg, 0, 1e6, "kg");
  const { massKg } = load;
  const unweighed = load.unknown > 0 ? ` ${load.unknown} not weighed: no density for the species.` : "";
  if (ratedKg === null) {
    return {
      massKg,
      ratedKg,
      shareOfRating: null,
      state: "no-rating",
      words: `No rating entered.${unweighed} ${reminder}`,
    };
  }
  requireWithin("Rated capacity", ratedKg, 1, 100_000, "kg");
  const shareOfRating = massKg / ratedKg;
  const state = shareOfRating > 1 ? "over-rating" : shareOfRating >= nearRating ? "near-rating" : "below-rating";
  const verdict = {
    "over-rating": "Over the rating entered: take boards off.",
    "near-rating": "Near the rating entered: add no more without weighing.",
    "below-rating": "Below the rating entered.",
  }[state];
  return { massKg, ratedKg, shareOfRating, state, words: `${verdict}${unweighed} ${reminder}` };
}

/**
 * The share of a pile that each of `count` evenly spaced arms bears when the outer two stand at the pile's ends and the
 * pile is stiff and even: reactions of a continuous beam, by the equation of three moments. Three arms bear 3/16, 5/8
 * and 3/16: the middle one far more than its even third. RangeError unless 2 to 20 arms.
 */
export function stiffPileShares(count: number): number[] {
  if (!Number.isInteger(count)) throw new RangeError(`Arms must be a whole number from 2 to 20; got ${count}.`);
  requireWithin("Arms", count, 2, 20);
  const moments = supportMoments(count);
  const spans = count - 1;
  return moments.map((moment, i) => {
    // Load and span length are taken as 1: each span hands half its load to either end, corrected by the end moments.
    const left = i > 0 ? 0.5 + (moments[i - 1]! - moment) : 0;
    const right = i < spans ? 0.5 + (moments[i + 1]! - moment) : 0;
    return (left + right) / spans;
  });
}

/** Bending moments over the supports for unit load and unit spans (hogging negative), ends free to turn. */
function supportMoments(count: number): number[] {
  const inner = count - 2;
  const diagonal = Array<number>(inner).fill(4);
  const right = Array<number>(inner).fill(-0.5);
  for (let i = 1; i < inner; i += 1) {
    diagonal[i]! -= 1 / diagonal[i - 1]!;
    right[i]! -= right[i - 1]! / diagonal[i - 1]!;
  }
  const moments = Array<number>(count).fill(0);
  for (let i = inner - 1; i >= 0; i -= 1) moments[i + 1] = (right[i]! - moments[i + 2]!) / diagonal[i]!;
  return moments;
}
