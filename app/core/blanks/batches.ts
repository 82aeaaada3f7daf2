import { requireWithin } from "#app/core/moisture/accepted-range.ts";
import { requireWhole } from "./whole-number.ts";

export interface BlankToGlue {
  id: string;
  clamps: number;
  /** How long this one stays in clamps, when it is not as long as the rest: a dense wood, another glue. */
  clampMinutes?: number;
}

export interface GlueBatch {
  ids: string[];
  clamps: number;
  /** Minutes from the first batch's start. */
  startsMinute: number;
  /** When it may come out of the clamps. */
  outMinute: number;
}

/**
 * Which blanks go into clamps together: the largest first, each in the first batch that has clamps left for it; one batch after another, as the clamps
 * come free; a batch stays as long as its slowest blank. First fit decreasing: at most about a fifth more batches than the fewest possible (Johnson, 1973; from memory).
 *
 * @param spreadMinutes to spread glue and close the clamps of a batch, before the next can begin.
 * @returns the batches, and blanks that need more clamps than the shop owns.
 * @throws RangeError for clamps that are no whole number, or minutes that are none.
 */
export function glueBatches(
  blanks: readonly BlankToGlue[],
  clampsOwned: number,
  clampMinutes: number,
  spreadMinutes = 0,
): { batches: GlueBatch[]; tooMany: string[] } {
  requireWhole("Clamps", clampsOwned, 0, 10_000);
  requireWithin("Minutes in clamps", clampMinutes, 1, 100_000);
  requireWithin("Minutes to spread", spreadMinutes, 0, 10_000);
  for (const blank of blanks) {
    requireWhole("Clamps of a blank", blank.clamps, 1, 10_000);
    requireWithin("Minutes in clamps of a blank", blank.clampMinutes ?? clampMinutes, 1, 100_000);
  }
  const tooMany = blanks.filter((blank) => blank.clamps > clampsOwned).map((blank) => blank.id);
  const loads: { ids: string[]; clamps: number; minutes: number }[] = [];
  const order = blanks.map((blank, index) => ({ ...blank, index })).filter((blank) => blank.clamps <= clampsOwned);
  for (const blank of order.sort((a, b) => b.clamps - a.clamps || a.index - b.index)) {
    const minutes = blank.clampMinutes ?? clampMinutes;
    const load = loads.find(({ clamps }) => clamps + blank.clamps <= clampsOwned);
    if (load) {
      load.ids.push(blank.id);
      load.clamps += blank.clamps;
      load.minutes = Math.max(load.minutes, minutes);
    } else loads.push({ ids: [blank.id], clamps: blank.clamps, minutes });
  }
  let startsMinute = 0;
  const batches = loads.map(({ ids, clamps, minutes }) => {
    const batch = { ids, clamps, startsMinute, outMinute: startsMinute + spreadMinutes + minutes };
    startsMinute = batch.outMinute;
    return batch;
  });
  return { batches, tooMany };
}
