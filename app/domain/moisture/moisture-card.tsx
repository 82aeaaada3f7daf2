import { Card } from "#app/components/card.tsx";
import { When } from "#app/components/when.tsx";
import type { MoistureReading } from "./moisture.sql.server.ts";

/** A board's readings: how they went over time, then each in words. */
export function MoistureCard({ readings }: { readings: MoistureReading[] }) {
  const newest = [...readings].reverse();
  return (
    <Card
      title="Moisture"
      aside={readings.length > 0 ? `${readings.length} ${readings.length === 1 ? "reading" : "readings"}` : null}
    >
      {readings.length === 0 ? (
        <p className="text-ink-soft">Not metered yet. Two readings a week apart tell whether it is still drying.</p>
      ) : null}
      {readings.length > 1 ? <MoisturePlot readings={readings} /> : null}
      <ul className="mt-3 grid gap-1.5">
        {newest.slice(0, 6).map((reading) => (
          <li key={reading.id} className="flex flex-wrap justify-between gap-x-4">
            <span>
              <strong className="font-mono">{reading.moisturePct.toFixed(1)} %</strong> {reading.meter}
              {reading.place ? `, ${reading.place}` : ""}
            </span>
            <span className="text-ink-soft">
              {reading.readBy}, <When at={reading.readAt} />
            </span>
          </li>
        ))}
      </ul>
    </Card>
  );
}

const plot = { width: 640, height: 180, left: 44, right: 12, top: 10, bottom: 26 };

/** Moisture against time. The figures are in the list below, so the drawing is only described. */
function MoisturePlot({ readings }: { readings: MoistureReading[] }) {
  const times = readings.map((reading) => reading.readAt.getTime());
  const first = Math.min(...times);
  const span = Math.max(86_400_000, Math.max(...times) - first);
  const values = readings.map((reading) => reading.moisturePct);
  const low = Math.floor(Math.min(...values) - 1);
  const high = Math.ceil(Math.max(...values) + 1);
  const x = (time: number) => plot.left + ((time - first) / span) * (plot.width - plot.left - plot.right);
  const y = (pct: number) => plot.top + ((high - pct) / (high - low)) * (plot.height - plot.top - plot.bottom);
  const step = Math.max(1, Math.ceil((high - low) / 5));
  const ticks = Array.from({ length: Math.floor((high - low) / step) + 1 }, (_, i) => low + i * step);
  const line = readings
    .map((reading) => `${x(reading.readAt.getTime()).toFixed(1)},${y(reading.moisturePct).toFixed(1)}`)
    .join(" ");
  return (
    <svg
      viewBox={`0 0 ${plot.width} ${plot.height}`}
      className="w-full"
      role="img"
      aria-label={`Moisture from ${values[0]} to ${values.at(-1)} percent`}
    >
      {ticks.map((tick) => (
        <g key={tick}>
          <path d={`M${plot.left} ${y(tick)}H${plot.width - plot.right}`} stroke="currentColor" opacity="0.15" />
          <text
            x={plot.left - 8}
            y={y(tick) + 4}
            textAnchor="end"
            fontSize="13"
            fill="currentColor"
            className="font-mono"
          >
            {tick} %
          </text>
        </g>
      ))}
      <polyline points={line} fill="none" stroke="currentColor" strokeWidth="2" opacity="0.55" />
      {readings.map((reading) => (
        <circle
          key={reading.id}
          cx={x(reading.readAt.getTime())}
          cy={y(reading.moisturePct)}
          r="4.5"
          className="fill-action"
        />
      ))}
    </svg>
  );
}
