import { Plot, PlotDot, type PlotMark, roundTicks } from "#app/components/plot.tsx";
import { printDay } from "#app/components/when.tsx";
import { dateOf, type ReadyView } from "./ready.ts";
import { readyWords } from "./ready-words.ts";

/**
 * Moisture over time: readings as dots, the target as a band, the curves that the readings leave possible as a pale
 * strip round their middle, and the likely day marked. Without a fit only the dots and the band are drawn.
 */
export function ReadyPlot({ view, today }: { view: ReadyView; today?: number | null }) {
  const { readings, ahead, band, emcPct, readyDay, lastDay } = view;
  const values = readings.map(({ moisturePct }) => moisturePct);
  const low = Math.max(0, Math.floor(Math.min(...values, band.lowPct, emcPct) - 1));
  const high = Math.ceil(Math.max(...values, band.highPct, emcPct) + 1);
  const isTodayShown = today != null && today <= lastDay;
  const marks: PlotMark[] = readyDay
    ? [{ x: readyDay.likely, y: high, text: dayLabel(view, readyDay.likely), side: "below" }]
    : [];
  return (
    <Plot
      x={{
        from: 0,
        to: lastDay,
        ticks: view.startsAt ? [0, lastDay] : roundTicks(0, lastDay, 4),
        print: (day) => dayLabel(view, day),
        label: view.startsAt ? (isTodayShown ? "Today is dashed" : "") : "Days from the first reading",
      }}
      y={{
        from: low,
        to: high,
        ticks: roundTicks(low, high, 5),
        print: (tick) => `${tick} %`,
        label: `Moisture; the shaded band is the target, ${band.lowPct.toFixed(1)} to ${band.highPct.toFixed(1)} %`,
      }}
      label={`${readings.length} readings from ${values[0] ?? 0} to ${values.at(-1) ?? 0} percent. ${readyWords(view).headline}.`}
      marks={marks}
    >
      {({ x, y, line }) => {
        const back = ahead.toReversed();
        return (
          <>
            <rect
              x="0"
              width="1000"
              y={y(band.highPct)}
              height={y(band.lowPct) - y(band.highPct)}
              className="fill-good"
              opacity="0.18"
            />
            {ahead.length > 0 ? (
              <>
                <path
                  d={`${line([...ahead.map(({ day, highPct }) => [day, highPct] as const), ...back.map(({ day, lowPct }) => [day, lowPct] as const)])}Z`}
                  fill="currentColor"
                  opacity="0.1"
                />
                <path
                  d={line(ahead.map(({ day, middlePct }) => [day, middlePct] as const))}
                  fill="none"
                  stroke="currentColor"
                  strokeWidth="2"
                  opacity="0.6"
                  vectorEffect="non-scaling-stroke"
                />
              </>
            ) : null}
            {readyDay ? (
              <>
                <rect
                  x={x(readyDay.earliest)}
                  width={x(readyDay.latest) - x(readyDay.earliest)}
                  y="0"
                  height="1000"
                  className="fill-action"
                  opacity="0.1"
                />
                <path
                  d={`M${x(readyDay.likely)} 0V1000`}
                  className="stroke-action"
                  strokeWidth="2.5"
                  vectorEffect="non-scaling-stroke"
                />
              </>
            ) : null}
            {isTodayShown ? (
              <path
                d={`M${x(today)} 0V1000`}
                stroke="currentColor"
                opacity="0.5"
                strokeDasharray="4 5"
                vectorEffect="non-scaling-stroke"
              />
            ) : null}
            {readings.map(({ day, moisturePct, isDoubted }) => (
              <PlotDot
                key={day}
                x={x(day)}
                y={y(moisturePct)}
                className={isDoubted ? "stroke-caution" : "stroke-action"}
              />
            ))}
          </>
        );
      }}
    </Plot>
  );
}

function dayLabel(view: ReadyView, day: number): string {
  const date = dateOf(view, day);
  return date ? printDay(date) : String(Math.round(day));
}
