import { Card } from "#app/components/card.tsx";
import { Beyond } from "#app/components/figures.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { type BoardMovement, largestStep, type MovementStep } from "./board-movement.ts";
import { printChange } from "./change-text.ts";
import { MovementDrawing } from "./movement-drawing.tsx";
import { basisWords, cupWords, movementCautions } from "./movement-words.ts";

/** How this board will move on its way to where its piece will live: drawn on its own section, then step by step. */
export function MovementCard({ species, movement }: { species: string; movement: BoardMovement }) {
  const { units } = useShop();
  if (!movement.ok)
    return (
      <Card title="Movement">
        <p className="text-ink-soft">{movement.why}</p>
      </Card>
    );
  const { steps, isRange, placeWords, source } = movement;
  const drawn = isRange ? undefined : largestStep(steps);
  const first = steps[0]?.moved;
  return (
    <Card title="Movement" aside={`from ${first?.fromPct.toFixed(1)} %, for ${placeWords}`}>
      {isRange ? (
        <p className="mb-3 text-ink-soft">
          Its rings have not been read: it will move somewhere between these. Read an end to know where.
        </p>
      ) : null}
      {drawn ? (
        <>
          <MovementDrawing
            drawn={drawn.moved.drawn}
            species={species}
            label={`${drawn.words}: width ${printChange(drawn.moved.section.widthChangeMm, units)}, cup ${cupWords(drawn.moved, units)}`}
          />
          <p className="mb-3 text-ink-soft text-sm">Drawn: {drawn.words}.</p>
        </>
      ) : null}
      <StepList steps={steps} withCup={!isRange} />
      <Beyond says={steps.flatMap(({ moved }) => movementCautions({ ...moved, otherTable: null }, units))} />
      <p className="mt-2 text-ink-soft">
        {first ? basisWords(first) : null} {source}
      </p>
    </Card>
  );
}

function StepList({ steps, withCup }: { steps: MovementStep[]; withCup: boolean }) {
  const { units } = useShop();
  return (
    <ul className="divide-y divide-line">
      {steps.map(({ words, moved }) => (
        <li key={words} className="flex flex-wrap justify-between gap-x-4 py-2.5">
          <span className="text-ink-soft">{words}</span>
          <span className="text-right font-semibold tabular-nums">
            width {printChange(moved.section.widthChangeMm, units)}, thickness{" "}
            {printChange(moved.section.thicknessChangeMm, units)}
            {withCup ? <span className="block font-normal">cup {cupWords(moved, units)}</span> : null}
          </span>
        </li>
      ))}
    </ul>
  );
}
