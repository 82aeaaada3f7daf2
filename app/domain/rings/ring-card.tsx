import { href, Link } from "react-router";
import { Card } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { When } from "#app/components/when.tsx";
import { compareEnds, fieldAlong } from "#app/core/rings/along-board.ts";
import type { RingField } from "#app/core/rings/ring-types.ts";
import { angleSummary, classShares } from "#app/core/rings/summary.ts";
import type { Board } from "#app/domain/boards/board.ts";
import { EndDrawing } from "#app/domain/boards/end-drawing.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { type BoardEndName, boardEnds, type RingReading, readingWords } from "./reading.ts";

interface RingCardProps {
  board: Board;
  readings: Partial<Record<BoardEndName, RingReading>>;
  mayRead: boolean;
}

/** What the rings do across the width, at each end that has been read: drawn, with the angle at every station, in shares, and how it was read. */
export function RingCard({ board, readings, mayRead }: RingCardProps) {
  const set = mayRead ? (
    <Link
      to={href("/boards/:boardId/rings/by-eye", { boardId: board.id })}
      className="inline-flex min-h-11 items-center text-link underline-offset-4 hover:underline"
      data-screen-only
    >
      Set the angle by eye
    </Link>
  ) : null;
  return (
    <Card title="End grain, read across the width" aside={set}>
      {!readings.near && !readings.far ? (
        <p className="text-ink-soft">
          Not read yet. Photograph an end and mark two or three rings on it, or set the angle by eye against a drawn
          end.
        </p>
      ) : null}
      {readings.near && readings.far ? <EndsDiffer near={readings.near.field} far={readings.far.field} /> : null}
      <div className="grid gap-6">
        {boardEnds.map((end) => {
          const reading = readings[end];
          return reading ? <EndReading key={end} board={board} reading={reading} /> : null;
        })}
      </div>
    </Card>
  );
}

/** Below this the ends agree as well as two readings of one end do. Our own estimate. */
const differFromDeg = 10;

/** A board whose ends differ says so: its middle is neither. */
function EndsDiffer({ near, far }: { near: RingField; far: RingField }) {
  const { turnDeg, meanTurnDeg } = compareEnds(near, far);
  if (turnDeg < differFromDeg) return null;
  const middle = angleSummary(fieldAlong(near, far, 0.5));
  const why =
    Math.abs(meanTurnDeg) > turnDeg / 2
      ? "All the width turns one way: the tree twists, or the board was sawn out of its line."
      : "The edges turn apart: the grain runs out of the board.";
  return (
    <Notice kind="caution" title={`The ends differ by ${Math.round(turnDeg)}° on average`} className="mb-4">
      {why} Half way along, the rings stand at about {Math.round(middle.least)}° to {Math.round(middle.greatest)}°.
    </Notice>
  );
}

function EndReading({ board, reading }: { board: Board; reading: RingReading }) {
  const { classLimits } = useShop();
  const { field } = reading;
  const shares = classShares(field, classLimits);
  const width = 900;
  const height = (width * field.thicknessMm) / field.widthMm;
  const percent = (share: number) => `${Math.round(share * 100)} %`;
  return (
    <div>
      <div className="mb-2 flex flex-wrap justify-between gap-x-4">
        <h3 className="font-semibold text-lg">{reading.boardEnd} end</h3>
        <p className="text-ink-soft">
          {readingWords(reading.source)}, {reading.readBy}, <When at={reading.readAt} />
        </p>
      </div>
      <svg viewBox={`0 0 ${width} ${height}`} className="block h-auto w-full" role="presentation">
        <EndDrawing
          board={{ ...board, rings: field, widthMm: field.widthMm, thicknessMm: field.thicknessMm }}
          width={width}
          height={height}
        />
        {field.stations.map((station) => (
          <StationMark
            key={station.position}
            x={station.position * width}
            y={height / 2}
            signedDeg={station.signedDeg}
          />
        ))}
      </svg>
      <ol
        className="mt-1 flex justify-between font-mono text-sm"
        aria-label={`Ring angle across the ${reading.boardEnd} end, left to right`}
      >
        {field.stations.map((station) => (
          <li key={station.position} className="flex-1 text-center">
            {Math.round(station.angleDeg)}°
          </li>
        ))}
      </ol>
      <p className="mt-2">
        flat {percent(shares.flat)}, rift {percent(shares.rift)}, quartered {percent(shares.quartered)}{" "}
        <span className="text-ink-soft">
          (flat below {classLimits.flatBelowDeg}°, quartered above {classLimits.quarteredAboveDeg}°)
          {field.ringsPerInch ? `, ${field.ringsPerInch.toFixed(1)} rings to the inch` : ""}
        </span>
      </p>
    </div>
  );
}

/** A short line along the ring, with a white edge so that it shows on any wood. */
function StationMark({ x, y, signedDeg }: { x: number; y: number; signedDeg: number }) {
  const angle = (signedDeg * Math.PI) / 180;
  const [dx, dy] = [Math.cos(angle) * 20, Math.sin(angle) * 20];
  const d = `M${x - dx} ${y - dy}L${x + dx} ${y + dy}`;
  return (
    <g strokeLinecap="round" fill="none">
      <path d={d} stroke="#ffffff" strokeWidth="7" />
      <path d={d} stroke="#1d4ed8" strokeWidth="4" />
    </g>
  );
}
