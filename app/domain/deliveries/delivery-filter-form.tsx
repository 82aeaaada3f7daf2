import { Form } from "react-router";
import { Button } from "#app/components/button.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { SpeciesOptions } from "#app/domain/species/species-options.tsx";
import type { DeliveryFilter } from "./delivery-filter.ts";

interface DeliveryFilterFormProps {
  filter: DeliveryFilter;
  suppliers: { id: string; name: string }[];
}

/** Narrowing the list: a plain GET form, so every choice is in the address. Folded on a phone, where the list comes first. */
export function DeliveryFilterForm({ filter, suppliers }: DeliveryFilterFormProps) {
  return (
    <details
      className="mb-4 rounded-xl border border-line bg-surface px-4 py-2 lg:py-4 lg:[&::details-content]:block lg:[&::details-content]:[content-visibility:visible]"
      data-screen-only
    >
      <summary className="flex min-h-11 cursor-pointer items-center font-display font-semibold text-lg lg:hidden">
        Narrow it down
      </summary>
      <Form
        key={JSON.stringify(filter)}
        method="get"
        role="search"
        aria-label="Filter deliveries"
        className="mb-2 grid items-end gap-3 sm:grid-cols-2 lg:grid-cols-[minmax(0,1.4fr)_repeat(4,minmax(0,1fr))_auto]"
      >
        <TextField label="Word of the papers" name="q" type="search" defaultValue={filter.q} />
        <SelectField label="Supplier" name="supplier" defaultValue={filter.supplier}>
          <option value="">any</option>
          {suppliers.map(({ id, name }) => (
            <option key={id} value={id}>
              {name}
            </option>
          ))}
        </SelectField>
        <SelectField label="Species" name="species" defaultValue={filter.species}>
          <option value="">any</option>
          <SpeciesOptions />
        </SelectField>
        <SelectField label="Tally" name="tally" defaultValue={filter.tally}>
          <option value="any">any</option>
          <option value="waiting">still to tally</option>
          <option value="done">tallied</option>
        </SelectField>
        <SelectField label="Order" name="sort" defaultValue={filter.sort}>
          <option value="newest">newest first</option>
          <option value="oldest">oldest first</option>
          <option value="supplier">by supplier</option>
        </SelectField>
        <Button>Show</Button>
      </Form>
    </details>
  );
}
