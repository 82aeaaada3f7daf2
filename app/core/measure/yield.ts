import { requireWithin } from "#app/core/moisture/accepted-range.ts";

const most = 1e9;

/** Parts as percent of the rough boards they came from; both in one unit of volume. */
export function yieldPct(net: number, gross: number): number {
  requireWithin("The rough boards' measure", gross, 1e-6, most);
  return (requireWithin("The parts' measure", net, 0, gross) / gross) * 100;
}

/** Rough measure to buy for a net one at an expected yield of 1 to 100 percent. */
export function grossForYield(net: number, expectedYieldPct: number): number {
  return (
    (requireWithin("The parts' measure", net, 0, most) * 100) / requireWithin("Yield", expectedYieldPct, 1, 100, "%")
  );
}
