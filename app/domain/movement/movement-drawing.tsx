import { speciesTints } from "#app/domain/species/species-tints.ts";
import type { DrawnMovement } from "./draw-movement.ts";

interface MovementDrawingProps {
  drawn: DrawnMovement;
  /** Code of the species, for its tint. */
  species: string;
  /** In words what the drawing shows. */
  label: string;
}

/** A board's end after its moisture has changed, grain and all, over the dashed outline it had before; both to one scale. */
export function MovementDrawing({ drawn, species, label }: MovementDrawingProps) {
  const { view, exaggeration } = drawn;
  const tints = speciesTints(species);
  const margin = view.widthMm * 0.02;
  return (
    <figure className="m-0">
      <svg
        viewBox={`${view.xMm - margin} ${view.yMm - margin} ${view.widthMm + 2 * margin} ${view.heightMm + 2 * margin}`}
        className="block h-auto max-h-96 w-full"
        role="img"
        aria-label={label}
      >
        <path d={drawn.after} fill={tints.base} stroke="#5b4a33" strokeWidth="1.5" vectorEffect="non-scaling-stroke" />
        <path d={drawn.rings} fill="none" stroke={tints.latewood} strokeWidth="1.2" vectorEffect="non-scaling-stroke" />
        {/* A pale line under the crayon, so that it shows on wood and on a dim shop's ground alike. */}
        <path
          d={drawn.before}
          fill="none"
          stroke="#ffffff"
          strokeWidth="4"
          opacity="0.6"
          vectorEffect="non-scaling-stroke"
        />
        <path
          d={drawn.before}
          fill="none"
          stroke="#1d4ed8"
          strokeWidth="2"
          strokeDasharray="7 5"
          vectorEffect="non-scaling-stroke"
        />
      </svg>
      <figcaption className="mt-1 text-ink-soft text-sm">
        Before, dashed; after, with its rings.{" "}
        {exaggeration === 1 ? "To scale." : `To scale, the movement drawn ${exaggeration} times too large.`}
      </figcaption>
    </figure>
  );
}
