import { Card } from "#app/components/card.tsx";
import { Facts } from "#app/components/facts.tsx";
import { printQuarters } from "#app/core/lengths/quarters.ts";
import type { ClaimCompared } from "#app/core/measure/claim.ts";
import type { Tally } from "#app/core/measure/tally.ts";
import { printMoney } from "#app/domain/shop/money.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import { printVolume } from "./delivery-cost.ts";
import type { LotGroup } from "./lot-measure.ts";

interface ClaimCardProps {
  measured: Omit<Tally, "lines">;
  groups: LotGroup[];
  claim: ClaimCompared | null;
}

/** What was claimed against what was measured: drawn as two bars, then in volume, percent and money. */
export function ClaimCard({ measured, groups, claim }: ClaimCardProps) {
  const { currency } = useShop();
  return (
    <Card title="Claimed against measured">
      {claim ? <Bars claim={claim} /> : <p className="text-ink-soft">The papers claim no volume.</p>}
      <Facts
        rows={[
          { label: "Measured, as the trade tallies", value: printVolume(measured.boardFeet, "bf") },
          { label: "The same unrounded", value: printVolume(measured.unroundedBoardFeet, "bf") },
          { label: "In cubic metres", value: printVolume(measured.volumeM3, "m3") },
          ...(claim
            ? [
                { label: "Difference", value: differenceWords(claim) },
                {
                  label: "In money, freight apart",
                  value:
                    claim.differenceMinor === null ? "no price given" : moneyWords(claim.differenceMinor, currency),
                },
              ]
            : []),
          ...(groups.length > 1
            ? groups.map((group) => ({
                label: `${group.measured.count} × ${printQuarters(group.quarters)} ${speciesName(group.species)}`,
                value: printVolume(group.measured.boardFeet, "bf"),
              }))
            : []),
        ]}
      />
      <p className="mt-2 text-ink-soft text-sm">
        As hardwood is tallied: lengths down to whole feet, the surface of each board in whole square feet, halves up
        and down in turn, times the nominal thickness. Offcuts count with the board they came from.
      </p>
    </Card>
  );
}

/** "12 bf short (−5.7 %)". */
export function differenceWords({ differenceVolume, differencePct, unit }: ClaimCompared): string {
  if (Math.abs(differencePct) < 0.05) return "none";
  const sign = differenceVolume < 0 ? "−" : "+";
  const words = differenceVolume < 0 ? "short" : "over";
  return `${printVolume(Math.abs(differenceVolume), unit)} ${words} (${sign}${Math.abs(differencePct).toFixed(1)} %)`;
}

/** "$482.65 paid for wood that is not there". */
function moneyWords(minor: number, currency: string): string {
  if (minor === 0) return "none";
  const amount = printMoney(Math.abs(minor), currency);
  return minor < 0 ? `${amount} paid for wood that is not there` : `${amount} of wood not paid for`;
}

function Bars({ claim }: { claim: ClaimCompared }) {
  const most = Math.max(claim.claimedVolume, claim.measuredVolume) || 1;
  const bar = (label: string, volume: number, fill: string) => (
    <div className="grid grid-cols-[5.5rem_minmax(0,1fr)_6.5rem] items-center gap-2">
      <span className="text-ink-soft text-sm">{label}</span>
      <span className="h-4 rounded-sm bg-sunk">
        <span className={`block h-4 rounded-sm ${fill}`} style={{ width: `${(volume / most) * 100}%` }} />
      </span>
      <span className="text-right font-mono text-sm">{printVolume(volume, claim.unit)}</span>
    </div>
  );
  return (
    <div className="mb-3 grid gap-1.5">
      {bar("Claimed", claim.claimedVolume, "bg-line-strong")}
      {bar("Measured", claim.measuredVolume, "bg-action")}
    </div>
  );
}
