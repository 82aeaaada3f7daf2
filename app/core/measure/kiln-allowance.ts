import { requireWithin } from "#app/core/moisture/accepted-range.ts";

/** What lumber measured green loses in the kiln, mostly in width, percent of the gross tally. Common practice, no source. */
export const kilnAllowancePct = { usual: 7, least: 6, most: 8 } as const;

const most = 1e9;

/** Net tally, after the kiln, of a gross one; any unit of volume. */
export function netFromGross(gross: number, allowancePct: number = kilnAllowancePct.usual): number {
  return (requireWithin("A tally", gross, 0, most) * (100 - requireAllowance(allowancePct))) / 100;
}

/** Gross tally, before the kiln, that leaves a net one; any unit of volume. */
export function grossFromNet(net: number, allowancePct: number = kilnAllowancePct.usual): number {
  return (requireWithin("A tally", net, 0, most) * 100) / (100 - requireAllowance(allowancePct));
}

function requireAllowance(allowancePct: number): number {
  return requireWithin("A kiln allowance", allowancePct, 0, 50, "%");
}
