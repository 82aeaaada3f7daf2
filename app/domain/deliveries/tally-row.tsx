import { type KeyboardEvent, memo, type Ref, useState } from "react";
import { Button } from "#app/components/button.tsx";
import { QuartersOptions } from "#app/domain/boards/quarters-options.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { SpeciesOptions } from "#app/domain/species/species-options.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import { type RowField, readRow } from "./tally.ts";
import { TallyBox } from "./tally-box.tsx";
import { TallyKeys } from "./tally-keys.tsx";
import type { GridRow } from "./tally-rows.ts";

/** Where a key leads from a box: on along the row or to the next, or up and down the column. */
export type Step = "on" | "up" | "down";

interface TallyRowProps {
  row: GridRow;
  number: number;
  /** Board feet of the row as the trade rounds; null while it cannot be read. */
  boardFeet: number | null;
  /** Somebody pressed Save: say what is missing too. */
  isTried: boolean;
  onType: (key: number, field: RowField, value: string) => void;
  onLeave: (key: number) => void;
  onStep: (key: number, field: RowField, step: Step) => void;
  onPaste: (key: number, text: string) => void;
  onRemove: (key: number) => void;
}

/** Columns of the grid: two lines to a board on a phone, one at a desk. */
export const tallyColumns =
  "grid grid-cols-[2.75rem_minmax(0,1fr)_minmax(0,1fr)_4.25rem] gap-x-2 gap-y-1.5 md:grid-cols-[3.5rem_9.5rem_9.5rem_5rem_7rem_minmax(9rem,1fr)_5.5rem]";

/** One line of a tally. What cannot be read is said beside its box once the box is left. */
export const TallyRowFields = memo(function TallyRowFields(props: TallyRowProps) {
  const { row, number, boardFeet, isTried, onType, onLeave, onStep, onPaste, onRemove } = props;
  const { units } = useShop();
  const [isLeft, setLeft] = useState(false);
  const [box, setBox] = useState<RowField>("width");
  const read = readRow(row, units);
  const isBlank = read.state === "blank";
  const wrong = read.state === "wrong" ? read.wrong : {};
  const messageOf = (field: RowField) => {
    const isMissing = row[field].trim() === "";
    return isTried || (isLeft && !(isMissing && box === field)) || (!isMissing && box !== field)
      ? wrong[field]
      : undefined;
  };
  const stepBy = (event: KeyboardEvent, field: RowField, step: Step) => {
    event.preventDefault();
    onStep(row.key, field, step);
  };
  const boxProps = (field: "count" | "width" | "length") => ({
    id: boxId(row.key, field),
    value: row[field],
    message: messageOf(field),
    onFocus: () => setBox(field),
    onBlur: () => onLeave(row.key),
    onChange: (value: string) => onType(row.key, field, value),
    onKeyDown: (event: KeyboardEvent) => {
      if (event.key === "Enter") stepBy(event, field, "on");
      if (event.key === "ArrowUp") stepBy(event, field, "up");
      if (event.key === "ArrowDown") stepBy(event, field, "down");
    },
  });
  return (
    <li
      aria-label={`Row ${number}`}
      className="group border-line border-b py-2"
      onBlur={(event) => {
        if (event.currentTarget.contains(event.relatedTarget)) return;
        setLeft(true);
      }}
      onFocus={() => setLeft(false)}
    >
      <div className={tallyColumns}>
        <span className="row-span-2 self-start pt-1 md:row-span-1">
          <span className="block font-semibold leading-tight">{number}</span>
          <span className="block font-mono text-ink-soft text-xs">{boardFeet === null ? "" : `${boardFeet} bf`}</span>
        </span>
        <TallyBox
          {...boxProps("width")}
          label={`Width, row ${number}`}
          onPaste={(text) => {
            if (!/[\n\r\t]|,\s/.test(text.trim())) return false;
            onPaste(row.key, text);
            return true;
          }}
        />
        <TallyBox {...boxProps("length")} label={`Length, row ${number}`} />
        <TallyBox {...boxProps("count")} label={`How many alike, row ${number}`} placeholder="1" />
        <Choice
          id={boxId(row.key, "quarters")}
          label={`Quarters, row ${number}`}
          className="col-start-2 md:col-start-auto"
          value={row.quarters}
          message={messageOf("quarters")}
          shown={`${row.quarters.replace(/\/4$/, "")}/4`}
          onChange={(value) => onType(row.key, "quarters", value)}
          onEnter={() => onStep(row.key, "quarters", "on")}
        >
          <QuartersOptions />
        </Choice>
        <Choice
          id={boxId(row.key, "species")}
          label={`Species, row ${number}`}
          value={row.species}
          message={messageOf("species")}
          shown={speciesName(row.species)}
          onChange={(value) => onType(row.key, "species", value)}
          onEnter={() => onStep(row.key, "species", "on")}
        >
          <SpeciesOptions />
        </Choice>
        <Button
          type="button"
          look="quiet"
          className={`!px-1 ${isBlank ? "invisible" : ""}`}
          disabled={isBlank}
          aria-label={`Delete row ${number}`}
          onClick={() => onRemove(row.key)}
        >
          Delete
        </Button>
      </div>
      <TallyKeys
        boxId={boxId(row.key, box)}
        isInches={units === "in"}
        onNext={() => onStep(row.key, box, "on")}
        onType={(value) => onType(row.key, box, value)}
      />
    </li>
  );
});

/** The id of a box, by which the keys move the focus. */
export function boxId(key: number, field: RowField): string {
  return `tally-${key}-${field}`;
}

interface ChoiceProps {
  id: string;
  label: string;
  className?: string;
  value: string;
  /** How the value reads while the whole list is not there. */
  shown: string;
  message: string | undefined;
  onChange: (value: string) => void;
  onEnter: () => void;
  children: React.ReactNode;
  ref?: Ref<HTMLSelectElement>;
}

/** A select whose options come when somebody goes to it: two hundred rows of every species would make a phone slow. */
function Choice({ id, label, className = "", value, shown, message, onChange, onEnter, children }: ChoiceProps) {
  const [isOpen, setOpen] = useState(false);
  const open = () => setOpen(true);
  return (
    <span className={`grid min-w-0 content-start ${className}`}>
      <select
        id={id}
        aria-label={label}
        aria-invalid={message ? true : undefined}
        aria-describedby={message ? `${id}-wrong` : undefined}
        value={value}
        className="min-h-11 w-full min-w-0 rounded-lg border border-line-strong bg-surface px-2 aria-invalid:border-2 aria-invalid:border-wrong"
        onFocus={open}
        onPointerDown={open}
        onChange={(event) => onChange(event.target.value)}
        onKeyDown={(event) => {
          if (event.key !== "Enter") return;
          event.preventDefault();
          onEnter();
        }}
      >
        {isOpen ? children : null}
        {isOpen && !message ? null : <option value={value}>{value === "" ? "choose" : shown}</option>}
      </select>
      {message ? (
        <span id={`${id}-wrong`} className="font-semibold text-sm text-wrong">
          {message}
        </span>
      ) : null}
    </span>
  );
}
