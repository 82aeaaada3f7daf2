import { Notice } from "#app/components/notice.tsx";
import type { StrokesResult } from "#app/core/rings/strokes.ts";
import { angleSummary, dominantClass } from "#app/core/rings/summary.ts";
import { EndDrawing } from "#app/domain/boards/end-drawing.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";

interface RingPreviewProps {
  reading: StrokesResult;
  strokes: number;
  species: string;
}

const sureFrom = 0.6;

/** What the marks say so far: the end as it would be drawn, with the angle at each station. */
export function RingPreview({ reading, strokes, species }: RingPreviewProps) {
  const { classLimits } = useShop();
  if (!reading.ok) return <Notice kind="caution">{reading.why}</Notice>;
  const { field, confidence } = reading.reading;
  const ringClass = dominantClass(field, classLimits);
  const { least, greatest } = angleSummary(field);
  const width = 900;
  const height = (width * field.thicknessMm) / field.widthMm;
  return (
    <div aria-live="polite">
      <svg viewBox={`0 0 ${width} ${height}`} className="block h-auto w-full" role="presentation">
        <EndDrawing
          board={{ species, ...field, rings: field, ringClass, ringMinDeg: least, ringMaxDeg: greatest }}
          width={width}
          height={height}
        />
      </svg>
      <ol
        className="mt-1 flex justify-between font-mono text-sm"
        aria-label="Ring angle across the width, left to right"
      >
        {field.stations.map((station) => (
          <li
            key={station.position}
            className={`flex-1 text-center ${station.confidence < sureFrom ? "text-ink-soft" : "font-semibold"}`}
          >
            {Math.round(station.angleDeg)}°
          </li>
        ))}
      </ol>
      <p className="mt-1">
        <strong>{ringClass}</strong>, {Math.round(least)}° to {Math.round(greatest)}°.{" "}
        {confidence < sureFrom ? (
          <span className="text-caution">
            {strokes < 3
              ? "Draw another ring, further along the width, to be surer."
              : "The strokes do not agree well: check the corners, undo a stroke."}
          </span>
        ) : (
          <span className="text-ink-soft">The strokes agree.</span>
        )}
      </p>
    </div>
  );
}
