/**
 * Shares an amount out by weight so that the shares are whole minor units and add up to it exactly: each gets its part rounded down, and the units
 * left over go to the largest remainders, the first of equals first.
 *
 * @param totalMinor what is shared, a whole number of minor units.
 * @param weights one per share, none negative; all zero shares equally.
 */
export function shareOut(totalMinor: number, weights: number[]): number[] {
  if (weights.length === 0) return [];
  const sum = weights.reduce((a, b) => a + b, 0);
  const exact = weights.map((weight) => (sum > 0 ? (totalMinor * weight) / sum : totalMinor / weights.length));
  const shares = exact.map(Math.floor);
  let left = totalMinor - shares.reduce((a, b) => a + b, 0);
  const byRemainder = exact
    .map((value, index) => ({ index, rest: value - Math.floor(value) }))
    .sort((a, b) => b.rest - a.rest || a.index - b.index);
  for (const { index } of byRemainder) {
    if (left <= 0) break;
    shares[index] = (shares[index] ?? 0) + 1;
    left -= 1;
  }
  return shares;
}
