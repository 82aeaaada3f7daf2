import { useEffect, useMemo, useRef, useState } from "react";
import { Button } from "#app/components/button.tsx";
import { type PicturePoint, type RingMarks, readMarks } from "./read-marks.ts";
import { RingPreview } from "./ring-preview.tsx";

interface RingMarkerProps {
  /** The photo as shown, and its real size in pixels: marks are kept in those. */
  src: string;
  alt: string;
  widthPx: number;
  heightPx: number;
  board: { widthMm: number; thicknessMm: number; species: string };
  start: RingMarks;
}

const cornerNames = ["top left", "top right", "bottom right", "bottom left"];

/**
 * Marking an end-grain photo by hand: four corners of the board's end, then strokes along growth rings. What the marks say is drawn beside them at
 * once; the server reads the same marks again when they are kept.
 */
export function RingMarker({ src, alt, widthPx, heightPx, board, start }: RingMarkerProps) {
  const [marks, setMarks] = useState<RingMarks>(start);
  const [drawing, setDrawing] = useState<PicturePoint[] | null>(null);
  const [dragged, setDragged] = useState<number | null>(null);
  const svg = useRef<SVGSVGElement>(null);
  const scale = usePicturePixelsPerScreenPixel(svg, widthPx);
  const reading = useMemo(() => readMarks(marks, board), [marks, board]);

  function at(event: React.PointerEvent): PicturePoint {
    const box = svg.current?.getBoundingClientRect();
    if (!box) return { x: 0, y: 0 };
    return inside({
      x: ((event.clientX - box.left) / box.width) * widthPx,
      y: ((event.clientY - box.top) / box.height) * heightPx,
    });
  }
  function inside({ x, y }: PicturePoint): PicturePoint {
    return { x: Math.min(widthPx, Math.max(0, x)), y: Math.min(heightPx, Math.max(0, y)) };
  }
  function moveCorner(index: number, to: PicturePoint) {
    setMarks((old) => ({ ...old, corners: old.corners.map((corner, i) => (i === index ? inside(to) : corner)) }));
  }
  function onKey(index: number, event: React.KeyboardEvent) {
    const step = (event.shiftKey ? 10 : 1) * scale * 2;
    const by = { ArrowLeft: [-step, 0], ArrowRight: [step, 0], ArrowUp: [0, -step], ArrowDown: [0, step] }[event.key];
    const corner = marks.corners[index];
    if (!by || !corner) return;
    event.preventDefault();
    moveCorner(index, { x: corner.x + (by[0] ?? 0), y: corner.y + (by[1] ?? 0) });
  }
  function onDown(event: React.PointerEvent) {
    event.preventDefault();
    svg.current?.setPointerCapture(event.pointerId);
    const point = at(event);
    const near = marks.corners.findIndex((corner) => Math.hypot(corner.x - point.x, corner.y - point.y) < 26 * scale);
    if (near >= 0) setDragged(near);
    else setDrawing([point]);
  }
  function onMove(event: React.PointerEvent) {
    if (dragged !== null) return moveCorner(dragged, at(event));
    const point = at(event);
    setDrawing((line) => {
      const last = line?.at(-1);
      return line && last && Math.hypot(point.x - last.x, point.y - last.y) > 4 * scale ? [...line, point] : line;
    });
  }
  function onUp() {
    setDragged(null);
    const line = drawing;
    setDrawing(null);
    const [first] = line ?? [];
    const last = line?.at(-1);
    if (line && first && last && Math.hypot(last.x - first.x, last.y - first.y) > 20 * scale)
      setMarks((old) => ({ ...old, strokes: [...old.strokes, line] }));
  }

  return (
    <div className="grid gap-4">
      <input type="hidden" name="marks" value={JSON.stringify(marks)} />
      <svg
        ref={svg}
        viewBox={`0 0 ${widthPx} ${heightPx}`}
        className="block w-full touch-none select-none rounded-lg border border-line-strong bg-sunk"
        role="group"
        aria-label={alt}
        onPointerDown={onDown}
        onPointerMove={onMove}
        onPointerUp={onUp}
        onPointerCancel={onUp}
      >
        <image href={src} width={widthPx} height={heightPx} preserveAspectRatio="none" />
        <polygon
          points={marks.corners.map(({ x, y }) => `${x},${y}`).join(" ")}
          fill="none"
          stroke="#ffffff"
          strokeWidth={4 * scale}
          strokeLinejoin="round"
        />
        <polygon
          points={marks.corners.map(({ x, y }) => `${x},${y}`).join(" ")}
          fill="none"
          stroke="#1d4ed8"
          strokeWidth={2 * scale}
        />
        {[...marks.strokes, ...(drawing ? [drawing] : [])].map((line, index) => (
          <g key={`${index}-${line.length}`}>
            <polyline
              points={line.map(({ x, y }) => `${x},${y}`).join(" ")}
              fill="none"
              stroke="#ffffff"
              strokeWidth={7 * scale}
              strokeLinecap="round"
              strokeLinejoin="round"
            />
            <polyline
              points={line.map(({ x, y }) => `${x},${y}`).join(" ")}
              fill="none"
              stroke="#c2301c"
              strokeWidth={4 * scale}
              strokeLinecap="round"
              strokeLinejoin="round"
            />
          </g>
        ))}
        {marks.corners.map((corner, index) => (
          <circle
            key={cornerNames[index]}
            cx={corner.x}
            cy={corner.y}
            r={12 * scale}
            fill={dragged === index ? "#1d4ed8" : "#ffffff"}
            fillOpacity="0.85"
            stroke="#1d4ed8"
            strokeWidth={3 * scale}
            tabIndex={0}
            role="slider"
            aria-valuenow={Math.round(corner.x)}
            aria-valuetext={`${Math.round(corner.x)} across, ${Math.round(corner.y)} down`}
            aria-label={`Corner, ${cornerNames[index]}. Arrow keys move it.`}
            onKeyDown={(event) => onKey(index, event)}
          />
        ))}
      </svg>
      <div className="flex flex-wrap gap-2">
        <Button
          type="button"
          disabled={marks.strokes.length === 0}
          onClick={() => setMarks((old) => ({ ...old, strokes: old.strokes.slice(0, -1) }))}
        >
          Undo the last stroke
        </Button>
        <Button type="button" onClick={() => setMarks(start)}>
          Start over
        </Button>
      </div>
      <RingPreview reading={reading} strokes={marks.strokes.length} species={board.species} />
    </div>
  );
}

/** Picture pixels under one screen pixel: handles and strokes keep their size on the screen whatever the photo's. */
function usePicturePixelsPerScreenPixel(element: React.RefObject<SVGSVGElement | null>, widthPx: number): number {
  const [width, setWidth] = useState(800);
  useEffect(() => {
    if (!element.current) return;
    const observer = new ResizeObserver(([entry]) => setWidth(entry?.contentRect.width || 800));
    observer.observe(element.current);
    return () => observer.disconnect();
  }, [element]);
  return widthPx / width;
}
