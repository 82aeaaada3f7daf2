import type { FieldMetadata } from "@conform-to/react";
import { Card } from "#app/components/card.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { labelSheets } from "#app/core/labels/label-sheets.ts";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import { printLength } from "#app/core/lengths/print-length.ts";
import type { ShopSettings } from "./shop.ts";

/** The settings as the form shows them at first: lengths written the shop's way, the rest as it is. */
export function shopDefaults({ classLimits, ...shop }: ShopSettings): Record<string, string> {
  const written = Object.entries({ ...shop, ...classLimits }).map(([name, value]) => [
    name,
    name.endsWith("Mm") ? printLength(Number(value), shop.units) : String(value),
  ]);
  return Object.fromEntries(written);
}

interface ShopFieldsProps {
  fields: Record<string, FieldMetadata<unknown>>;
  units: LengthUnit;
}

/** Every setting of a shop, by what it is about. */
export function ShopFields({ fields, units }: ShopFieldsProps) {
  const of = (name: string) => fieldProps(fields[name] as FieldMetadata<unknown>);
  const size = (name: string, label: string, hint?: string) => (
    <TextField label={label} unit={units} hint={hint} {...of(name)} />
  );
  const row = "grid gap-4 sm:grid-cols-2 lg:grid-cols-3";
  return (
    <>
      <Card title="The shop">
        <div className={row}>
          <TextField label="Name" {...of("name")} />
          <SelectField label="Sizes in" {...of("units")}>
            <option value="in">inches and fractions</option>
            <option value="mm">millimetres</option>
          </SelectField>
          <TextField
            label="Money in"
            {...of("currency")}
            hint="USD, EUR, GBP. Amounts already written keep their figures."
          />
        </div>
      </Card>
      <Card title="Air, and what wood settles to in it">
        <div className={row}>
          <TextField label="Usual temperature" unit="°C" inputMode="decimal" {...of("targetTemperatureC")} />
          <TextField label="Usual humidity" unit="%" inputMode="decimal" {...of("targetHumidityPct")} />
        </div>
      </Card>
      <Card title="What cutting takes">
        <div className={row}>
          {size("kerfMm", "Kerf")}
          {size("endTrimMm", "End trim", "Cut off each end for checks.")}
          {size("jointPerFaceMm", "Jointing, per glue face")}
          {size("allowanceLengthMm", "Allowance in length")}
          {size("allowanceWidthMm", "Allowance in width")}
          {size("allowanceThicknessMm", "Allowance in thickness")}
          {size("offcutMinLengthMm", "Shortest offcut worth keeping")}
          {size("offcutMinWidthMm", "Narrowest offcut worth keeping")}
        </div>
      </Card>
      <Card title="Machines and clamps">
        <div className={row}>
          {size("sawMaxHeightMm", "Table saw cuts as high as", "Measured at 90°, blade right up.")}
          {size("jointerMaxWidthMm", "Jointer, widest")}
          {size("jointerMinLengthMm", "Jointer, shortest piece", "Its manual's figure.")}
          {size("planerMaxWidthMm", "Planer, widest")}
          {size("planerMinLengthMm", "Planer, shortest piece", "Its manual's figure.")}
          <TextField label="Clamps" inputMode="numeric" {...of("clamps")} />
        </div>
      </Card>
      <Card title="Rings, holds, tags">
        <div className={row}>
          <TextField
            label="Flat is below"
            unit="°"
            inputMode="decimal"
            {...of("flatBelowDeg")}
            hint="Rings to wide face. Published limits differ; 30 and 60 are usual."
          />
          <TextField
            label="Quartered is above"
            unit="°"
            inputMode="decimal"
            {...of("quarteredAboveDeg")}
            hint="Every board is classed anew when these change."
          />
          <TextField label="A hold lasts" unit="days" inputMode="numeric" {...of("holdDays")} />
          <SelectField label="Labels for tags" {...of("labelSheet")}>
            {labelSheets.map((sheet) => (
              <option key={sheet.code} value={sheet.code}>
                {sheet.name}
              </option>
            ))}
          </SelectField>
        </div>
      </Card>
    </>
  );
}
