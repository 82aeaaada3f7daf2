import type { FieldMetadata } from "@conform-to/react";
import { type Crayon, crayons, ProjectMark } from "#app/components/crayon.tsx";
import { SelectField, TextArea, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { projectStates } from "./project.ts";

interface ProjectFieldsProps {
  fields: Record<"name" | "client" | "dueOn" | "crayon" | "state" | "notes", FieldMetadata<unknown>>;
}

/** The fields of a project, for opening one and for changing it. */
export function ProjectFields({ fields }: ProjectFieldsProps) {
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <TextField label="Name" {...fieldProps(fields.name)} hint="What people say at the rack: Hall bench." />
      <TextField label="Client" {...fieldProps(fields.client)} />
      <TextField label="Due" type="date" {...fieldProps(fields.dueOn)} />
      <SelectField label="State" {...fieldProps(fields.state)}>
        {projectStates.map((state) => (
          <option key={state}>{state}</option>
        ))}
      </SelectField>
      <CrayonChoice field={fields.crayon} />
      <TextArea label="Notes" {...fieldProps(fields.notes)} className="sm:col-span-2" />
    </div>
  );
}

function CrayonChoice({ field }: { field: FieldMetadata<unknown> }) {
  const { name, defaultValue, errors } = fieldProps(field);
  return (
    <fieldset className="sm:col-span-2">
      <legend className="font-semibold text-sm">Crayon</legend>
      <p className="text-ink-soft text-sm">The mark on its boards, on screen and in the rack.</p>
      <div className="mt-1 flex flex-wrap gap-2">
        {crayons.map((crayon: Crayon) => (
          <label
            key={crayon}
            className="inline-flex min-h-11 cursor-pointer items-center gap-2 rounded-lg border border-line-strong px-3 has-checked:border-2 has-checked:border-action has-checked:bg-sunk"
          >
            <input
              type="radio"
              name={name}
              value={crayon}
              defaultChecked={crayon === defaultValue}
              className="size-5 accent-action"
            />
            <ProjectMark name={crayon} crayon={crayon} />
          </label>
        ))}
      </div>
      {errors ? <p className="font-semibold text-sm text-wrong">{errors.join(" ")}</p> : null}
    </fieldset>
  );
}
