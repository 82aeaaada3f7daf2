import type { PicturePoint, RingMarks } from "./read-marks.ts";

interface PhotoMarksProps {
  marks: RingMarks;
  strokes: PicturePoint[][];
  ringLines: PicturePoint[][];
  pith: PicturePoint | null;
  /** Picture pixels to a screen pixel. */
  scale: number;
  /** The corner a finger holds. */
  held: number | null;
  onCornerKey: (index: number, event: React.KeyboardEvent) => void;
  onPithKey: (event: React.KeyboardEvent) => void;
}

const cornerNames = ["top left", "top right", "bottom right", "bottom left"];
const path = (line: PicturePoint[]) => line.map(({ x, y }) => `${x.toFixed(1)},${y.toFixed(1)}`).join(" ");

/** All that lies over the photo: the rings as read, the outline of the end, strokes drawn by hand, and the handles. White under each line, to show on any wood. */
export function PhotoMarks({ marks, strokes, ringLines, pith, scale, held, onCornerKey, onPithKey }: PhotoMarksProps) {
  const outline = path(marks.corners);
  return (
    <>
      <g fill="none" strokeLinejoin="round" strokeLinecap="round">
        {ringLines.map((line) => (
          <g key={path(line.slice(0, 2))}>
            <polyline points={path(line)} stroke="#ffffff" strokeOpacity="0.65" strokeWidth={3.4 * scale} />
            <polyline points={path(line)} stroke="#157347" strokeWidth={1.8 * scale} />
          </g>
        ))}
        <polygon points={outline} stroke="#ffffff" strokeWidth={4 * scale} />
        <polygon points={outline} stroke="#1d4ed8" strokeWidth={2 * scale} />
        {strokes.map((line) => (
          <g key={path(line.slice(0, 1))}>
            <polyline points={path(line)} stroke="#ffffff" strokeWidth={7 * scale} />
            <polyline points={path(line)} stroke="#c2301c" strokeWidth={4 * scale} />
          </g>
        ))}
      </g>
      {pith ? (
        <g
          stroke="#157347"
          strokeWidth={3 * scale}
          tabIndex={0}
          role="slider"
          aria-valuenow={Math.round(pith.x)}
          aria-valuetext={`${Math.round(pith.x)} across, ${Math.round(pith.y)} down`}
          aria-label="Pith, where the rings are centred. Arrow keys move it."
          onKeyDown={onPithKey}
        >
          <circle cx={pith.x} cy={pith.y} r={10 * scale} fill="#ffffff" fillOpacity="0.85" />
          <path d={`M${pith.x - 5 * scale} ${pith.y}h${10 * scale}M${pith.x} ${pith.y - 5 * scale}v${10 * scale}`} />
        </g>
      ) : null}
      {marks.corners.map((corner, index) => (
        <circle
          key={cornerNames[index]}
          cx={corner.x}
          cy={corner.y}
          r={12 * scale}
          fill={held === index ? "#1d4ed8" : "#ffffff"}
          fillOpacity="0.85"
          stroke="#1d4ed8"
          strokeWidth={3 * scale}
          tabIndex={0}
          role="slider"
          aria-valuenow={Math.round(corner.x)}
          aria-valuetext={`${Math.round(corner.x)} across, ${Math.round(corner.y)} down`}
          aria-label={`Corner, ${cornerNames[index]}. Arrow keys move it.`}
          onKeyDown={(event) => onCornerKey(index, event)}
        />
      ))}
    </>
  );
}
