import { Figures } from "#app/components/figures.tsx";
import { Plot, PlotDot, type PlotMark } from "#app/components/plot.tsx";
import { printTemperature } from "#app/domain/moisture/temperature.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import type { AirAnswer } from "./air.ts";

/** The curve of moisture against humidity at one temperature, with what was asked marked on it. */
export function AirResult({ answer }: { answer: AirAnswer }) {
  const { units } = useShop();
  const { settles, means, shop } = answer;
  const at = printTemperature(answer.temperatureC, units);
  const rows = [
    ...(means
      ? [
          {
            label: `Air that holds wood at ${means.moisturePct} %`,
            value: `${means.humidityPct.toFixed(0)} % humidity`,
          },
        ]
      : []),
    {
      label: "This shop's target",
      value: `${shop.targetPct.toFixed(1)} % ± ${shop.tolerancePct}`,
    },
  ];
  return (
    <Figures
      title={`At ${at}`}
      main={
        settles
          ? {
              label: `Wood settles in air of ${settles.humidityPct} % at`,
              value: `${settles.moisturePct.toFixed(1)} %`,
            }
          : {
              label: `${means?.moisturePct} % in wood means air of`,
              value: `${means?.humidityPct.toFixed(0)} % humidity`,
            }
      }
      drawing={<AirPlot answer={answer} />}
      rows={settles ? rows : rows.slice(1)}
      beyond={[settles?.outsideRange, means?.outsideRange]}
    >
      <p className="mt-3 text-ink-soft">
        One curve serves all species. Wood that is drying stops 1 to 2 points above this, wood that is taking up
        moisture comes to it from below.
      </p>
    </Figures>
  );
}

function AirPlot({ answer: { curve, settles, means, shop } }: { answer: AirAnswer }) {
  const points = [settles, means].filter((point) => point !== null);
  const shown = curve.filter(([, moisture]) => moisture <= 30);
  const top = 30;
  const marks: PlotMark[] = points.map(({ humidityPct, moisturePct }) => ({
    x: humidityPct,
    y: Math.min(top, moisturePct),
    text: `${humidityPct.toFixed(0)} % air, ${moisturePct.toFixed(1)} % wood`,
    side: moisturePct > 24 ? "below" : "above",
  }));
  return (
    <Plot
      x={{
        from: 0,
        to: 100,
        ticks: [0, 25, 50, 75, 100],
        print: (tick) => `${tick} %`,
        label: "Relative humidity of the air",
      }}
      y={{
        from: 0,
        to: top,
        ticks: [0, 6, 12, 18, 24, 30],
        print: (tick) => `${tick} %`,
        label: "Moisture of the wood; the shaded band is this shop's target",
      }}
      label="Moisture of wood against humidity of the air"
      marks={marks}
    >
      {({ x, y, line }) => (
        <>
          <rect
            x="0"
            width="1000"
            y={y(shop.targetPct + shop.tolerancePct)}
            height={y(0) - y(2 * shop.tolerancePct)}
            className="fill-good"
            opacity="0.16"
          />
          <path
            d={line(shown)}
            fill="none"
            className="stroke-action"
            strokeWidth="3"
            vectorEffect="non-scaling-stroke"
          />
          {points.map(({ humidityPct, moisturePct }) => (
            <g key={humidityPct}>
              <path
                d={`M${x(humidityPct)} 1000V${y(Math.min(top, moisturePct))}H0`}
                fill="none"
                stroke="currentColor"
                opacity="0.5"
                strokeDasharray="5 5"
                vectorEffect="non-scaling-stroke"
              />
              <PlotDot x={x(humidityPct)} y={y(Math.min(top, moisturePct))} />
            </g>
          ))}
        </>
      )}
    </Plot>
  );
}
