import type { ReactNode } from "react";
import { describeField } from "#app/core/rings/describe.ts";
import type { RingField } from "#app/core/rings/ring-types.ts";
import { EndDrawing } from "#app/domain/boards/end-drawing.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";

interface EndSketchProps {
  field: RingField;
  /** Room round the end in millimetres, where something drawn on it sticks out. */
  marginMm?: number;
  /** Marks on the end, in millimetres from its top left corner; `perPx` is about one screen pixel. */
  children?: (perPx: number) => ReactNode;
}

const drawnWidth = 900;

/** A board's end of no record, with marks on it in millimetres. */
export function EndSketch({ field, marginMm = 0, children }: EndSketchProps) {
  const { classLimits } = useShop();
  const { widthMm, thicknessMm } = field;
  const scale = drawnWidth / widthMm;
  const margin = marginMm * scale + 2;
  const height = thicknessMm * scale;
  return (
    <svg
      viewBox={`${-margin} ${-margin} ${drawnWidth + 2 * margin} ${height + 2 * margin}`}
      className="block h-auto max-h-96 w-full"
      role="img"
      aria-label={describeField(field, classLimits)}
    >
      <EndDrawing
        board={{ species: "", widthMm, thicknessMm, rings: field, ringClass: null, ringMinDeg: null, ringMaxDeg: null }}
        width={drawnWidth}
        height={height}
        decorative
      />
      <g transform={`scale(${scale})`}>{children?.(1 / scale)}</g>
    </svg>
  );
}
