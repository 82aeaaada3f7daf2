import type { FieldMetadata } from "@conform-to/react";
import { Card } from "#app/components/card.tsx";
import { SelectField, TextArea, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { QuartersOptions } from "#app/domain/boards/quarters-options.tsx";
import { moneyInput } from "#app/domain/shop/money.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { SpeciesOptions } from "#app/domain/species/species-options.tsx";
import type { DeliveryForm } from "./delivery.schema.ts";
import type { Delivery } from "./delivery.ts";

interface DeliveryFieldsProps {
  fields: Record<keyof DeliveryForm, FieldMetadata<unknown>>;
  suppliers: { id: string; name: string }[];
}

const row = "grid gap-4 sm:grid-cols-2 lg:grid-cols-4";

/** The fields of a delivery, for logging one and for changing it, in the order of the papers. */
export function DeliveryFields({ fields, suppliers }: DeliveryFieldsProps) {
  const { currency } = useShop();
  const of = (name: keyof DeliveryForm) => ({ ...fieldProps(fields[name]), required: false });
  return (
    <div className="grid gap-4">
      <Card title="Who and when">
        <div className={row}>
          {suppliers.length > 0 ? (
            <SelectField label="Supplier" {...of("supplierId")}>
              <option value="">a new one, named beside</option>
              {suppliers.map(({ id, name }) => (
                <option key={id} value={id}>
                  {name}
                </option>
              ))}
            </SelectField>
          ) : null}
          <TextField
            label={suppliers.length > 0 ? "New supplier" : "Supplier"}
            autoComplete="off"
            {...of("newSupplier")}
            hint={suppliers.length > 0 ? "Typed here, it counts instead of the choice." : "Kept for the next delivery."}
          />
          <TextField label="Received on" type="date" {...of("receivedOn")} />
          <TextField
            label="Supplier's reference"
            autoComplete="off"
            {...of("reference")}
            hint="Invoice or delivery note."
          />
        </div>
      </Card>
      <Card title="What it is">
        <div className="grid grid-cols-2 gap-4 lg:grid-cols-4">
          <SelectField label="Species" {...of("species")} className="col-span-2 sm:col-span-1">
            <option value="">choose</option>
            <SpeciesOptions />
          </SelectField>
          <SelectField label="Quarters" {...of("quarters")} hint="The tally begins with it; its lines can differ.">
            <QuartersOptions />
          </SelectField>
          <SelectField label="Drying" {...of("drying")}>
            <option value="kiln">kiln-dried</option>
            <option value="air">air-dried</option>
            <option value="green">green</option>
          </SelectField>
          <TextField
            label="Grade, as bought"
            autoComplete="off"
            {...of("grade")}
            className="col-span-2 sm:col-span-1"
          />
        </div>
      </Card>
      <Card title="What is claimed, and the price">
        <div className="grid grid-cols-2 gap-4 lg:grid-cols-5">
          <TextField
            label="Claimed volume"
            inputMode="decimal"
            autoComplete="off"
            {...of("claimedVolume")}
            hint="As the papers say. Empty: the shop's own tally counts."
          />
          <SelectField label="In" {...of("claimedUnit")}>
            <option value="bf">board feet</option>
            <option value="m3">cubic metres</option>
          </SelectField>
          <TextField label="Price" unit={currency} inputMode="decimal" autoComplete="off" {...of("priceMinor")} />
          <SelectField label="For" {...of("priceBasis")}>
            <option value="bf">a board foot</option>
            <option value="m3">a cubic metre</option>
            <option value="lump">the whole lot</option>
          </SelectField>
          <TextField
            label="Freight"
            unit={currency}
            inputMode="decimal"
            autoComplete="off"
            {...of("freightMinor")}
            className="col-span-2 sm:col-span-1"
            hint="Shared over the boards with the price."
          />
        </div>
      </Card>
      <Card title="Where it is from">
        <div className={row}>
          <TextField label="Origin" autoComplete="off" {...of("origin")} hint="Country, forest or mill." />
          <TextField label="Certificate number" autoComplete="off" {...of("certificate")} />
          <TextArea label="Notes" {...of("notes")} className="sm:col-span-2" />
        </div>
      </Card>
    </div>
  );
}

/** What the form shows of a delivery before anybody types. */
export function deliveryDefaults(delivery: Delivery, currency: string): Record<keyof DeliveryForm, string> {
  return {
    supplierId: delivery.supplierId,
    newSupplier: "",
    receivedOn: delivery.receivedOn,
    reference: delivery.reference,
    species: delivery.species,
    quarters: String(delivery.quarters),
    drying: delivery.drying,
    grade: delivery.grade,
    claimedVolume: delivery.claimedVolume === null ? "" : String(delivery.claimedVolume),
    claimedUnit: delivery.claimedUnit,
    priceMinor: moneyInput(delivery.priceMinor, currency),
    priceBasis: delivery.priceBasis,
    freightMinor: delivery.freightMinor === 0 ? "" : moneyInput(delivery.freightMinor, currency),
    origin: delivery.origin,
    certificate: delivery.certificate,
    notes: delivery.notes,
  };
}
