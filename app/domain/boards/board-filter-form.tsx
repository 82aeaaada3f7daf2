import { Form, Link } from "react-router";
import { Button } from "#app/components/button.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { armName, type Bay } from "#app/domain/rack/rack.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import { boardStates, figureKinds } from "./board.ts";
import type { BoardFilter } from "./board-filter.ts";
import { QuartersOptions } from "./quarters-options.tsx";

interface BoardFilterFormProps {
  filter: BoardFilter;
  species: string[];
  projects: { id: string; name: string }[];
  bays: Bay[];
}

/** Narrowing the list: a plain GET form, so every choice is in the address and works without JavaScript.
 * Folded on a phone, where the list comes first; always open on a desk. */
export function BoardFilterForm({ filter, species, projects, bays }: BoardFilterFormProps) {
  const { units } = useShop();
  return (
    <details
      className="rounded-xl border border-line bg-surface px-4 py-2 lg:py-4 lg:[&::details-content]:block lg:[&::details-content]:[content-visibility:visible]"
      data-screen-only
    >
      <summary className="flex min-h-11 cursor-pointer items-center font-display font-semibold text-lg lg:pointer-events-none lg:list-none">
        Narrow it down
      </summary>
      <Form method="get" key={JSON.stringify(filter)} className="mt-2 grid grid-cols-2 gap-3 lg:grid-cols-1">
        <TextField
          label="Tag or words"
          name="q"
          type="search"
          defaultValue={filter.q}
          className="col-span-2 lg:col-span-1"
        />
        <SelectField label="Species" name="species" defaultValue={filter.species}>
          <option value="">any</option>
          {species.map((code) => (
            <option key={code} value={code}>
              {speciesName(code)}
            </option>
          ))}
        </SelectField>
        <SelectField label="Quarters" name="quarters" defaultValue={filter.quarters ?? ""}>
          <option value="">any</option>
          <QuartersOptions />
        </SelectField>
        <SelectField label="Rings" name="rings" defaultValue={filter.rings ?? ""}>
          <option value="">any</option>
          <option>flat</option>
          <option>rift</option>
          <option>quartered</option>
          <option value="unread">not read yet</option>
        </SelectField>
        <SelectField label="State" name="state" defaultValue={filter.state}>
          {boardStates.map((state) => (
            <option key={state}>{state}</option>
          ))}
          <option>any</option>
        </SelectField>
        <TextField label="Length at least" name="length" unit={units} defaultValue={filter.length} />
        <TextField label="Width at least" name="width" unit={units} defaultValue={filter.width} />
        <TextField
          label="Moisture at most"
          name="moisture"
          unit="%"
          inputMode="decimal"
          defaultValue={filter.moisture ?? ""}
        />
        <SelectField label="Figure" name="figure" defaultValue={filter.figure}>
          <option value="">any</option>
          {figureKinds.map((kind) => (
            <option key={kind}>{kind}</option>
          ))}
        </SelectField>
        <SelectField label="Place" name="arm" defaultValue={filter.arm}>
          <option value="">any</option>
          {bays.flatMap((bay) =>
            bay.arms.map((arm) => (
              <option key={arm.id} value={arm.id}>
                {armName(bay, arm)}
              </option>
            )),
          )}
        </SelectField>
        <SelectField label="Project" name="project" defaultValue={filter.project}>
          <option value="">any</option>
          {projects.map((project) => (
            <option key={project.id} value={project.id}>
              {project.name}
            </option>
          ))}
        </SelectField>
        <label className="col-span-2 flex min-h-11 items-center gap-3 lg:col-span-1">
          <input
            type="checkbox"
            name="free"
            value="yes"
            defaultChecked={filter.free === "yes"}
            className="size-5 accent-action"
          />
          Nothing reserved on it
        </label>
        <SelectField label="In order of" name="sort" defaultValue={filter.sort}>
          <option value="newest">newest tag first</option>
          <option value="tag">oldest tag first</option>
          <option value="length">longest first</option>
          <option value="width">widest first</option>
          <option value="moisture">driest first</option>
          <option value="angle">most quartered first</option>
        </SelectField>
        {filter.delivery ? <input type="hidden" name="delivery" value={filter.delivery} /> : null}
        <div className="col-span-2 flex flex-wrap gap-2 lg:col-span-1">
          <Button look="main" className="flex-1">
            Show
          </Button>
          <Link to="." className="inline-flex min-h-11 items-center px-3 text-link underline-offset-4 hover:underline">
            Clear
          </Link>
        </div>
      </Form>
    </details>
  );
}
