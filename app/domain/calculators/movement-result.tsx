import { Figures } from "#app/components/figures.tsx";
import { printChange } from "#app/domain/movement/change-text.ts";
import { MovementDrawing } from "#app/domain/movement/movement-drawing.tsx";
import { basisWords, cupWords, movementCautions } from "#app/domain/movement/movement-words.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import type { MovementAnswer } from "./movement.ts";

/** The change of width first; thickness, squareness and cup after it, and what it rests on. */
export function MovementResult({ answer: { species, moved } }: { answer: MovementAnswer }) {
  const { units } = useShop();
  const { section } = moved;
  const cup = cupWords(moved, units);
  const change = (mm: number) => printChange(mm, units);
  const width = change(section.widthChangeMm);
  return (
    <Figures
      title={`${speciesName(species)}, ${moved.fromPct} % to ${moved.toPct} %`}
      main={{ label: "Width changes by", value: width }}
      drawing={<MovementDrawing drawn={moved.drawn} species={species} label={`Width ${width}; cup: ${cup}`} />}
      rows={[
        { label: "Width after", value: size(moved.widthMm + section.widthChangeMm, units) },
        { label: "Thickness, on average", value: change(section.thicknessChangeMm) },
        {
          label: "At left edge, middle, right edge",
          value: [section.thicknessChangeLeftMm, section.thicknessChangeMiddleMm, section.thicknessChangeRightMm]
            .map(change)
            .join(", "),
        },
        { label: "Corners leave square by", value: `${section.outOfSquareDeg.toFixed(2)}°` },
        { label: "Cup", value: cup },
      ]}
      beyond={movementCautions(moved, units)}
    >
      <p className="mt-3 text-ink-soft">{basisWords(moved)}</p>
    </Figures>
  );
}

function size(mm: number, units: "in" | "mm"): string {
  return units === "in" ? `${(mm / 25.4).toFixed(3)} in` : `${mm.toFixed(1)} mm`;
}
