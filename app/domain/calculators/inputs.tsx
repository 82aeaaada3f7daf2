import type { ReactNode } from "react";
import { SelectField, TextArea, TextField } from "#app/components/field.tsx";
import { SpeciesOptions } from "#app/domain/species/species-options.tsx";
import type { Asked } from "./ask.ts";

interface InputProps<Name extends string> {
  asked: Pick<Asked<Name, unknown>, "values" | "errors">;
  name: Name;
  label: string;
  unit?: string;
  hint?: ReactNode;
}

/** A box of a calculator: starts from what was asked and says what is wrong with it. */
export function Box<Name extends string>({ asked, name, ...rest }: InputProps<Name>) {
  return (
    <TextField
      id={name}
      name={name}
      defaultValue={asked.values[name]}
      errors={asked.errors[name]}
      autoComplete="off"
      {...rest}
    />
  );
}

/** A box for a plain number: a phone shows its number pad. */
export function NumberBox<Name extends string>({ asked, name, ...rest }: InputProps<Name>) {
  return (
    <TextField
      id={name}
      name={name}
      inputMode="decimal"
      defaultValue={asked.values[name]}
      errors={asked.errors[name]}
      autoComplete="off"
      {...rest}
    />
  );
}

/** One of a few. Options are given as `<option>` children. */
export function Choice<Name extends string>({
  asked,
  name,
  children,
  ...rest
}: InputProps<Name> & { children: ReactNode }) {
  return (
    <SelectField id={name} name={name} defaultValue={asked.values[name]} errors={asked.errors[name]} {...rest}>
      {children}
    </SelectField>
  );
}

/** The choice of a species. */
export function SpeciesChoice<Name extends string>(props: Omit<InputProps<Name>, "label">) {
  return (
    <Choice label="Species" {...props}>
      <SpeciesOptions />
    </Choice>
  );
}

/** A box of several lines. */
export function LinesBox<Name extends string>({ asked, name, ...rest }: InputProps<Name>) {
  return (
    <TextArea id={name} name={name} rows={6} defaultValue={asked.values[name]} errors={asked.errors[name]} {...rest} />
  );
}
