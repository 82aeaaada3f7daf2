import type { Unrolled } from "#app/core/endgrain/unroll.ts";

/** A swing of the profile counts as a ring when it goes this many standard deviations below and above its mean. */
const SWING = 0.4;
/** Fewest rings in a row of levels for their distance to mean something. */
const FEWEST_RINGS = 2;

/**
 * Mean distance between rings, in levels, from the unrolled profile: in each sector the dark-to-light swings are counted, with
 * a dead band so that pores and noise inside a ring count for nothing. The median over sectors, each counted by its length.
 * @returns null when no sector shows three swings or more.
 */
export function ringPitch(u: Unrolled, profile: { mean: Float32Array; weight: Float32Array }): number | null {
  const found: { pitch: number; length: number }[] = [];
  for (let sector = 0; sector < u.sectors; sector++) {
    const base = sector * u.levels;
    let heaviest = 0;
    for (let i = 0; i < u.levels; i++) heaviest = Math.max(heaviest, profile.weight[base + i]!);
    let square = 0;
    let count = 0;
    for (let i = 0; i < u.levels; i++) {
      if (profile.weight[base + i]! < heaviest / 4) continue;
      square += profile.mean[base + i]! ** 2;
      count++;
    }
    if (count < 8) continue;
    const band = SWING * Math.sqrt(square / count);
    let dark = false;
    let first = -1;
    let last = -1;
    let swings = 0;
    for (let i = 0; i < u.levels; i++) {
      if (profile.weight[base + i]! < heaviest / 4) continue;
      const value = profile.mean[base + i]!;
      if (value < -band) dark = true;
      else if (value > band && dark) {
        dark = false;
        if (swings === 0) first = i;
        last = i;
        swings++;
      }
    }
    if (swings > FEWEST_RINGS) found.push({ pitch: (last - first) / (swings - 1), length: last - first });
  }
  found.sort((a, b) => a.pitch - b.pitch);
  const half = found.reduce((sum, row) => sum + row.length, 0) / 2;
  let passed = 0;
  for (const row of found) {
    passed += row.length;
    if (passed >= half) return row.pitch;
  }
  return null;
}
