import { Figures } from "#app/components/figures.tsx";
import type { VolumeUnit } from "#app/core/measure/volume-units.ts";
import { printMoney } from "#app/domain/shop/money.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import type { ClaimAnswer } from "./claim.ts";

/** The difference first, in volume and money; then what it is made of. */
export function ClaimResult({ answer: { compared, tally, isGross, beyond } }: { answer: ClaimAnswer }) {
  const { currency } = useShop();
  const { unit, differenceVolume, differencePct, chargedMinor, differenceMinor } = compared;
  const missing = differenceVolume < 0;
  const size = volume(Math.abs(differenceVolume), unit);
  const percent = `${Math.abs(differencePct).toFixed(1)} %`;
  return (
    <Figures
      title="The lot against its claim"
      main={{
        label: missing ? "Less than was claimed" : "More than was claimed",
        value: Math.abs(differencePct) < 0.05 ? "as claimed" : `${size}, ${percent}`,
      }}
      drawing={<Bars answer={{ compared, tally, isGross, beyond }} />}
      rows={[
        { label: "Claimed", value: volume(compared.claimedVolume, unit) },
        ...(isGross ? [{ label: "To be expected after the kiln", value: volume(compared.expectedVolume, unit) }] : []),
        { label: `Measured, ${tally.count} boards`, value: volume(compared.measuredVolume, unit) },
        ...(unit === "bf"
          ? [{ label: "Measured, nothing rounded", value: volume(tally.unroundedBoardFeet, "bf") }]
          : []),
        ...(chargedMinor === null ? [] : [{ label: "Charged", value: printMoney(chargedMinor, currency) }]),
        ...(differenceMinor === null
          ? []
          : [
              {
                label: missing ? "Charged for wood that is not there" : "Wood not charged for",
                value: printMoney(Math.abs(differenceMinor), currency),
              },
            ]),
      ]}
      beyond={beyond}
    />
  );
}

function volume(value: number, unit: VolumeUnit): string {
  return unit === "bf" ? `${Number(value.toFixed(2))} bf` : `${value.toFixed(4)} m³`;
}

/** Claimed, expected and measured as bars from one line. */
function Bars({ answer: { compared, isGross } }: { answer: ClaimAnswer }) {
  const bars = [
    { name: "claimed", value: compared.claimedVolume },
    ...(isGross ? [{ name: "expected", value: compared.expectedVolume }] : []),
    { name: "measured", value: compared.measuredVolume },
  ];
  const most = Math.max(...bars.map(({ value }) => value));
  return (
    <div className="grid gap-1.5" aria-hidden="true">
      {bars.map(({ name, value }) => (
        <div key={name} className="grid grid-cols-[5.5rem_1fr] items-center gap-2">
          <span className="text-ink-soft">{name}</span>
          <span
            className="h-6 rounded-sm border border-[#5b4a33] bg-[#e2c79b]"
            style={{ width: `${(value / most) * 100}%` }}
          />
        </div>
      ))}
    </div>
  );
}
