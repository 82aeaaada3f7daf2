import { Figures } from "#app/components/figures.tsx";
import { Plot, PlotDot, roundTicks } from "#app/components/plot.tsx";
import { printTemperature, shopDegrees, temperatureUnit } from "#app/domain/moisture/temperature.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import type { MeterAnswer } from "./meter.ts";

/** The corrected figure, and how it hangs on the wood's temperature. */
export function MeterResult({ answer }: { answer: MeterAnswer }) {
  const { units } = useShop();
  const { corrected, readingPct, woodC } = answer;
  const points = corrected.correctionPct;
  return (
    <Figures
      title="Corrected"
      main={{ label: "Moisture", value: `${corrected.moisturePct.toFixed(1)} %` }}
      drawing={answer.curve.length > 0 ? <CorrectionPlot answer={answer} /> : null}
      rows={[
        { label: "The meter says", value: `${readingPct} %` },
        {
          label: "Correction",
          value: `${points > 0 ? "+" : points < 0 ? "−" : ""}${Math.abs(points).toFixed(1)} points`,
        },
        { label: "Wood", value: woodC === null ? "temperature not taken" : printTemperature(woodC, units) },
      ]}
      beyond={[corrected.outsideRange]}
    >
      <p className="mt-3 text-ink-soft">{corrected.explanation}</p>
    </Figures>
  );
}

function CorrectionPlot({ answer: { curve, corrected, woodC, readingPct } }: { answer: MeterAnswer }) {
  const { units } = useShop();
  const points = curve.map(([celsius, pct]) => [shopDegrees(celsius, units), pct] as const);
  const [from, to] = [points[0]?.[0] ?? 0, points.at(-1)?.[0] ?? 1];
  const values = points.map(([, pct]) => pct);
  const [low, high] = [Math.floor(Math.min(...values)) - 1, Math.ceil(Math.max(...values)) + 1];
  const wood = woodC === null ? null : Math.min(to, Math.max(from, shopDegrees(woodC, units)));
  return (
    <Plot
      x={{
        from,
        to,
        ticks: roundTicks(from, to, 6),
        print: (tick) => `${tick}°`,
        label: `Temperature of the wood, ${temperatureUnit(units)}`,
      }}
      y={{
        from: low,
        to: high,
        ticks: roundTicks(low, high),
        print: (tick) => `${tick} %`,
        label: `What a reading of ${readingPct} % means`,
      }}
      label="Corrected reading against the temperature of the wood"
      marks={
        wood === null ? [] : [{ x: wood, y: corrected.moisturePct, text: `${corrected.moisturePct.toFixed(1)} %` }]
      }
    >
      {({ x, y, line }) => (
        <>
          <path
            d={`M0 ${y(readingPct)}H1000`}
            stroke="currentColor"
            strokeDasharray="6 6"
            opacity="0.6"
            vectorEffect="non-scaling-stroke"
          />
          <path
            d={line(points)}
            fill="none"
            className="stroke-action"
            strokeWidth="3"
            vectorEffect="non-scaling-stroke"
          />
          {wood === null ? null : <PlotDot x={x(wood)} y={y(corrected.moisturePct)} />}
        </>
      )}
    </Plot>
  );
}
