/** Greatest whole number that divides both; of 0 and a number, the number. */
export function greatestDivisor(a: number, b: number): number {
  let [x, y] = [a, b];
  while (y > 0) [x, y] = [y, x % y];
  return x;
}
