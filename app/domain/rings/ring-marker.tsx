import { useEffect, useRef, useState } from "react";
import { Button } from "#app/components/button.tsx";
import { PhotoMarks } from "./photo-marks.tsx";
import type { PicturePoint, RingMarks } from "./read-marks.ts";
import { RingPreview } from "./ring-preview.tsx";
import { useRingMarks } from "./use-ring-marks.ts";

interface RingMarkerProps {
  photoId: string;
  /** The photo as shown, and its real size in pixels: marks are kept in those. */
  src: string;
  alt: string;
  widthPx: number;
  heightPx: number;
  board: { widthMm: number; thicknessMm: number; species: string };
  start: RingMarks;
}

type Grip = { kind: "corner"; index: number } | { kind: "pith" } | { kind: "stroke"; line: PicturePoint[] };

/**
 * An end-grain photo with the reader's proposal drawn over it: the corners it found, the rings it sees. A person drags a corner or the pith, or draws
 * along rings by eye, and the reading follows. What is kept, the server reads again from the same marks.
 */
export function RingMarker({ photoId, src, alt, widthPx, heightPx, board, start }: RingMarkerProps) {
  const { marks, shown, trouble, reading, ringLines, pith, moveCorner, movePith, addStroke, undoStroke, startOver } =
    useRingMarks({ photoId, board, start });
  const [grip, setGrip] = useState<Grip | null>(null);
  const svg = useRef<SVGSVGElement>(null);
  const scale = usePicturePixelsPerScreenPixel(svg, widthPx);

  function inside({ x, y }: PicturePoint): PicturePoint {
    return { x: Math.min(widthPx, Math.max(0, x)), y: Math.min(heightPx, Math.max(0, y)) };
  }
  function at(event: React.PointerEvent): PicturePoint {
    const box = svg.current?.getBoundingClientRect();
    if (!box) return { x: 0, y: 0 };
    return inside({
      x: ((event.clientX - box.left) / box.width) * widthPx,
      y: ((event.clientY - box.top) / box.height) * heightPx,
    });
  }
  const near = (a: PicturePoint, b: PicturePoint, reachPx: number) =>
    Math.hypot(a.x - b.x, a.y - b.y) < reachPx * scale;

  function onDown(event: React.PointerEvent) {
    event.preventDefault();
    svg.current?.setPointerCapture(event.pointerId);
    const point = at(event);
    const corner = marks.corners.findIndex((place) => near(place, point, 26));
    if (corner >= 0) setGrip({ kind: "corner", index: corner });
    else if (pith && near(pith, point, 20)) setGrip({ kind: "pith" });
    else setGrip({ kind: "stroke", line: [point] });
  }
  function onMove(event: React.PointerEvent) {
    if (!grip) return;
    const point = at(event);
    if (grip.kind === "corner") moveCorner(grip.index, point);
    else if (grip.kind === "pith") movePith(point);
    else if (!near(grip.line.at(-1) ?? point, point, 4)) setGrip({ kind: "stroke", line: [...grip.line, point] });
  }
  function onUp() {
    const [first] = grip?.kind === "stroke" ? grip.line : [];
    const last = grip?.kind === "stroke" ? grip.line.at(-1) : undefined;
    if (grip?.kind === "stroke" && first && last && !near(first, last, 20)) addStroke(grip.line);
    setGrip(null);
  }
  function onKey(place: PicturePoint, move: (to: PicturePoint) => void, event: React.KeyboardEvent) {
    const step = (event.shiftKey ? 10 : 1) * scale * 2;
    const by: Record<string, [number, number]> = {
      ArrowLeft: [-step, 0],
      ArrowRight: [step, 0],
      ArrowUp: [0, -step],
      ArrowDown: [0, step],
    };
    const [dx, dy] = by[event.key] ?? [0, 0];
    if (dx === 0 && dy === 0) return;
    event.preventDefault();
    move(inside({ x: place.x + dx, y: place.y + dy }));
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
        <PhotoMarks
          marks={marks}
          strokes={grip?.kind === "stroke" ? [...marks.strokes, grip.line] : marks.strokes}
          ringLines={ringLines}
          pith={pith}
          scale={scale}
          held={grip?.kind === "corner" ? grip.index : null}
          onCornerKey={(index, event) =>
            marks.corners[index] && onKey(marks.corners[index], (to) => moveCorner(index, to), event)
          }
          onPithKey={(event) => pith && onKey(pith, movePith, event)}
        />
      </svg>
      <div className="flex flex-wrap gap-2">
        <Button type="button" disabled={marks.strokes.length === 0} onClick={undoStroke}>
          Undo the last stroke
        </Button>
        <Button type="button" onClick={startOver}>
          Start over
        </Button>
      </div>
      <RingPreview
        shown={shown}
        trouble={trouble}
        reading={reading}
        strokes={marks.strokes.length}
        species={board.species}
      />
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
