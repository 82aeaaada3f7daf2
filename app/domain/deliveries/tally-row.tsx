import { type KeyboardEvent, memo, useState } from "react";
import { Button } from "#app/components/button.tsx";
import { isSpeciesCode } from "#app/core/species/species.ts";
import { isSoldQuarters, QuartersOptions } from "#app/domain/boards/quarters-options.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { SpeciesOptions } from "#app/domain/species/species-options.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import { type RowField, readRow } from "./tally.ts";
import { TallyBox } from "./tally-box.tsx";
import { TallyChoice } from "./tally-choice.tsx";
import { TallyKeys } from "./tally-keys.tsx";
import type { GridRow } from "./tally-rows.ts";

/** Where a key leads from a box: on along the row or to the next, or up and down the column. */
export type Step = "on" | "up" | "down";

/** What a row tells the grid. The functions stay the same ones, so that one row's typing redraws one row. */
export interface RowDoings {
  onType: (key: number, field: RowField, value: string) => void;
  onEnter: (key: number) => void;
  onLeave: (key: number) => void;
  onStep: (key: number, field: RowField, step: Step) => void;
  onPaste: (key: number, text: string) => void;
  onRemove: (key: number) => void;
}

interface TallyRowProps {
  row: GridRow;
  number: number;
  /** Board feet of the row as the trade rounds; null while it cannot be read. */
  boardFeet: number | null;
  /** Somebody pressed Save: say what is missing too. */
  isTried: boolean;
  /** The row in hand; it stays so while the focus is on a button elsewhere. */
  isInHand: boolean;
  doings: RowDoings;
}

/** Columns of the grid: two lines to a board on a phone, one at a desk. */
export const tallyColumns =
  "grid grid-cols-[2.25rem_minmax(0,1fr)_minmax(0,1fr)_3.5rem] gap-x-2 gap-y-1.5 md:grid-cols-[3.5rem_9.5rem_9.5rem_5rem_6.5rem_minmax(9rem,1fr)_5.5rem]";

const fieldNames: Record<RowField, string> = {
  width: "Width",
  length: "Length",
  count: "Pieces",
  quarters: "Quarters",
  species: "Species",
};
const fieldOrder = Object.keys(fieldNames) as RowField[];

/** One line of a tally. What cannot be read is said under it once the box is left. */
export const TallyRowFields = memo(function TallyRowFields(props: TallyRowProps) {
  const { row, number, boardFeet, isTried, isInHand, doings } = props;
  const { units } = useShop();
  const [isLeft, setLeft] = useState(false);
  const [box, setBox] = useState<RowField>("width");
  const read = readRow(row, units);
  const wrong = read.state === "wrong" ? read.wrong : {};
  const isSaid = (field: RowField) => isTried || isLeft || (row[field].trim() !== "" && box !== field);
  const messages = fieldOrder.filter((field) => wrong[field] && isSaid(field));
  const common = (field: RowField) => ({
    id: boxId(row.key, field),
    label: `${fieldNames[field]}, row ${number}`,
    value: row[field],
    describedBy: messages.includes(field) ? `${boxId(row.key, field)}-wrong` : undefined,
    onChange: (value: string) => doings.onType(row.key, field, value),
  });
  const boxOf = (field: "count" | "width" | "length") => ({
    ...common(field),
    onFocus: () => {
      setBox(field);
      doings.onEnter(row.key);
    },
    onBlur: () => doings.onLeave(row.key),
    onKeyDown: (event: KeyboardEvent) => {
      const step = steps[event.key];
      if (!step) return;
      event.preventDefault();
      doings.onStep(row.key, field, step);
    },
  });
  return (
    <li
      aria-label={`Row ${number}`}
      className="border-line border-b py-2"
      onBlur={(event) => setLeft(!event.currentTarget.contains(event.relatedTarget))}
      onFocus={() => setLeft(false)}
    >
      <div className={tallyColumns}>
        <span className="self-start pt-1">
          <span className="block font-semibold leading-tight">{number}</span>
          <span className="block whitespace-nowrap font-mono text-ink-soft text-xs">
            {boardFeet === null ? "" : `${boardFeet} bf`}
          </span>
        </span>
        <TallyBox {...boxOf("width")} takesPaste={isManySizes} onLines={(text) => doings.onPaste(row.key, text)} />
        <TallyBox {...boxOf("length")} />
        <TallyBox {...boxOf("count")} placeholder="1" />
        <div className="col-span-3 col-start-2 flex gap-2 md:contents">
          <TallyChoice
            {...common("quarters")}
            className="w-20 md:w-auto"
            shown={`${row.quarters.replace(/\/4$/, "")}/4`}
            isListed={isSoldQuarters(Number(row.quarters))}
            onEnter={() => doings.onStep(row.key, "quarters", "on")}
          >
            <QuartersOptions />
          </TallyChoice>
          <TallyChoice
            {...common("species")}
            className="flex-1"
            shown={speciesName(row.species)}
            isListed={isSpeciesCode(row.species)}
            onEnter={() => doings.onStep(row.key, "species", "on")}
          >
            <SpeciesOptions />
          </TallyChoice>
          <Button
            type="button"
            look="quiet"
            className={`!px-1 self-start ${read.state === "blank" ? "invisible" : ""}`}
            disabled={read.state === "blank"}
            aria-label={`Delete row ${number}`}
            onClick={() => doings.onRemove(row.key)}
          >
            Delete
          </Button>
        </div>
        {messages.map((field) => (
          <p
            key={field}
            id={`${boxId(row.key, field)}-wrong`}
            className="col-span-full col-start-2 font-semibold text-sm text-wrong"
          >
            {fieldNames[field]}: {wrong[field]}
          </p>
        ))}
      </div>
      {isInHand ? (
        <TallyKeys
          boxId={boxId(row.key, box)}
          isInches={units === "in"}
          onNext={() => doings.onStep(row.key, box, "on")}
          onType={(value) => doings.onType(row.key, box, value)}
        />
      ) : null}
    </li>
  );
});

const steps: Record<string, Step> = { Enter: "on", ArrowUp: "up", ArrowDown: "down" };

/** Is this more than one size, for rows of its own? */
function isManySizes(text: string): boolean {
  return /[\n\r\t]|,\s/.test(text.trim());
}

/** The id of a box, by which the keys move the focus. */
export function boxId(key: number, field: RowField): string {
  return `tally-${key}-${field}`;
}
