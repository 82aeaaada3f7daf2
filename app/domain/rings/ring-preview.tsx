import { Notice } from "#app/components/notice.tsx";
import { heartSide, hollowWhenDrying } from "#app/core/rings/heart-side.ts";
import { angleSummary, dominantClass } from "#app/core/rings/summary.ts";
import { EndDrawing } from "#app/domain/boards/end-drawing.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import type { ShownReading } from "./use-ring-marks.ts";

interface RingPreviewProps {
  shown: ShownReading | null;
  /** Why nothing can be read. */
  trouble: string | null;
  /** The reader is at work. */
  reading: boolean;
  strokes: number;
  species: string;
}

const sureStation = 0.6;

/** What is read so far: the end as it would be drawn, the angle at each station, and how sure that is. */
export function RingPreview({ shown, trouble, reading, strokes, species }: RingPreviewProps) {
  const { classLimits } = useShop();
  if (!shown)
    return (
      <Notice kind="caution">
        {trouble ??
          (reading ? "Reading the rings" : "Draw along a ring, from one edge of the board towards the other.")}
      </Notice>
    );
  const { field } = shown;
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
            className={`flex-1 text-center ${station.confidence < sureStation ? "text-ink-soft" : "font-semibold"}`}
          >
            {Math.round(station.angleDeg)}°
          </li>
        ))}
      </ol>
      <p className="mt-1">
        <strong>{ringClass}</strong>, {Math.round(least)}° to {Math.round(greatest)}°.{" "}
        <span className="text-ink-soft">
          {field.ringsPerInch ? `${field.ringsPerInch.toFixed(1)} rings to the inch. ` : ""}
          {heartWords(shown)}
        </span>
      </p>
      <SureWords shown={shown} strokes={strokes} />
    </div>
  );
}

function heartWords({ field }: ShownReading): string {
  const side = heartSide(field);
  const hollow = hollowWhenDrying(field);
  if (side === "inside") return "The pith is in the board.";
  if (!side) return "";
  return `Heart side ${side === "top" ? "up" : "down"}${hollow ? `; drying, the ${hollow} face goes hollow` : ""}.`;
}

function SureWords({ shown, strokes }: { shown: ShownReading; strokes: number }) {
  if (shown.sure)
    return <p className="text-ink-soft">{shown.from === "photo" ? "The reader is sure." : "The marks agree."}</p>;
  const ask =
    shown.from === "photo"
      ? "Not sure. Look at the green rings: draw along two or three real ones where they are wrong."
      : strokes < 3
        ? "Draw another ring, further along the width, to be surer."
        : "The strokes do not agree well: check the corners, undo a stroke.";
  return (
    <Notice kind="caution" title={ask} className="mt-2">
      {shown.doubts.length > 0 ? shown.doubts.join(" ") : null}
    </Notice>
  );
}
