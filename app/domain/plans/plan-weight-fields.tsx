import { TextField } from "#app/components/field.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import type { TypedWeights } from "./plan.schema.ts";

/** What a plan weighs against what. */
export function PlanWeightFields({ typed }: { typed: TypedWeights }) {
  const { currency } = useShop();
  return (
    <>
      <TextField
        label="Opening one more board costs"
        name="charge"
        unit={currency}
        inputMode="decimal"
        defaultValue={typed.charge}
        hint="More gives fewer boards, less wood left in each."
      />
      <TextField
        label="Offcuts worth keeping count as"
        name="credit"
        unit="%"
        inputMode="numeric"
        defaultValue={typed.credit}
        hint="Of what their wood cost."
      />
      <TextField
        label="Of a part's width, in its ring angles"
        name="rings"
        unit="%"
        inputMode="numeric"
        defaultValue={typed.rings}
        hint="At least this much."
      />
    </>
  );
}
