/** Slowest and fastest approach considered, as days to close half the gap: 12/4 in the open air to veneer indoors. */
const halfLifeDays = { shortest: 1, longest: 400 };

/** One curve M(t) = equilibrium + gap x exp(-rate x t), in percent and days. */
export interface Curve {
  equilibriumPct: number;
  gapPct: number;
  ratePerDay: number;
}

/** Moisture on the curve at a day, percent. */
export function curveAt({ equilibriumPct, gapPct, ratePerDay }: Curve, day: number): number {
  return equilibriumPct + gapPct * Math.exp(-ratePerDay * day);
}

/** `count` rates per day, evenly spread on a logarithmic scale from the slowest to the fastest. */
export function rateGrid(count: number): number[] {
  const slow = Math.log(Math.LN2 / halfLifeDays.longest);
  const fast = Math.log(Math.LN2 / halfLifeDays.shortest);
  return Array.from({ length: count }, (_, i) => Math.exp(slow + ((fast - slow) * i) / (count - 1)));
}

/** Sums of a weighted fit of the gap at one rate: the best gap, its information, and the weighted squares left over. */
export function fitGap(
  days: readonly number[],
  abovePct: readonly number[],
  weights: readonly number[],
  ratePerDay: number,
): { gapPct: number; information: number; squares: number } {
  let information = 0;
  let product = 0;
  let total = 0;
  for (let i = 0; i < days.length; i += 1) {
    const decay = Math.exp(-ratePerDay * days[i]!);
    information += weights[i]! * decay * decay;
    product += weights[i]! * decay * abovePct[i]!;
    total += weights[i]! * abovePct[i]! ** 2;
  }
  const gapPct = product / information;
  return { gapPct, information, squares: Math.max(0, total - gapPct * product) };
}
