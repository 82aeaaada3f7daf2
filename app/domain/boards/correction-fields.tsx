import type { FieldMetadata } from "@conform-to/react";
import { SelectField, TextArea, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { printLength } from "#app/core/lengths/print-length.ts";
import { QuartersOptions } from "#app/domain/boards/quarters-options.tsx";
import { moneyInput } from "#app/domain/shop/money.ts";
import { type ShopView, useShop } from "#app/domain/shop/shop-view.tsx";
import { SpeciesOptions } from "#app/domain/species/species-options.tsx";
import { type Board, boardEdges, boardSurfaces, figureKinds, figureStrengths } from "./board.ts";
import type { CorrectionGroup } from "./board-correction.schema.ts";

/** What the form of a group shows before anybody types: the record, written the shop's way. */
export function correctionDefaults(group: CorrectionGroup, board: Board, shop: ShopView): Record<string, string> {
  const length = (mm: number | null) => (mm === null ? "" : printLength(mm, shop.units));
  const values: Record<CorrectionGroup, Record<string, string>> = {
    wood: {
      species: board.species,
      quarters: String(board.quarters),
      grade: board.grade,
      edges: board.edges,
      surface: board.surface,
    },
    size: {
      thicknessMm: length(board.thicknessMm),
      widthMm: length(board.widthMm),
      widthFarMm: length(board.widthFarMm),
      lengthMm: length(board.lengthMm),
    },
    figure: {
      figureKind: board.figureKind,
      figureStrength: String(board.figureStrength),
      figureWhere: board.figureWhere,
      colourNote: board.colourNote,
      sapSharePct: board.sapSharePct === null ? "" : String(board.sapSharePct),
    },
    log: { logName: board.logName, logSequence: board.logSequence === null ? "" : String(board.logSequence) },
    notes: { notes: board.notes },
    cost: { costMinor: moneyInput(board.costMinor, shop.currency) },
  };
  return values[group];
}

interface CorrectionFieldsProps {
  group: CorrectionGroup;
  fields: Record<string, FieldMetadata<unknown>>;
}

/** The fields of one group of a board's record. */
export function CorrectionFields({ group, fields }: CorrectionFieldsProps) {
  const { units, currency } = useShop();
  const of = (name: string) => fieldProps(fields[name] as FieldMetadata<unknown>);
  const row = "grid gap-4 sm:grid-cols-2 lg:grid-cols-3";
  switch (group) {
    case "wood":
      return (
        <div className={row}>
          <SelectField label="Species" {...of("species")}>
            <SpeciesOptions />
          </SelectField>
          <SelectField label="Quarters" {...of("quarters")}>
            <QuartersOptions />
          </SelectField>
          <TextField label="Grade, as bought" {...of("grade")} />
          <SelectField label="Edges" {...of("edges")}>
            {boardEdges.map((edge) => (
              <option key={edge}>{edge}</option>
            ))}
          </SelectField>
          <SelectField label="Surface" {...of("surface")}>
            {boardSurfaces.map((surface) => (
              <option key={surface}>{surface}</option>
            ))}
          </SelectField>
        </div>
      );
    case "size":
      return (
        <div className={row}>
          <TextField label="Thickness, measured" unit={units} {...of("thicknessMm")} />
          <TextField label="Width at the near end" unit={units} {...of("widthMm")} />
          <TextField label="Width at the far end" unit={units} {...of("widthFarMm")} hint="Only when it tapers." />
          <TextField label="Length" unit={units} {...of("lengthMm")} />
        </div>
      );
    case "figure":
      return (
        <div className={row}>
          <SelectField label="Figure" {...of("figureKind")}>
            <option value="">none seen</option>
            {figureKinds.map((kind) => (
              <option key={kind}>{kind}</option>
            ))}
          </SelectField>
          <SelectField label="How strong" {...of("figureStrength")}>
            {figureStrengths.map((strength, index) => (
              <option key={strength} value={index}>
                {strength}
              </option>
            ))}
          </SelectField>
          <TextField label="Where" {...of("figureWhere")} />
          <TextField label="Sapwood" unit="%" inputMode="numeric" {...of("sapSharePct")} />
          <TextField label="Colour" {...of("colourNote")} hint="Warm, with a grey streak near the far end." />
        </div>
      );
    case "log":
      return (
        <div className={row}>
          <TextField label="Log" {...of("logName")} hint="Boards of one tree carry the same name." />
          <TextField label="Place in its sequence" inputMode="numeric" {...of("logSequence")} />
        </div>
      );
    case "notes":
      return <TextArea label="Notes" rows={6} {...of("notes")} />;
    case "cost":
      return <TextField label="Cost" unit={currency} inputMode="decimal" {...of("costMinor")} className="max-w-xs" />;
  }
}
