import { useShop } from "#app/domain/shop/shop-view.tsx";
import { correctedReading } from "./corrected-reading.ts";
import { moistureForm } from "./moisture.schema.ts";

/** What a reading will be kept as, and why, while it is being typed. Nothing until the figures make sense. */
export function CorrectionPreview({ typed }: { typed: Record<"meterPct" | "meter" | "woodTemperatureC", string> }) {
  const { units } = useShop();
  const read = moistureForm(units).safeParse(typed);
  if (!read.success || typed.meterPct.trim() === "") return null;
  const { moisturePct, explanation, outsideRange } = correctedReading(read.data);
  return (
    <p aria-live="polite">
      Kept as <strong className="font-mono">{moisturePct.toFixed(1)} %</strong>, with the meter's {read.data.meterPct} %
      beside it. <span className="text-ink-soft">{explanation}</span>{" "}
      {outsideRange ? <span className="font-semibold text-caution">{outsideRange}</span> : null}
    </p>
  );
}
