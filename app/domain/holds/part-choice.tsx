import type { FieldMetadata } from "@conform-to/react";
import { TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { printLength } from "#app/core/lengths/print-length.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import type { Stretch } from "./hold.ts";

interface PartChoiceProps {
  part: FieldMetadata<unknown>;
  length: FieldMetadata<unknown>;
  board: { lengthMm: number };
  free: Stretch[];
}

/** How much of the board: all of it, or a length from one end. Says what is free from each end. */
export function PartChoice({ part, length, board, free }: PartChoiceProps) {
  const { units } = useShop();
  const { name, defaultValue, errors } = fieldProps(part);
  const fromNear = free.find((stretch) => stretch.fromMm === 0);
  const fromFar = free.find((stretch) => stretch.toMm === board.lengthMm);
  const size = (stretch: Stretch | undefined) =>
    stretch ? `${printLength(stretch.toMm - stretch.fromMm, units)} ${units} free` : "nothing free";
  const choices = [
    {
      value: "whole",
      label: "The whole board",
      free: fromNear && fromNear === fromFar ? "all of it free" : "not all of it free",
    },
    { value: "near", label: "A length from the near end", free: size(fromNear) },
    { value: "far", label: "A length from the far end", free: size(fromFar) },
  ];
  return (
    <fieldset className="grid gap-2">
      <legend className="mb-1 font-semibold text-sm">How much</legend>
      {choices.map((choice) => (
        <label
          key={choice.value}
          className="flex min-h-11 cursor-pointer flex-wrap items-center gap-x-3 rounded-lg border border-line-strong px-3 py-1.5 has-checked:border-2 has-checked:border-action has-checked:bg-sunk"
        >
          <input
            type="radio"
            name={name}
            value={choice.value}
            defaultChecked={choice.value === defaultValue}
            className="size-5 accent-action"
          />
          <span className="font-semibold">{choice.label}</span>
          <span className="text-ink-soft">{choice.free}</span>
        </label>
      ))}
      {errors ? <p className="font-semibold text-sm text-wrong">{errors.join(" ")}</p> : null}
      <TextField
        label="Length"
        inputMode="text"
        unit={units}
        {...fieldProps(length)}
        required={false}
        hint="Only for a length from one end. Half a board, a part and its trim: 43, 3' 7&quot;, 1100 mm."
      />
    </fieldset>
  );
}
