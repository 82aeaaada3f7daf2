import { useShop } from "#app/domain/shop/shop-view.tsx";
import type { Asked } from "./ask.ts";
import { Box, Choice, NumberBox } from "./inputs.tsx";
import type { RingBox } from "./ring-boxes.ts";

/** How the rings run: by the place of the pith, or by one angle all across. Both stay in the form, so that changing over loses nothing. */
export function RingInputs({ asked }: { asked: Pick<Asked<RingBox, unknown>, "values" | "errors"> }) {
  const { units } = useShop();
  return (
    <fieldset className="grid gap-3 rounded-lg border border-line p-3">
      <legend className="px-1 font-semibold">Rings, looking at the end</legend>
      <Choice asked={asked} name="rings" label="Known by">
        <option value="pith">where the pith lies</option>
        <option value="angle">one angle all across</option>
      </Choice>
      <div className="grid grid-cols-2 gap-3">
        <Box asked={asked} name="pithAcross" label="Pith from left" unit={units} />
        <Box asked={asked} name="pithDown" label="Pith from top" unit={units} />
      </div>
      <p className="text-ink-soft text-sm">
        Down from the top face and across from the left edge; a minus sign puts it above or to the left of the board.
      </p>
      <div className="grid grid-cols-2 gap-3">
        <NumberBox asked={asked} name="angle" label="Or ring angle" unit="°" hint="0 flat, 90 quartered." />
        <Choice asked={asked} name="falls" label="Rings fall to the">
          <option value="right">right</option>
          <option value="left">left</option>
        </Choice>
      </div>
    </fieldset>
  );
}
