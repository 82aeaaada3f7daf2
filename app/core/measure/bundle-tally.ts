import { mmPerInch } from "#app/core/lengths/length-unit.ts";
import { alternatingRounder } from "./alternating-rounder.ts";
import { tallyWidthMm } from "./measured-board.ts";
import { boardFeet, wholeFeet } from "./surface-measure.ts";
import { requireCount, type TallyLine } from "./tally.ts";

/** What a bundle comes to when counted by the widths of its ends. */
export interface BundleTally {
  count: number;
  /** Sum of the widths, each a whole number of inches. */
  widthIn: number;
  /** Sum of width x whole feet / 12, not rounded. */
  surfaceFt2: number;
  boardFeet: number;
}

/**
 * The export or end tally: widths to the nearest inch, exact half inches alternately up and down, lengths down to whole
 * feet. AHEC, Measurement [confirmed]. Half inches alternate among boards of one thickness and length, which is how
 * bundles are made up. It differs from surface measure, which governs where the two disagree (NHLA Rules Corner).
 *
 * @throws RangeError for a size, quarters or count that is none.
 */
export function bundleTally(lines: readonly TallyLine[]): BundleTally {
  const rounders = new Map<string, (value: number) => number>();
  const total: BundleTally = { count: 0, widthIn: 0, surfaceFt2: 0, boardFeet: 0 };
  for (const line of lines) {
    const feet = wholeFeet(line.lengthMm);
    const bundle = `${line.quarters}/4 ${feet}`;
    const round = rounders.get(bundle) ?? alternatingRounder();
    rounders.set(bundle, round);
    const count = requireCount(line.count ?? 1);
    let widthIn = 0;
    for (let board = 0; board < count; board++) widthIn += round(tallyWidthMm(line) / mmPerInch);
    const surface = (widthIn * feet) / 12;
    total.count += count;
    total.widthIn += widthIn;
    total.surfaceFt2 += surface;
    total.boardFeet += boardFeet(surface, line.quarters);
  }
  return total;
}
