import { ringCurves } from "./ring-curves.ts";
import type { RingField } from "./ring-types.ts";
import { writeCurves } from "./svg-path.ts";

export interface EndDrawingSize {
  /** Of the drawing: pixels, or whatever its units are. */
  widthPx: number;
  heightPx: number;
  /** Rings closer than this are thinned out, so that they never run together. */
  minSpacingPx?: number;
  /** Makes the rings uneven, as growth is, always alike for the same number. Without it they are even. */
  seed?: number;
}

const mmPerInch = 25.4;
/** Drawn where nobody has counted: a spacing says nothing then, the direction all. */
const plainRingsPerInch = 10;

/**
 * The rings of a board's end as SVG paths, one for each ring, from the pith outwards: arcs round the pith at the recorded spacing, or lines along the
 * directions read where there is no pith. Where the rings stand too close for the size, every second, third … is drawn. The paths run on a little
 * past the rectangle: clip them to it. Their numbers are rounded to a twelfth of the least spacing or finer.
 *
 * @returns `d` attributes, in the drawing's units from its top left corner. RangeError for a field with neither pith nor station.
 */
export function ringPaths(field: RingField, size: EndDrawingSize): string[] {
  return drawn(field, size, (rings, write) => rings.map((pieces) => write([pieces])));
}

/** The same as one path for all rings, in as few bytes as may be: a page draws some hundreds. */
export function ringPath(field: RingField, size: EndDrawingSize): string {
  return drawn(field, size, (rings, write) => write(rings));
}

type Rings = ReturnType<typeof ringCurves>;

function drawn<T>(
  field: RingField,
  { widthPx, heightPx, minSpacingPx = 3, seed }: EndDrawingSize,
  make: (rings: Rings, write: (rings: Rings) => string) => T,
): T {
  const scale = { x: widthPx / field.widthMm, y: heightPx / field.thicknessMm };
  const ringMm = mmPerInch / (field.ringsPerInch ?? plainRingsPerInch);
  const leastMm = minSpacingPx / Math.min(scale.x, scale.y);
  const spacingMm = ringMm * Math.max(1, Math.ceil(leastMm / ringMm - 1e-9));
  const rings = ringCurves(field, { spacingMm, seed, bleedMm: leastMm / 2 });
  return make(rings, (some) => writeCurves(some.flat(), scale, minSpacingPx));
}
